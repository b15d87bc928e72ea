import { describe, expect, test } from 'vitest'
import type { LoadCurve } from '@/lib/engine/case-input'
import { parseQuantity } from '@/lib/quantity/parse-quantity'
import { newtonMetre, type RadianPerSecond } from '@/lib/units/si'
import { fromRpm } from '@/lib/units/speed'
import { atTerminals } from './support/at-terminals'
import { type OneMotor, startOf } from './support/one-motor-case'
import { singleCage } from './support/single-cage'
import { within } from './support/within'

const read = (text: string, quantity: 'inertia' | 'torque'): number => {
  const outcome = parseQuantity(text, quantity)
  if (!outcome.ok) throw new Error(outcome.message)
  return outcome.si
}

/*
 * t = Wk²·ΔN/(308·T) is the form printed in public courses (engineersedge.com, machinedesign.com, PDHonline E161); its
 * constant in exact units is 307.24. The ten steps are constructed here, not published.
 */
describe('segment method of run-up (formula in public courses, steps constructed): Wk² 1000 lb·ft² to 1764 r/min', () => {
  const net = [300, 280, 270, 280, 300, 340, 400, 480, 450, 250]
  const steps = net.map((torque, i) => ({ from: 180 * i, to: i === 9 ? 1764 : 180 * (i + 1), torque }))
  const motor: OneMotor = { circuit: singleCage(0.02, 0.11, 5, 0.06, 0.11), voltage: 460, frequency: 60, poles: 4 }
  const motorTorque = (rpm: number) => atTerminals(motor, 1 - rpm / 1800).torque

  /** The load that leaves exactly these net torques: motor torque less the step's, every r/min. */
  const load: LoadCurve = (() => {
    const points = steps.flatMap(({ from, to, torque }) =>
      Array.from({ length: to - from + 1 }, (_, i) => {
        const rpm = from + i + (i === 0 && from > 0 ? 1e-3 : 0)
        return { speed: fromRpm(rpm), torque: newtonMetre(motorTorque(rpm) - torque * read('1 lb·ft', 'torque')) }
      }),
    )
    const last = points.at(-1)!
    const beyond = { speed: fromRpm(1790) as RadianPerSecond, torque: last.torque }
    const all = [...points, beyond]
    return { kind: 'points', speeds: all.map((p) => p.speed), torques: all.map((p) => p.torque) }
  })()

  const start = startOf({
    ...motor,
    load,
    inertia: read('Wk² 1000 lb·ft²', 'inertia'),
    ratedSpeed: fromRpm(1764 / 0.99),
    criterion: 0.99,
  })

  test('the run-up takes 17.845 s in exact units', () => {
    within(start.timeToCriterion!, 17.845, 1e-4)
  })

  test('the printed constant 308 gives 17.801 s, a quarter of a percent less', () => {
    const printed = steps.reduce((sum, { from, to, torque }) => sum + (1000 * (to - from)) / (308 * torque), 0)
    expect(printed).toBeCloseTo(17.801, 3)
    within(start.timeToCriterion!, (printed * 308) / 307.24, 1e-4)
  })

  test('the exact constant follows from the units as they are read', () => {
    const seconds = (read('Wk² 1000 lb·ft²', 'inertia') * fromRpm(1000)) / read('1000 lb·ft', 'torque')
    expect(1000 / seconds).toBeCloseTo(307.24, 1)
  })
})
