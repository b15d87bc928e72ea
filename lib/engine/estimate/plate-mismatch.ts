import type { InductionCircuit } from '../case-input'
import { evaluateMachine, type MachineTable, machineTable } from '../machines/machine-table'
import type { PlateInPerUnit } from './nameplate'
import { torquePeaks } from './torque-peaks'

export const plateQuantities = [
  'shaft-power',
  'power-factor',
  'efficiency',
  'locked-rotor-current',
  'locked-rotor-torque',
  'breakdown-torque',
  'locked-rotor-power-factor',
] as const

export type PlateQuantity = (typeof plateQuantities)[number]

type Figures = Record<PlateQuantity, number>

/** Power drawn, current and airgap power of the table's first machine at one volt. */
const drawn = (table: MachineTable, slip: number) => {
  evaluateMachine(table, 0, slip)
  const active = table.admittance[0]!
  return { active, current: Math.hypot(active, table.admittance[1]!), airgap: table.airgap[0]! }
}

/**
 * The plate's figures of a circuit in per unit, at rated voltage and the plate's slip, and every torque peak.
 * Current and power at one volt equal the admittance: no √3 enters in per unit.
 */
export const plateFigures = (
  circuit: InductionCircuit,
  slip: number,
): { figures: Figures; peaks: readonly number[] } => {
  return tableFigures(machineTable([circuit]), slip)
}

/** As `plateFigures`, of the first machine of a table. */
export const tableFigures = (table: MachineTable, slip: number): { figures: Figures; peaks: readonly number[] } => {
  const rated = drawn(table, slip)
  const locked = drawn(table, 1)
  const shaft = (1 - slip) * rated.airgap
  const peaks = torquePeaks(table)
  const figures = {
    'shaft-power': shaft,
    'power-factor': rated.active / rated.current,
    efficiency: shaft / rated.active,
    'locked-rotor-current': locked.current,
    'locked-rotor-torque': locked.airgap,
    'breakdown-torque': Math.max(...peaks),
    'locked-rotor-power-factor': locked.active / locked.current,
  }
  return { figures, peaks }
}

/** A quantity that the plate states, and its value. */
export type Stated = readonly [PlateQuantity, number]

export const stated = (plate: PlateInPerUnit): readonly Stated[] => {
  const all: Record<PlateQuantity, number | null> = {
    'shaft-power': plate.shaftPower,
    'power-factor': plate.powerFactor,
    efficiency: plate.efficiency,
    'locked-rotor-current': plate.lockedRotorCurrent,
    'locked-rotor-torque': plate.lockedRotorTorque,
    'breakdown-torque': plate.breakdownTorque,
    'locked-rotor-power-factor': plate.lockedRotorPowerFactor,
  }
  return plateQuantities.flatMap((name) => {
    const value = all[name]
    return value === null ? [] : [[name, value] as const]
  })
}

/** Figure over plate minus one, for each quantity that the plate states, in their order. */
export const relativeMismatch = (figures: Figures, wanted: readonly Stated[]): readonly number[] =>
  wanted.map(([name, value]) => figures[name] / value - 1)

/**
 * The largest peak at the breakdown torque and no other above it. Two terms in the order of the peaks, because the
 * larger of two alone has an edge in which the search gets caught when they are alike.
 */
const peakResiduals = (peaks: readonly number[], value: number): readonly number[] => {
  const largest = Math.max(...peaks)
  const term = (peak: number | undefined) =>
    peak === undefined ? 0 : peak === largest ? peak / value - 1 : Math.max(0, peak / value - 1)
  return [term(peaks[0]), term(peaks[1])]
}

/**
 * What the fit drives to zero. Efficiency counts by its losses, since a part in a thousand of efficiency is some
 * percent of them; it weighs less, for a plate is least exact there.
 */
export const fitResiduals = (table: MachineTable, slip: number, wanted: readonly Stated[]): number[] => {
  const { figures, peaks } = tableFigures(table, slip)
  return wanted.flatMap(([name, value]) => {
    if (name === 'efficiency') return [0.3 * ((1 - figures.efficiency) / (1 - value) - 1)]
    if (name === 'breakdown-torque') return peakResiduals(peaks, value)
    return [figures[name] / value - 1]
  })
}
