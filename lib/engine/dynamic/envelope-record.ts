import { channel } from '../runup/observation'
import { addSample, type SampleStore, sampleStore } from '../runup/sampler'
import { currentRms, type HalfCycle, meanPower, meanSquareCurrent, voltageRms } from '../transient/half-cycle'
import { between, type NetworkAlong, placeAmong } from './network-along'

/** Curves of a start by half periods: RMS of the phases and peaks; torque over whole ones. Voltages are line to line. */
export interface EnvelopeRecord {
  /** Observations in the layout of the run-up, at the end of each half period; the lowest phase of every voltage. */
  samples: SampleStore
  /** Highest phase of every bus, V, and when. */
  highest: { voltage: number; at: number }[]
  time: number[]
  current: number[]
  peak: number[]
  torqueLow: number[]
  torque: number[]
  torqueHigh: number[]
  /** Direct component over the last whole period, A. */
  direct: number[]
  i2t: number
  slipEnergy: number
}

const root3 = Math.sqrt(3)
const peakOfLine = Math.sqrt(2 / 3)

/**
 * Notes half periods of a start.
 *
 * @param place of the motor's channels in an observation
 * @param busOfMotor index of its bus
 * @param factor on its torque
 */
export function createEnvelopeRecord(
  along: NetworkAlong,
  parts: {
    place: number
    busOfMotor: number
    at: number
    angle: number | null
    factor: number
    load: (speed: number) => number
  },
): { record: EnvelopeRecord; note: (half: HalfCycle) => void } {
  const { place, busOfMotor, at, angle, factor, load } = parts
  const width = along.observed[0]!.length
  const buses = along.open[0]!.length / 2
  const record: EnvelopeRecord = {
    samples: sampleStore(width),
    highest: Array.from({ length: buses }, () => ({ voltage: 0, at })),
    time: [],
    current: [],
    peak: [],
    torqueLow: [],
    torque: [],
    torqueHigh: [],
    direct: [],
    i2t: 0,
    slipEnergy: 0,
  }
  const now = new Float64Array(width)
  const before = { re: 0, im: 0 }
  /** Torque of the half period before: it pulses with the supply, so that only whole periods have a steady mean. */
  let former: HalfCycle['torque'] | null = null
  const seenAt = (bus: number, here: { row: number; part: number }) => {
    const { row, part } = here
    const next = part === 0 ? row : row + 1
    const mix = (rows: readonly Float64Array[], k: number) => {
      const from = rows[row]![2 * bus + k]!
      return from + part * (rows[next]![2 * bus + k]! - from)
    }
    return {
      re: peakOfLine * mix(along.open, 0),
      im: peakOfLine * mix(along.open, 1),
      resistance: mix(along.transfer, 0),
      reactance: mix(along.transfer, 1),
    }
  }

  function note(half: HalfCycle): void {
    const t = at + half.to
    const here = placeAmong(along, half.speed)
    for (let k = 0; k < width; k++) {
      const from = along.observed[here.row]![k]!
      now[k] = here.part === 0 ? from : from + here.part * (along.observed[here.row + 1]![k]! - from)
    }
    for (let b = 0; b < buses; b++) {
      const { least, most } = voltageRms(half, seenAt(b, here), angle)
      now[b] = root3 * least
      if (root3 * most > record.highest[b]!.voltage) record.highest[b] = { voltage: root3 * most, at: t }
    }
    const { most } = currentRms(half, angle)
    const { active, reactive } = meanPower(half, seenAt(busOfMotor, here))
    const previous = former ?? half.torque
    const torque = (factor * (half.torque.mean + previous.mean)) / 2
    const against = load(half.speed)
    now[place + channel.speed] = half.speed
    now[place + channel.torque] = torque
    now[place + channel.loadTorque] = against
    now[place + channel.accelerating] = torque - against
    now[place + channel.lineCurrent] = most
    now[place + channel.motorCurrent] = most
    now[place + channel.motorVoltage] = now[busOfMotor]!
    now[place + channel.active] = active
    now[place + channel.reactive] = reactive
    addSample(record.samples, t, now)
    const length = half.to - half.from
    record.i2t += meanSquareCurrent(half) * length
    record.slipEnergy += half.rotorLoss * length
    record.time.push(t)
    record.current.push(most)
    record.peak.push(half.peak)
    record.torqueLow.push(factor * Math.min(half.torque.low, previous.low))
    record.torque.push(torque)
    record.torqueHigh.push(factor * Math.max(half.torque.high, previous.high))
    record.direct.push(Math.hypot(before.re + half.mean.re, before.im + half.mean.im) / 2)
    before.re = half.mean.re
    before.im = half.mean.im
    former = { ...half.torque }
  }
  return { record, note }
}

/** Reactance and EMF at the beginning, for the results. */
export const firstEquivalent = (along: NetworkAlong, speed: number) => {
  const here = placeAmong(along, speed)
  return {
    emf: between(along.emf, here),
    impedance: { re: between(along.resistance, here), im: between(along.reactance, here) },
  }
}
