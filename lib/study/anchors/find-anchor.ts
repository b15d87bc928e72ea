import { formatNumber } from '../../quantity/format-number'
import { printQuantity } from '../../quantity/print-quantity'
import { perUnit } from '../../units/si'
import type { StudyDocument } from '../document/study-document'
import type { PreIssueCheck } from '../pre-issue-checks'
import type { CaseSummary, StudySummary } from '../summary'
import { voltageAt } from '../voltage-change'
import { recordNouns } from '../words/field-words'
import { formatVerdict } from '../words/format-verdict'
import { instantNames } from '../words/quantity-words'
import { busTag, caseTag, limitTag, motorTag } from '../words/tags'
import type { Anchor, StartFigure } from './anchor'
import { findField } from './find-field'
import { sectionNames } from './section-names'

/** What an anchor leads to in a revision: its words, and the value that stands there. */
export interface Found {
  label: string
  /** Null for what is no single value. */
  value: string | null
}

/** Where anchors are looked for. */
export interface AnchorGround {
  document: StudyDocument
  summary: StudySummary
  checks: readonly Pick<PreIssueCheck, 'id' | 'sentence' | 'passed'>[]
}

const volts = (value: number, nominal: number): string =>
  `${printQuantity(value, 'voltage', { digits: 4 })}, ${formatNumber((100 * value) / nominal, { decimals: 2 })}\u2009% of nominal`

const percent = (value: number): string => `${formatNumber(100 * value, { decimals: 1 })}\u2009%`

type Start = NonNullable<CaseSummary['motors'][number]['start']>

const startFigureWords: Record<StartFigure, { words: string; value: (start: Start) => string | null }> = {
  'run-up-time': {
    words: 'run-up time',
    value: ({ timeToCriterion }) =>
      timeToCriterion === null ? null : printQuantity(timeToCriterion, 'time', { unit: 's', decimals: 2 }),
  },
  'accelerating-torque': {
    words: 'least accelerating torque',
    value: ({ leastAccelerating }) => `${percent(leastAccelerating.ofRated)} of rated torque`,
  },
  'heat-used': {
    words: 'heat used',
    value: ({ heatUsed }) => (heatUsed.figure === null ? null : percent(heatUsed.figure)),
  },
  'line-current': {
    words: 'highest line current',
    value: ({ peakLineCurrent }) => printQuantity(peakLineCurrent.current, 'current', { digits: 4 }),
  },
}

/**
 * What an anchor leads to in this revision; null where the record, case or limit is gone, so that a comment carried
 * over from an earlier revision is shown with the value of its time.
 */
export const findAnchor = (anchor: Anchor, ground: AnchorGround): Found | null => {
  const { document, summary, checks } = ground
  switch (anchor.kind) {
    case 'revision':
      return { label: 'The revision as a whole', value: null }
    case 'section': {
      const name = sectionNames[anchor.key]
      return name ? { label: `Report, ${name}`, value: null } : null
    }
    case 'check': {
      const check = checks.find(({ id }) => id === anchor.checkId)
      return check ? { label: check.sentence, value: check.passed ? 'passed' : 'not passed' } : null
    }
    case 'record':
      return findRecord(anchor, document)
    case 'verdict':
      return findVerdict(anchor, ground)
  }
  const result = summary.cases.find(({ caseId }) => caseId === anchor.caseId)
  if (!result || !document.cases.some(({ id }) => id === anchor.caseId)) return null
  const where = `Case ${caseTag(document, anchor.caseId)}`
  switch (anchor.kind) {
    case 'case':
      return { label: where, value: null }
    case 'voltage': {
      const place = result.places.find(({ busId }) => busId === anchor.busId)
      if (!place) return null
      const found = anchor.instant === 'before' ? place.before : (voltageAt(place, anchor.instant)?.voltage ?? null)
      const instant = anchor.instant === 'before' ? 'before the start' : instantNames[anchor.instant]
      return {
        label: `${where}, voltage at ${busTag(document, anchor.busId)}, ${instant}`,
        value: found === null ? null : volts(found, place.nominal),
      }
    }
    case 'start': {
      const start = result.motors.find(({ motorId }) => motorId === anchor.motorId)?.start
      if (!start) return null
      const { words, value } = startFigureWords[anchor.figure]
      return { label: `${where}, ${words} of ${motorTag(document, anchor.motorId)}`, value: value(start) }
    }
    case 'point': {
      const bus = anchor.curve === 'voltage'
      const there = bus
        ? result.places.some(({ busId }) => busId === anchor.of)
        : result.motors.some(({ motorId }) => motorId === anchor.of)
      if (!there) return null
      const name = bus ? busTag(document, anchor.of) : motorTag(document, anchor.of)
      const instant = formatNumber(anchor.at, { decimals: 2 })
      return { label: `${where}, ${anchor.curve} of ${name} at ${instant}\u2009s`, value: null }
    }
  }
}

const findVerdict = (
  { limitId, caseId }: Extract<Anchor, { kind: 'verdict' }>,
  { document, summary }: AnchorGround,
): Found | null => {
  const rule = document.limits.find(({ id }) => id === limitId)
  if (!rule || !document.cases.some(({ id }) => id === caseId)) return null
  const label = `Limit ${limitTag(document, limitId)} in case ${caseTag(document, caseId)}`
  const row = summary.verdicts.find((one) => one.ruleId === limitId && one.caseId === caseId)
  if (!row) return { label, value: 'does not apply' }
  const { closeOfLimit, closeVoltage } = document.settings
  const { value, unit } = formatVerdict(row, rule.quantity, {
    ofLimit: perUnit(closeOfLimit.si),
    voltage: perUnit(closeVoltage.si),
  })
  const word = row.word === 'not-assessed' ? 'not assessed' : row.word
  return { label, value: value === null ? word : `${value}${unit === '' ? '' : `\u2009${unit}`}, ${word}` }
}

const findRecord = (anchor: Extract<Anchor, { kind: 'record' }>, document: StudyDocument): Found | null => {
  const found = findField(document, anchor)
  if (!found) return null
  const noun = recordNouns[anchor.list] ?? 'Record'
  const field = found.words === '' ? '' : `, ${found.words}`
  return { label: `${noun} ${found.tag}${field}`, value: found.value }
}
