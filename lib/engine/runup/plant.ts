import { synchronousSpeed } from '../../units/speed'
import type { CaseInput, LoadCurve, MotorInput, Starter } from '../case-input'
import { type LoadSegments, loadSegments } from '../driven/load-segments'
import { breakdownSlip } from '../machines/breakdown-slip'
import { type MachineTable, machineTable } from '../machines/machine-table'
import { type AdmittanceMatrix, addElement, addShunts, branchMatrix } from '../network/admittance'
import { capacitorsAt, linesAt, threeWindingsAt, transformersAt } from '../network/at-frequency'
import { withLags } from '../network/phase-shift'
import { refuse, type Setup } from '../network/refusal'
import { impedancePart, type NonlinearLoads, nonlinearLoads } from '../network/static-load'
import { findTopology, type Topology } from '../network/topology'
import { checkCase } from './check-case'

/** A case made ready for calculation: numbers in arrays, one entry a motor in the order of the input. */
export interface Plant {
  input: CaseInput
  topology: Topology
  /** Branches alone, through which short-circuit current flows. */
  branches: AdmittanceMatrix
  /** Branches, capacitors, charging and the impedance part of static loads; without source and motors. */
  network: AdmittanceMatrix
  /** The same at a frequency in parts of rated; static loads as at rated frequency. */
  networkAt(part: number): AdmittanceMatrix
  supplyNode: number
  loads: NonlinearLoads
  motors: readonly MotorInput[]
  machines: MachineTable
  starters: readonly (Starter | null)[]
  node: Int32Array
  synchronous: Float64Array
  inertia: Float64Array
  torqueFactor: Float64Array
  ratedTorque: Float64Array
  /** Speed of the first torque maximum at constant terminal voltage, rad/s. */
  breakdownSpeed: Float64Array
  /** Motors on the shaft of each, itself among them, in the order of the input. */
  mates: readonly (readonly number[])[]
  /** Curve before and during the start. */
  driven: readonly LoadSegments[]
  /** Curve once the process is on. */
  process: readonly LoadSegments[]
}

/** Checks a case and lays out its numbers. */
export function preparePlant(input: CaseInput): Setup<Plant> {
  const refusal = checkCase(input)
  if (refusal !== null) return { ok: false, outcome: refusal }
  const turned = withLags(input.buses, input.lines, input.transformers, input.threeWindings ?? [])
  if (!turned.ok) return turned
  const { transformers, threeWindings, turns } = turned.value
  const found = findTopology(input.buses, input.lines, turns, input.supply.busId)
  if (!found.ok) return found
  const topology = found.value
  const nodeOf = (busId: string): number => topology.nodeOf.get(busId)!
  const networkAt = (part: number): AdmittanceMatrix => {
    const lines = linesAt(input.lines, part)
    const network = branchMatrix(
      topology,
      lines,
      transformersAt(transformers, part),
      threeWindingsAt(threeWindings, part),
    )
    addShunts(network, topology, lines, capacitorsAt(input.capacitors, part))
    for (const load of input.loads) {
      const node = nodeOf(load.busId)
      addElement(network, node, node, impedancePart(load))
    }
    return network
  }
  const { motors } = input
  if (motors.length === 0 && input.loads.length === 0 && input.buses.length === 0) {
    return refuse('no-supply', [], 'The case has no bus.')
  }
  const synchronous = Float64Array.from(motors, (motor) => synchronousSpeed(input.frequency, motor.poles))
  return {
    ok: true,
    value: {
      input,
      topology,
      branches: branchMatrix(topology, input.lines, transformers, threeWindings),
      network: networkAt(1),
      networkAt,
      supplyNode: nodeOf(input.supply.busId),
      loads: nonlinearLoads(input.loads, topology.nodeOf),
      motors,
      machines: machineTable(
        motors.map((motor) => motor.circuit),
        synchronous,
      ),
      starters: motors.map((motor) => (motor.duty.kind === 'starting' ? motor.duty.starter : null)),
      node: Int32Array.from(motors, (motor) => nodeOf(motor.busId)),
      synchronous,
      inertia: Float64Array.from(motors, (motor) => motor.inertia),
      torqueFactor: Float64Array.from(motors, (motor) => motor.torqueFactor),
      ratedTorque: Float64Array.from(motors, (motor) => motor.ratedTorque),
      breakdownSpeed: Float64Array.from(
        motors,
        (motor, i) => synchronous[i]! * (1 - breakdownSlip(motor.circuit, synchronous[i]!)),
      ),
      mates: motors.map((motor, i) =>
        motor.shaft === undefined ? [i] : [...motors.keys()].filter((m) => motors[m]!.shaft === motor.shaft),
      ),
      driven: motors.map((motor) => loadSegments(motor.duty.load)),
      process: motors.map((motor) => loadSegments(processCurve(motor))),
    },
  }
}

const processCurve = (motor: MotorInput): LoadCurve =>
  motor.duty.kind === 'starting' && motor.duty.processLoad !== null ? motor.duty.processLoad : motor.duty.load
