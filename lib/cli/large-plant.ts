import type { CaseInput } from '../engine/case-input'
import { type Complex, type Ohm, ohm, perUnit, second, siemens, volt, voltAmpere } from '../units/si'
import { benchMotor, speedCase } from './speed-case'

/** A generator of whole numbers below a bound that gives the same row for the same seed. */
const sequence = (seed: number) => {
  let state = seed >>> 0
  return (below: number): number => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0
    return Math.floor((state / 2 ** 32) * below)
  }
}

const ohms = (re: number, im: number): Complex<Ohm> => ({ re: ohm(re), im: ohm(im) })

const nominal = 6600

/**
 * An invented plant of any size at 6.6 kV behind one strong supply: substations on a ring of cables, feeders that branch
 * off them, static loads at a third of the buses, motors spread over the feeders.
 *
 * @param buses at least 10
 * @param motors all of them run; with `dip` the supply fails for 0.3 s and they come back together
 */
export function largePlant(buses: number, motors: number, dip: boolean): CaseInput {
  const next = sequence(20_261_201)
  const small = speedCase()
  const id = (i: number): string => `B${i}`
  const ring = Math.max(3, Math.floor(buses / 25))
  const lines = Array.from({ length: buses - 1 }, (_, i) => {
    const to = i + 1
    const from = to < ring ? to - 1 : to < 4 * ring ? next(ring) : next(to)
    return line(`L${to}`, id(from), id(to), 0.05 + 0.01 * next(10))
  })
  lines.push(line('ring', id(ring - 1), id(0), 0.1))
  const spread = (count: number, i: number): string => id(1 + Math.floor((i * (buses - 1)) / Math.max(1, count)))
  const loadCount = Math.floor(buses / 3)
  return {
    ...small,
    id: `large-${buses}-${motors}`,
    buses: Array.from({ length: buses }, (_, i) => ({ id: id(i), nominal: volt(nominal) })),
    supply: {
      busId: id(0),
      impedance: ohms(0.002, 0.06),
      hold: { kind: 'bus-voltage', voltage: volt(nominal) },
      motorsInLevel: [],
    },
    transformers: [],
    lines,
    loads: Array.from({ length: loadCount }, (_, i) => ({
      id: `S${i}`,
      busId: spread(loadCount, i),
      power: { re: voltAmpere(6e6 / loadCount), im: voltAmpere(2e6 / loadCount) },
      ratedVoltage: volt(nominal),
      mix: { impedance: 0.3, current: 0.3, power: 0.4 },
      floor: perUnit(0.7),
    })),
    motors: Array.from({ length: motors }, (_, i) => benchMotor(`M${i}`, spread(motors, i), 6 / motors, true)),
    settings: { ...small.settings, timeLimit: second(60) },
    ...(dip ? { disturbance: { at: second(0), duration: second(0.3), remaining: perUnit(0) } } : {}),
  }
}

const line = (id: string, fromBusId: string, toBusId: string, length: number) => ({
  id,
  fromBusId,
  toBusId,
  impedance: ohms(0.1 * length, 0.09 * length),
  susceptance: siemens(0),
})
