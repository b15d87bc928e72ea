import { listed, listedTags } from '@/lib/study/words/list-words'
import { starterPhrase } from '@/lib/study/words/starter-phrase'
import type { ReportContext } from '../report-context'
import { designMotors, designStarters } from '../values/design-records'
import { unknownPlaceholders } from '../values/placeholders'
import { openItems, statedValues } from '../values/stated-values'
import { verdictRows } from '../values/verdict-rows'
import { failingCases } from './findings'

/** What the verdict rests on, as sentences written from records and results. */
export const conditions = (context: ReportContext): readonly string[] => {
  const { input, words } = context
  const { document, result } = input
  const { verdict } = words
  const rows = verdictRows(document, result.verdicts)
  const tagOf = new Map(document.cases.map((one) => [one.id, one.tag]))
  const tagsWhere = (holds: (run: (typeof result.cases)[number]) => boolean) =>
    listedTags(result.cases.filter(holds).map((run) => tagOf.get(run.caseId) ?? run.caseId))
  const hanging = tagsWhere((run) => run.motors.some(({ start }) => start !== null && start.outcome.kind !== 'started'))
  const overDuty = tagsWhere((run) => run.motors.some(({ start }) => start?.device?.verdict === 'exceeded'))
  const notSwitchedOn = tagsWhere((run) => run.notices.some(({ kind }) => kind === 'not-switched-on'))
  const lost = tagsWhere((run) =>
    run.motors.some(({ running }) => running !== null && ['pulled-out', 'dropped-out'].includes(running.outcome.kind)),
  )
  const early = tagsWhere((run) => run.changeOvers.some(({ tooEarly }) => tooEarly))
  const departures = listedTags(failingCases(rows, 'sensitivity').map((one) => one.case.tag))
  const values = statedValues(document, words)
  const toVerify = document.limits.filter((limit) => limit.verify).length
  const assumed = values.filter(
    ({ provenance }) => provenance?.kind === 'assumed' || provenance?.kind === 'derived',
  ).length
  const unsourced = values.filter(({ provenance }) => provenance === null).length
  const { startsPerDay, startsPerHour } = document.settings
  const methods = listed(designStarters(document).map((starter) => `${starter.tag} (${starterPhrase(starter)})`))
  const successive = new Map<string, string[]>()
  for (const motor of designMotors(document)) {
    const starts = verdict.startsWords(motor.startsCold, motor.startsHot, motor.startsPerHour)
    if (starts !== '') successive.set(starts, [...(successive.get(starts) ?? []), motor.tag])
  }
  const open = openItems(document, words).length
  const unknown = unknownPlaceholders(document, result)
  return [
    verdict.startsClass(startsPerDay.text, startsPerHour.text),
    ...(methods === '' ? [] : [verdict.methodsHeld(methods)]),
    verdict.onlyComputed,
    ...[...successive].map(([starts, tags]) => verdict.makerStarts(listedTags(tags), starts)),
    ...(departures === '' ? [] : [verdict.mustExclude(departures)]),
    ...(hanging === '' ? [] : [verdict.hangs(hanging)]),
    ...(overDuty === '' ? [] : [verdict.overDuty(overDuty)]),
    ...(notSwitchedOn === '' ? [] : [verdict.notSwitchedOn(notSwitchedOn)]),
    ...(lost === '' ? [] : [verdict.lost(lost)]),
    ...(early === '' ? [] : [verdict.tooEarly(early)]),
    ...(toVerify === 0 ? [] : [verdict.verifyLimits(toVerify)]),
    ...(assumed === 0 ? [] : [verdict.assumed(assumed)]),
    ...(unsourced === 0 ? [] : [verdict.noSource(unsourced)]),
    ...(open === 0 ? [] : [verdict.openData(open)]),
    ...(unknown.length === 0 ? [] : [verdict.unknownNames(listed(unknown.map((name) => `{${name}}`)))]),
  ]
}
