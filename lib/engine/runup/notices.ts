import { perUnit, second } from '../../units/si'
import type { BusInput, CaseInput, StaticLoadInput } from '../case-input'
import type { Notice } from '../case-result'
import { judgeDuty } from '../starters/duty'
import { hasGap } from '../starters/position'
import type { BeforeStart } from './before-start'
import type { Courses } from './course'
import { generatorResult, overload } from './generator-result'
import type { SampleStore } from './sampler'
import type { RunRecord } from './simulate'
import type { System } from './system'

/** Below this part of rated voltage at the winding, torque falls faster than with the square of the voltage. */
const reduced = 0.85

/** What a reader of the results must know besides the numbers. */
export function notices(before: BeforeStart, courses: Courses, record: RunRecord): Notice[] {
  const { system, source } = before
  const { plant } = system
  const found: Notice[] = []
  if (source.takenOut !== null) found.push({ kind: 'levels-motors-taken-out', level: source.takenOut })
  const steady = system.fluxModel === null
  found.push(...(steady ? transferNotices(plant.input) : []), ...generatorNotices(system, courses, record))
  for (const start of courses.starts) {
    const former = start.switchedOn ? null : start.former
    if (former !== null)
      found.push({
        kind: 'not-switched-on',
        motorId: plant.motors[start.motor]!.id,
        waitsFor: plant.motors[former.motor]!.id,
      })
    const motor = plant.motors[start.motor]!
    if (start.standstill !== null && start.starter.kind !== 'drive') {
      const share = start.starter.kind === 'star-delta' ? Math.sqrt(1 / 3) : 1
      const winding = (share * start.standstill.motorVoltage) / motor.ratedVoltage
      if (winding < reduced)
        found.push({ kind: 'reduced-voltage-torque', motorId: motor.id, voltage: perUnit(winding) })
    }
    if (courses.changeOvers.some((change) => change.motorId === motor.id && change.tooEarly)) {
      found.push({ kind: 'change-over-too-early', motorId: motor.id })
    }
    const { duty } = motor
    const starterDuty = duty.kind === 'starting' ? duty.starterDuty : undefined
    const device = judgeDuty(start.starter, starterDuty, (start.runningAt ?? record.end.at) - start.at)
    if (device?.verdict === 'exceeded')
      found.push({ kind: 'starter-duty-exceeded', motorId: motor.id, time: device.time })
    if (hasGap(start.starter) && (system.fluxModel?.index[start.motor] ?? -1) < 0)
      found.push({ kind: 'open-transition-without-transient', motorId: motor.id })
  }
  for (const load of plant.input.loads) {
    const at = firstBelowFloor(load, plant.input.buses, record.samples)
    if (at !== null) found.push({ kind: 'load-below-floor', loadId: load.id, at: second(at) })
  }
  return found
}

function transferNotices({ disturbance }: CaseInput): Notice[] {
  if (disturbance?.remaining !== 0) return []
  const { duration: deadTime, decayTime } = disturbance
  if (decayTime === undefined) return [{ kind: 'residual-voltage-not-modelled' }]
  return deadTime < decayTime ? [{ kind: 'transfer-within-residual', deadTime, decayTime }] : []
}

function generatorNotices(system: System, courses: Courses, record: RunRecord): Notice[] {
  if (courses.generator === null) return []
  const { atCeiling } = generatorResult(system, courses, record)
  const beyond = overload(system, courses.generator)
  return [
    ...(beyond === null ? [] : [{ kind: 'prime-mover-overloaded' as const, ...beyond }]),
    ...(atCeiling > 0 ? [{ kind: 'excitation-at-ceiling' as const, time: atCeiling }] : []),
  ]
}

/** First sample at which a load that is not all impedance is below its floor. */
function firstBelowFloor(load: StaticLoadInput, buses: readonly BusInput[], samples: SampleStore): number | null {
  if (load.mix.current === 0 && load.mix.power === 0) return null
  const b = buses.findIndex((bus) => bus.id === load.busId)
  for (let i = 0; i < samples.count; i++) {
    if (samples.data[i * samples.width + b]! < load.floor * load.ratedVoltage) return samples.time[i]!
  }
  return null
}
