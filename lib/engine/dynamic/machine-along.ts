import type { InductionCircuit } from '../case-input'
import { deepBarLaw } from '../machines/deep-bar'
import { type TransientMachine, transientMachine } from '../transient/machine-equations'
import { type NetworkAlong, partOfWay, rowBelow } from './network-along'

/**
 * The starting machine behind the network as it is along the run-up, skin effect by its slip. Phase a's EMF is at its
 * crest when it is switched on; other instants are other directions of the same space vectors.
 */
export function machineAlong(
  circuit: InductionCircuit,
  along: NetworkAlong,
  frequency: number,
  poles: number,
  from: number,
): TransientMachine {
  const first = { impedance: { re: along.resistance[0]!, im: along.reactance[0]! }, emf: along.emf[0]!, frequency }
  const machine = transientMachine(circuit, first, poles, 0)
  const law = deepBarLaw(circuit)
  const own = circuit.cages[0]!.resistance
  const synchronous = (2 * machine.base) / poles
  const last = along.speeds.length - 1
  const { speeds, emf, resistance, reactance } = along
  machine.follow = (speed) => {
    if (last > 0) {
      const row = rowBelow(speeds, speed)
      const part = partOfWay(speeds, row, speed)
      machine.voltage.q = Math.sqrt(2 / 3) * (emf[row]! + part * (emf[row + 1]! - emf[row]!))
      machine.resistance = circuit.stator.re + resistance[row]! + part * (resistance[row + 1]! - resistance[row]!)
      machine.leakage = circuit.stator.im + reactance[row]! + part * (reactance[row + 1]! - reactance[row]!)
    }
    if (law !== null) {
      const slip = 1 - speed / synchronous
      const bar = machine.rotor[0]!
      bar.resistance = own + law.addedResistance(slip)
      bar.reactance = law.reactance(slip)
    }
    if (last === 0 && law === null) return
    let sum = 1 / circuit.magnetising + 1 / machine.leakage
    for (const { reactance: x } of machine.rotor) sum += 1 / x
    machine.mutual = 1 / sum
  }
  machine.follow(from)
  return machine
}

/**
 * Time constant with which the direct component of the current decays: (X_s + X_m‖X_r + X)/(ω_b·(R_s + R)), the rotor
 * short-circuited, s. Source: textbooks on the analysis of electric machinery.
 */
export function directTimeConstant({ leakage, resistance, rotor, mutual, base }: TransientMachine): number {
  // X_m‖X_r from 1/mutual = 1/X_m + Σ1/X_r + 1/X_l
  const inner = 1 / (1 / mutual - 1 / leakage)
  return rotor.length === 0 ? Number.NaN : (leakage + inner) / (base * resistance)
}
