import type { StartResult } from '@/lib/engine/case-result'
import type { SupplyRecord } from '@/lib/study/document/network-records'
import type { StudyDocument } from '@/lib/study/document/study-document'
import type { CaseSummary } from '@/lib/study/summary'
import { formatVerdict } from '@/lib/study/words/format-verdict'
import { isShortCircuitLevel, levelText } from '@/lib/study/words/level-text'
import { limitedQuantity, limitValuePhrase, placePhrase } from '@/lib/study/words/limit-sentence'
import { busTag, caseTag, motorTag } from '@/lib/study/words/tags'
import { current, orDash, percent, seconds, speed, torque, voltage } from './print'
import { designResults, margins, type Results } from './results'

/** One figure of the answer strip, with the case that it comes from. */
export interface AnswerFact {
  label: string
  value: string
  more: string
  caseId: string
}

interface StartOf {
  result: CaseSummary
  motorId: string
  start: StartResult
}

const startsOf = (results: readonly CaseSummary[]): StartOf[] =>
  results.flatMap((result) =>
    result.motors.flatMap(({ motorId, start }) => (start ? [{ result, motorId, start }] : [])),
  )

/** The start at which a figure is largest; the figure may be absent. */
const most = (starts: readonly StartOf[], figure: (start: StartResult) => number | null): StartOf | undefined =>
  starts.reduce<StartOf | undefined>((best, one) => {
    const value = figure(one.start)
    const known = best && figure(best.start)
    return value !== null && (known === null || known === undefined || value > known) ? one : best
  }, undefined)

const supplyLevel = (supply: SupplyRecord): string =>
  supply.xOverR && isShortCircuitLevel(supply) ? `${levelText(supply)}, X/R ${supply.xOverR.text}` : levelText(supply)

const supplyOf = (document: StudyDocument, caseId: string): string => {
  const record = document.cases.find(({ id }) => id === caseId)
  const supply = document.plant.supplies.find(({ id }) => id === record?.supply)
  return supply ? `${supply.tag} supply (${supplyLevel(supply)})` : 'supply'
}

/** The governing limit at the governing case in one sentence; null where nothing was assessed. */
export const governingSentence = ({ document, summary }: Results): string | null => {
  const { governing } = summary.overall
  const rule = governing && document.limits.find(({ id }) => id === governing.ruleId)
  if (!governing || !rule) return null
  const { value, margin, unit } = formatVerdict(governing, rule.quantity, margins(document))
  const place = governing.motorId
    ? motorTag(document, governing.motorId)
    : governing.busId
      ? busTag(document, governing.busId)
      : placePhrase(rule, document)
  const at = governing.at === null ? '' : ` at ${seconds(governing.at)}`
  const figure = value === null ? 'has no figure' : `is ${value}\u2009${unit}`
  const room =
    margin === null
      ? ''
      : margin.startsWith('\u2212')
        ? `, ${margin.slice(1)}\u2009${unit} beyond it`
        : `, ${margin}\u2009${unit} inside it`
  return `${rule.tag} governs: ${limitedQuantity(rule, document)} at ${place}${at} ${figure} against ${limitValuePhrase(rule)}${room}, in case ${caseTag(document, governing.caseId)} on the ${supplyOf(document, governing.caseId)}.`
}

/** The figures that an engineer checks first, over the design cases, each with its case. */
export const answerFacts = (results: Results): readonly AnswerFact[] => {
  const { document, summary } = results
  const counted = designResults(results)
  const starts = startsOf(counted.length > 0 ? counted : summary.cases)
  const governing = starts.filter(({ result }) => result.caseId === summary.overall.governing?.caseId)
  const still = governing[0] ?? starts[0]
  const least = most(starts, ({ leastAccelerating }) => -leastAccelerating.ofRated)
  const longest = most(starts, ({ timeToCriterion }) => timeToCriterion)
  const hottest = most(starts, ({ heatUsed }) => heatUsed.figure)
  const name = (one: StartOf) => motorTag(document, one.motorId)
  const facts: (AnswerFact | null)[] = [
    still
      ? {
          label: `${name(still)} at standstill`,
          value: `${voltage(still.start.standstill.motorVoltage)} at its terminals`,
          more: `${current(still.start.standstill.lineCurrent)} from the line, ${current(still.start.standstill.motorCurrent)} in the motor`,
          caseId: still.result.caseId,
        }
      : null,
    least
      ? {
          label: `Least accelerating torque, ${name(least)}`,
          value: `${percent(least.start.leastAccelerating.ofRated, 1)} of rated`,
          more: `${torque(least.start.leastAccelerating.torque)} at ${speed(least.start.leastAccelerating.speed)}`,
          caseId: least.result.caseId,
        }
      : null,
    longest
      ? {
          label: `Longest run-up, ${name(longest)}`,
          value: orDash(longest.start.timeToCriterion, seconds),
          more: `to ${document.settings.speedCriterion.text} of rated speed${transferOf(longest)}`,
          caseId: longest.result.caseId,
        }
      : null,
    hottest
      ? {
          label: `Most heat used, ${name(hottest)}`,
          value: orDash(hottest.start.heatUsed.figure, (value) => percent(value, 1)),
          more: `of I²t for the permissible locked-rotor time, ${hottest.start.heatUsed.state ?? ''}`,
          caseId: hottest.result.caseId,
        }
      : null,
  ]
  return facts.filter((fact) => fact !== null)
}

const transferOf = ({ result, motorId }: StartOf): string => {
  const transfer = result.changeOvers.find((one) => one.motorId === motorId && one.to === 'running')
  return transfer ? `, change-over at ${seconds(transfer.at)}` : ''
}
