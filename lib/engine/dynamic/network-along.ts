import type { CaseResult } from '../case-result'
import { createObserver, observationLength } from '../runup/observation'
import type { System } from '../runup/system'

/**
 * What the network is to one starting motor along its run-up: an EMF behind R and X, and what its current does to the
 * voltage of every bus, at rising speeds of the motor. Running machines are in it with the speeds that the quasi-static
 * run gives them there, loads with their voltages before and after; between the rows straight lines.
 */
export interface NetworkAlong {
  speeds: Float64Array
  /** V line and ohm, one entry a row. */
  emf: Float64Array
  resistance: Float64Array
  reactance: Float64Array
  /** Voltage of every bus (V line) without the motor: re, im, its phase by that of the motor's bus but for whole clock hours. */
  open: readonly Float64Array[]
  /** Impedance between the motor's current and the voltage of every bus, ohm: re, im. */
  transfer: readonly Float64Array[]
  /** Everything else that is reported, with the motor on. */
  observed: readonly Float64Array[]
}

const direct = { link: { kind: 'direct' as const }, rotorResistance: 0 }
const most = 33

/** Values of the run's series at the first passage of a motor through a speed; at the end where it never gets there. */
function atSpeed(result: CaseResult, motorId: string, speed: number): (id: string) => number {
  const own = result.series.motors[motorId]!.speed
  let at = own.length - 1
  let part = 0
  for (let i = 0; i + 1 < own.length; i++) {
    const [a, b] = [own[i]! - speed, own[i + 1]! - speed]
    if (a * b > 0 || result.series.time[i]! < switchedOn(result, motorId)) continue
    at = i
    part = a === b ? 0 : a / (a - b)
    break
  }
  return (id) => {
    const all = result.series.motors[id]!.speed
    const next = all[Math.min(at + 1, all.length - 1)]!
    return all[at]! + part * (next - all[at]!)
  }
}

const switchedOn = (result: CaseResult, motorId: string): number =>
  result.motors.find((each) => each.motorId === motorId)?.start?.switchedOnAt ?? 0

interface Row {
  emf: number
  impedance: { re: number; im: number }
  open: Float64Array
  transfer: Float64Array
  observed: Float64Array
}

/** The row at one set of speeds, or null where the network has no solution with the motor on. */
function rowAt(system: System, motor: number, speeds: Float64Array, nodes: Float64Array): Row | null {
  const { plant, solver, connection } = system
  const { nodeOfBus } = plant.topology
  const buses = plant.input.buses.length
  const own = plant.node[motor]!
  system.move(motor, null, 0)
  if (!system.solveAt(speeds)) return null
  solver.recover(nodes)
  const size = Math.hypot(nodes[2 * own]!, nodes[2 * own + 1]!)
  const [cos, sin] = [nodes[2 * own]! / size, -nodes[2 * own + 1]! / size]
  const turned = (node: number) => ({
    re: nodes[2 * node]! * cos - nodes[2 * node + 1]! * sin,
    im: nodes[2 * node]! * sin + nodes[2 * node + 1]! * cos,
  })
  const before = Array.from({ length: buses }, (_, b) => turned(nodeOfBus[b]!))
  system.move(motor, direct, 0)
  const solved = system.solveAt(speeds)
  if (!solved) {
    system.move(motor, null, 0)
    return null
  }
  solver.recover(nodes)
  const observed = new Float64Array(observationLength(system))
  createObserver(system)(speeds, observed)
  const y = { re: connection.admittance[2 * motor]!, im: connection.admittance[2 * motor + 1]! }
  system.move(motor, null, 0)
  const at = turned(own)
  const current = { re: y.re * at.re - y.im * at.im, im: y.re * at.im + y.im * at.re }
  const square = current.re ** 2 + current.im ** 2
  const seen = (drop: { re: number; im: number }) => ({
    re: (drop.re * current.re + drop.im * current.im) / square,
    im: (drop.im * current.re - drop.re * current.im) / square,
  })
  const open = new Float64Array(2 * buses)
  const transfer = new Float64Array(2 * buses)
  before.forEach((u, b) => {
    const now = turned(nodeOfBus[b]!)
    const z = seen({ re: u.re - now.re, im: u.im - now.im })
    // A vector group turns a bus by hours of the clock; what is left is the angle of its load.
    const hours = (Math.round((Math.atan2(u.im, u.re) * 6) / Math.PI) * Math.PI) / 6
    const [c, s] = [Math.cos(hours), -Math.sin(hours)]
    open.set([u.re * c - u.im * s, u.re * s + u.im * c], 2 * b)
    transfer.set([z.re * c - z.im * s, z.re * s + z.im * c], 2 * b)
  })
  return { emf: size, impedance: seen({ re: size - at.re, im: -at.im }), open, transfer, observed }
}

/**
 * Looks at the network along a quasi-static run.
 *
 * @param motor index of the one starting motor, off
 * @param speeds the state before the start
 * @returns null where the network has no solution with the motor on, or is no R-L circuit to it (a capacitance at the
 * fundamental)
 */
export function networkAlong(
  system: System,
  motor: number,
  before: Float64Array,
  result: CaseResult,
): NetworkAlong | null {
  const { plant } = system
  const { id } = plant.motors[motor]!
  const run = result.series.motors[id]!.speed
  const from = switchedOn(result, id)
  const passed = run.filter((_, i) => result.series.time[i]! >= from)
  const [low, high] = [Math.min(...passed), Math.max(...passed)]
  const moves = plant.motors.length > 1 || plant.loads.count > 0
  const rows = moves && high > low ? most : 1
  const nodes = new Float64Array(2 * (plant.network.order + 1))
  const along = {
    speeds: Float64Array.from({ length: rows }, (_, k) =>
      rows === 1 ? low : low + ((high - low) * (1 - Math.cos((k * Math.PI) / (rows - 1)))) / 2,
    ),
    emf: new Float64Array(rows),
    resistance: new Float64Array(rows),
    reactance: new Float64Array(rows),
  }
  const found: Row[] = []
  for (let k = 0; k < rows; k++) {
    const speed = along.speeds[k]!
    const speedOf = atSpeed(result, id, speed)
    const state = Float64Array.from(before)
    plant.motors.forEach((each, i) => {
      state[i] = i === motor ? speed : speedOf(each.id)
    })
    const row = rowAt(system, motor, state, nodes)
    if (row === null || row.impedance.re < 0 || row.impedance.im <= 0) return null
    along.emf[k] = row.emf
    along.resistance[k] = row.impedance.re
    along.reactance[k] = row.impedance.im
    found.push(row)
  }
  return {
    ...along,
    open: found.map(({ open }) => open),
    transfer: found.map(({ transfer }) => transfer),
    observed: found.map(({ observed }) => observed),
  }
}

/**
 * The row below a speed. Rows stand closer towards both ends, where running machines slow down within a few turns of the
 * starting one, and where its current falls away.
 */
export function rowBelow(speeds: Float64Array, speed: number): number {
  const last = speeds.length - 1
  if (last === 0) return 0
  const way = Math.max(0, Math.min(1, (speed - speeds[0]!) / (speeds[last]! - speeds[0]!)))
  return Math.min(last - 1, Math.floor((Math.acos(1 - 2 * way) * last) / Math.PI))
}

/** Part of the way from a row to the next; 0 and 1 beyond the ends. */
export function partOfWay(speeds: Float64Array, row: number, speed: number): number {
  if (speeds.length === 1) return 0
  return Math.max(0, Math.min(1, (speed - speeds[row]!) / (speeds[row + 1]! - speeds[row]!)))
}

/** Place of a speed among rows: the row below and the part of the way to the next. */
export function placeAmong({ speeds }: NetworkAlong, speed: number): { row: number; part: number } {
  const row = rowBelow(speeds, speed)
  return { row, part: partOfWay(speeds, row, speed) }
}

/** A quantity of the rows at a place among them. */
export const between = (values: ArrayLike<number>, { row, part }: { row: number; part: number }): number =>
  part === 0 ? values[row]! : values[row]! + part * (values[row + 1]! - values[row]!)
