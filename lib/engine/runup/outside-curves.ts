import { isOutside } from '../machines/machine-table'
import { type Refusal, refuse } from '../network/refusal'
import { placeOf } from './observation'
import type { SampleStore } from './sampler'
import type { System } from './system'

/** The refusal of a run in which a machine left the range of its typed curves; null where none did. */
export function motorOutsideItsCurves(system: System, samples: SampleStore): Refusal | null {
  const { plant } = system
  for (const [i, motor] of plant.motors.entries()) {
    if (plant.machines.curves[i] === null) continue
    const place = placeOf(system, i, 'speed')
    for (let k = 0; k < samples.count; k++) {
      const slip = 1 - samples.data[k * samples.width + place]! / plant.synchronous[i]!
      if (!isOutside(plant.machines, i, slip)) continue
      const detail = `Motor ${motor.id} leaves the speeds of its typed curves ${samples.time[k]!.toFixed(2)} s after the first switching-on; they are not extended.`
      return refuse('bad-value', [motor.busId], detail).outcome
    }
  }
  return null
}
