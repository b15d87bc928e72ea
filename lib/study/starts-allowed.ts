import { classInUse } from '../engine/criteria/applies'
import type { Verdict } from '../engine/criteria/rule'
import { type StartsAllowed, startsAllowed } from '../engine/protection/starts-allowed'
import type { LimitRecord } from './document/limit-record'
import type { StudyDocument } from './document/study-document'
import type { CaseSummary, StudySummary } from './summary'

/** Starts an hour beyond which no class is looked for. */
const most = 60

/**
 * Starts an hour at which every limit written for a class of starts holds in a case, by its verdicts in and out of use.
 *
 * @returns undefined where no limit names a number an hour; 0 where none holds
 */
export const startsByClass = (
  limits: readonly LimitRecord[],
  verdicts: readonly Verdict[],
  perDay: number,
): number | undefined => {
  const words = new Map(verdicts.map(({ ruleId, word }) => [ruleId, word]))
  const classed = limits.filter(
    ({ id, startClass }) =>
      words.has(id) &&
      startClass !== null &&
      (startClass.atMostPerHour !== null || startClass.moreThanPerHour !== null),
  )
  if (classed.length === 0) return undefined
  for (let perHour = most; perHour > 0; perHour--) {
    const inUse = classed.filter(({ startClass }) =>
      classInUse(startClass, { perHour, perDay: Math.max(perDay, perHour) }),
    )
    if (inUse.length > 0 && inUse.every(({ id }) => words.get(id) === 'meets' || words.get(id) === 'close'))
      return perHour
  }
  return 0
}

/** Starts an hour by the heat balance, the least over the machines that meet the plate; null where it is not known. */
const byHeat = (result: CaseSummary, motorId: string): number | null => {
  const all = [result, ...(result.variants ?? []).filter(({ kind }) => kind === 'same-plate').map((one) => one.result)]
  const counts = all.flatMap(({ motors }) => {
    const found = motors.find((motor) => motor.motorId === motorId)?.start?.heatBalance?.perHour
    return found === undefined || found === null ? [] : [found]
  })
  return counts.length === 0 ? null : Math.min(...counts)
}

/** Starts an hour that are allowed for every motor started in a case. */
export const startsAllowedIn = (
  document: StudyDocument,
  { verdicts }: Pick<StudySummary, 'verdicts'>,
  result: CaseSummary,
): readonly { motorId: string; allowed: StartsAllowed }[] => {
  const { plant, cases, schedules, limits, settings } = document
  const schedule = schedules.find(({ id }) => id === cases.find((one) => one.id === result.caseId)?.schedule)
  const own = verdicts.filter(({ caseId }) => caseId === result.caseId)
  const utility = startsByClass(limits, own, settings.startsPerDay.si)
  return result.motors.flatMap(({ motorId, start }) => {
    const motor = plant.motors.find(({ id }) => id === motorId)
    const starter = plant.starters.find(
      ({ id }) => id === schedule?.starts.find((one) => one.motor === motorId)?.starter,
    )
    if (start === null || !motor) return []
    const process = plant.drivenLoads.find((load) => load.motor === motorId)?.startsPerHour
    const heat = byHeat(result, motorId)
    const allowed = startsAllowed({
      maker: motor.startsPerHour,
      ...(starter && 'dutyLimits' in starter && { device: starter.dutyLimits?.startsPerHour ?? null }),
      ...(utility !== undefined && { utility }),
      ...(process !== undefined && process !== null && { process }),
      ...(heat !== null && { heat }),
    })
    return [{ motorId, allowed }]
  })
}
