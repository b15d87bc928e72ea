import { isTabulated, type MotorInput } from '../case-input'
import { cagesOf, createRotorFluxes, type RotorFluxes } from '../machines/rotor-flux'
import { type Connections, codes } from '../starters/connection'
import { width } from '../starters/soft-start'
import type { Plant } from './plant'

/** Motors of a plant by the third-order model, joined with the network through their starting devices. */
export interface FluxModel {
  /** While off, every machine is its steady circuit at the slip it has. */
  on: boolean
  readonly fluxes: RotorFluxes
  /** Place of each motor's fluxes in the state, −1 for motors that are steady circuits all the time. */
  readonly index: Int32Array
  /** Length of the state with the fluxes. */
  readonly length: number
  /** Prepares motor i for a solution: its admittance into the connections, its current at zero voltage into `source` (re, im). */
  before(i: number, speed: number, state: Float64Array, source: Float64Array): void
  /** Takes in the voltage of the bus (line, V): currents, and what the motor shows the bus as an admittance. */
  after(i: number, re: number, im: number, state: Float64Array): void
  /** Motor i carries no current. */
  open(i: number, speed: number, state: Float64Array): void
  /** Square of the currents on either side of the device, A², after `after`. */
  readonly lineSquare: Float64Array
  readonly motorSquare: Float64Array
}

/** Machines with typed torque or curves have no flux; saturation, drives, soft starters and parts of windings are steady too. */
export function hasFluxes({ circuit, duty }: MotorInput): boolean {
  if (isTabulated(circuit) || circuit.torqueCurve || circuit.saturation) return false
  if (!circuit.cages.every(({ reactance }) => reactance > 0)) return false
  const kind = duty.kind === 'starting' ? duty.starter.kind : 'direct'
  return kind !== 'soft-starter' && kind !== 'drive' && kind !== 'part-winding'
}

/**
 * Lays out the fluxes behind the rest of the state; null for a quasi-static case.
 *
 * Behind a ratio k and a series impedance z the line sees Z'/k² + z and E'/k; star is k = 1/√3 (the turn of its phases
 * by 30° on going over to delta is left out, as with the connection that turns them the better way).
 */
export function createFluxModel(plant: Plant, connection: Connections, begin: number): FluxModel | null {
  if (plant.input.model?.kind !== 'third-order') return null
  const { machines, synchronous } = plant
  const count = plant.motors.length
  const fluxes = createRotorFluxes(machines, 2 * Math.PI * plant.input.frequency)
  let length = begin
  const index = Int32Array.from(plant.motors, (motor, i) => {
    if (!hasFluxes(motor)) return -1
    const at = length
    length += 2 * cagesOf(machines, i)
    return at
  })
  const ratio = new Float64Array(count)
  const series = new Float64Array(2 * count)
  const emf = new Float64Array(2 * count)
  const lineSquare = new Float64Array(count)
  const motorSquare = new Float64Array(count)

  return {
    on: false,
    fluxes,
    index,
    length,
    lineSquare,
    motorSquare,
    before(i, speed, state, source) {
      fluxes.look(i, 1 - speed / synchronous[i]!, state, index[i]!)
      const code = connection.code[i]!
      const devised = code === codes.tap || code === codes.series
      const k = devised ? connection.settings[width * i]! : code === codes.star ? Math.sqrt(1 / 3) : 1
      ratio[i] = k
      series[2 * i] = devised ? connection.settings[width * i + 1]! : 0
      series[2 * i + 1] = devised ? connection.settings[width * i + 2]! : 0
      const zRe = fluxes.impedance[2 * i]! / (k * k) + series[2 * i]!
      const zIm = fluxes.impedance[2 * i + 1]! / (k * k) + series[2 * i + 1]!
      const size = zRe * zRe + zIm * zIm
      const yRe = zRe / size
      const yIm = -zIm / size
      const eRe = fluxes.voltage[2 * i]! / k
      const eIm = fluxes.voltage[2 * i + 1]! / k
      emf[2 * i] = eRe
      emf[2 * i + 1] = eIm
      connection.admittance[2 * i] = yRe
      connection.admittance[2 * i + 1] = yIm
      source[0] = yRe * eRe - yIm * eIm
      source[1] = yRe * eIm + yIm * eRe
    },
    after(i, re, im, state) {
      const yRe = connection.admittance[2 * i]!
      const yIm = connection.admittance[2 * i + 1]!
      const dRe = re - emf[2 * i]!
      const dIm = im - emf[2 * i + 1]!
      const iRe = yRe * dRe - yIm * dIm
      const iIm = yRe * dIm + yIm * dRe
      const k = ratio[i]!
      fluxes.carry(i, iRe / k, iIm / k, state, index[i]!)
      const square = iRe * iRe + iIm * iIm
      lineSquare[i] = square / 3
      // In star the current of the terminals is that of the line.
      motorSquare[i] = (square * connection.current[i]! ** 2) / 3
      const voltage = re * re + im * im
      if (voltage === 0) return
      connection.admittance[2 * i] = (iRe * re + iIm * im) / voltage
      connection.admittance[2 * i + 1] = (iIm * re - iRe * im) / voltage
      const code = connection.code[i]!
      if (code !== codes.tap && code !== codes.series) return
      const uRe = re - series[2 * i]! * iRe + series[2 * i + 1]! * iIm
      const uIm = im - series[2 * i]! * iIm - series[2 * i + 1]! * iRe
      connection.terminal[i] = k * Math.sqrt((uRe * uRe + uIm * uIm) / voltage)
    },
    open(i, speed, state) {
      fluxes.look(i, 1 - speed / synchronous[i]!, state, index[i]!)
      fluxes.carry(i, 0, 0, state, index[i]!)
    },
  }
}
