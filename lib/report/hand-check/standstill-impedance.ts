import type { InductionCircuit } from '@/lib/engine/case-input'
import { deepBarLaw } from '@/lib/engine/machines/deep-bar'
import type { Complex } from '@/lib/units/si'
import { add, inverse } from './complex'

/** Impedance of a motor with locked rotor, slip 1: stator, then magnetising branch, core and cages side by side; in the circuit's ohm. */
export const standstillImpedance = (circuit: InductionCircuit): Complex => {
  const { stator, magnetising, core, cages } = circuit
  const law = deepBarLaw(circuit)
  const branches: Complex[] = [
    { re: 0, im: magnetising },
    ...(core === null ? [] : [{ re: core, im: 0 }]),
    ...cages.map(({ resistance, reactance }) =>
      law ? { re: resistance + law.addedResistance(1), im: law.reactance(1) } : { re: resistance, im: reactance },
    ),
  ]
  const admittance = branches.map(inverse).reduce(add)
  return add(stator, inverse(admittance))
}
