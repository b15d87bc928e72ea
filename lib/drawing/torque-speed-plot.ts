import { formatNumber } from '@/lib/quantity/format-number'
import { hertz, radianPerSecond } from '@/lib/units/si'
import { synchronousSpeed, toRpm } from '@/lib/units/speed'
import { type CaseFigure, caseOf, type FigureSize, motorOf } from './case-figure'
import { domainAround } from './domain'
import { linePlot } from './plot/line-plot'
import type { MarkerSpec, ShadeSpec } from './plot/line-plot-spec'
import type { Scene } from './scene'

const rpm = (speed: number) => toRpm(radianPerSecond(speed))

/** The samples that go on to a higher speed than before: a gap without voltage, in which the speed falls back, is not shaded. */
const rising = (x: readonly number[], lower: readonly number[], upper: readonly number[]): ShadeSpec => {
  let highest = Number.NEGATIVE_INFINITY
  const kept = x.flatMap((value, i) => {
    if (value < highest || upper[i]! < lower[i]!) return []
    highest = value
    return [i]
  })
  const pick = (values: readonly number[]) => kept.map((i) => values[i]!)
  return { name: 'accelerating', x: pick(x), lower: pick(lower), upper: pick(upper) }
}

/**
 * Torque of a starting motor at the voltage that it really had, against speed, with the load's torque; what is left to
 * accelerate is shaded and its least value read off.
 */
export const torqueSpeedPlot = (figure: CaseFigure, { motorId, ...size }: FigureSize & { motorId: string }): Scene => {
  const { document, result } = figure
  const motor = motorOf(document, motorId)
  const start = result.motors.find((one) => one.motorId === motorId)?.start
  const series = result.series.motors[motorId]
  // Of the two samples at the switching-on the later one is the motor with voltage.
  const from = result.series.time.lastIndexOf(start?.switchedOnAt ?? 0)
  const cut = (values: readonly number[] = []) => values.slice(Math.max(0, from))
  const speed = cut(series?.speed).map(rpm)
  const kilo = (values: readonly number[] | undefined) => cut(values).map((value) => value / 1000)
  const torque = kilo(series?.torque)
  const load = kilo(series?.loadTorque)
  const synchronous = toRpm(synchronousSpeed(hertz(document.frequency.si), motor.poles))
  const least = start?.leastAccelerating
  const markers: MarkerSpec[] = []
  if (least) {
    const at = speed.reduce((best, value, i) => {
      const distance = (k: number) => Math.abs(speed[k]! - rpm(least.speed)) + (torque[k]! > load[k]! ? 0 : 1e-3)
      return distance(i) < distance(best) && value >= 0 ? i : best
    }, 0)
    const name = `least accelerating torque ${formatNumber(100 * least.ofRated, { decimals: 1 })}\u2009% of rated at ${formatNumber(rpm(least.speed), { decimals: 0 })}\u2009r/min`
    markers.push({ x: speed[at] ?? 0, y: torque[at] ?? 0, name })
  }
  return linePlot({
    ...size,
    title: `${caseOf(figure).tag}: torque of ${motor.tag} and its load against speed`,
    description: markers.map((marker) => `${motor.tag}: ${marker.name}.`).join(' '),
    x: { label: 'speed, r/min', domain: [0, synchronous], ticks: 10 },
    y: { label: 'torque, kN·m', domain: domainAround([...torque, ...load], [0]) },
    series: [
      { name: `${motor.tag} motor`, style: 0, x: speed, y: torque },
      { name: 'load', style: 1, x: speed, y: load },
    ],
    shade: rising(speed, load, torque),
    markers,
  })
}
