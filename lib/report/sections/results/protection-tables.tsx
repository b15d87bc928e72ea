import type { ReactElement } from 'react'
import type { CaseResult, StartResult } from '@/lib/engine/case-result'
import { leastOf } from '@/lib/engine/protection/steady-time'
import type { CaseRecord } from '@/lib/study/document/case-records'
import { startsAllowedIn } from '@/lib/study/starts-allowed'
import { startsAllowedPhrase } from '@/lib/study/words/protection-words'
import { motorTag } from '@/lib/study/words/tags'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import { type ReportContext, subsection } from '../../report-context'
import { small } from '../../theme'
import { current, dash, decimals, percent, seconds, withSeconds } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

interface Start {
  record: CaseRecord
  result: CaseResult
  motorId: string
  /** Tag with the number of the attempt where there were several. */
  name: string
  start: StartResult
}

const allStarts = ({ input }: ReportContext): readonly Start[] =>
  computedRuns(runsOf(input, roles)).flatMap(({ record, result }) =>
    result.motors.flatMap(({ motorId, start, earlierAttempts }) => {
      const all = start === null ? [] : [...(earlierAttempts ?? []), start]
      const tag = motorTag(input.document, motorId)
      return all.map((one, i) => ({
        record,
        result,
        motorId,
        name: all.length > 1 ? `${tag} · ${i + 1}` : tag,
        start: one,
      }))
    }),
  )

const right = 'right' as const
const title = ({ record }: Start) => ({ text: record.tag, weight: 'semibold' as const })

/** Margins of starts with a relay, the worst and the best voltage of each motor marked. */
export const protectionTable = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const say = words.protection.margins
  const starts = allStarts(context).filter(({ start }) => start.protection !== undefined)
  const head = subsection(context, 'results-protection', say.title)
  if (starts.length === 0) return [head, ...paragraph(paper, say.none, { width })]
  const voltage = ({ start }: Start): number => start.standstill.motorVoltage
  const remark = (one: Start): string => {
    const same = starts.filter(({ motorId }) => motorId === one.motorId).map(voltage)
    const rest = leastOf((one.start.protection?.elements ?? []).map(({ inhibitedFor }) => inhibitedFor ?? null))
    const words = [
      ...(same.length > 1 && voltage(one) === Math.min(...same) ? [say.worst] : []),
      ...(same.length > 1 && voltage(one) === Math.max(...same) ? [say.best] : []),
      ...(rest === null ? [] : [say.inhibited(withSeconds(rest, 0))]),
    ]
    return words.join('; ')
  }
  const rated = (motorId: string): number =>
    input.document.plant.motors.find(({ id }) => id === motorId)?.ratedVoltage.si ?? Number.NaN
  return [
    head,
    ...paragraph(paper, say.intro, { width }),
    dataTable(paper, {
      width,
      size: 7.2,
      columns: [
        { head: say.heads.case, width: 27, fixed: true },
        { head: say.heads.motor, width: 27, fixed: true },
        { head: say.heads.voltage, width: 1.1, align: right },
        { head: say.heads.started, width: 0.9, align: right },
        { head: say.heads.operates, width: 0.8, align: right },
        { head: say.heads.margin, width: 0.8, align: right },
        { head: say.heads.held, width: 0.8, align: right },
        { head: say.heads.heldTrip, width: 0.8, align: right },
        { head: say.heads.permissible, width: 1.15, align: right },
        { head: say.heads.heldMargin, width: 0.9, align: right },
        { head: say.heads.closest, width: 1.3, align: right },
        { head: say.heads.remark, width: 1.2 },
      ],
      rows: starts.flatMap((one) => {
        const { protection, standstill } = one.start
        if (protection === undefined) return []
        const { elements, startedAt, tripMargin, lockedRotor, limitCurve } = protection
        return [
          [
            title(one),
            one.name,
            percent(standstill.motorVoltage / rated(one.motorId), 1),
            seconds(startedAt),
            seconds(leastOf(elements.map(({ operatesAt }) => operatesAt))),
            seconds(tripMargin),
            current(lockedRotor.current),
            seconds(lockedRotor.trip),
            seconds(lockedRotor.permissible),
            seconds(lockedRotor.margin),
            limitCurve ? `${seconds(limitCurve.margin)} (${current(limitCurve.current)})` : dash,
            remark(one),
          ],
        ]
      }),
    }),
    ...paragraph(paper, say.caution, { width, ...small, ink: 'soft' }),
  ]
}

/** Heat that starts leave, and the starts an hour that all sources allow; nothing where no motor is started. */
export const heatTable = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const say = words.protection.heat
  const starts = allStarts(context).filter(({ record }) => record.role === 'design')
  if (starts.length === 0) return []
  const allowed = (one: Start): string => {
    const found = startsAllowedIn(input.document, input.result, one.result).find(
      ({ motorId }) => motorId === one.motorId,
    )
    return found ? startsAllowedPhrase(found.allowed) : dash
  }
  const ofMaker = (id: string): string => {
    const motor = input.document.plant.motors.find((each) => each.id === id)
    return `${motor?.startsCold ?? dash} / ${motor?.startsHot ?? dash}`
  }
  return [
    subsection(context, 'results-heat', say.title),
    ...paragraph(paper, say.intro, { width }),
    dataTable(paper, {
      width,
      size: 7.2,
      columns: [
        { head: say.heads.case, width: 27, fixed: true },
        { head: say.heads.motor, width: 27, fixed: true },
        { head: say.heads.ofStart, width: 0.8, align: right },
        { head: say.heads.before, width: 0.8, align: right },
        { head: say.heads.after, width: 0.8, align: right },
        { head: say.heads.makers, width: 0.8, align: right },
        { head: say.heads.succession, width: 1, align: right },
        { head: say.heads.rest, width: 1, align: right },
        { head: say.heads.perHour, width: 0.8, align: right },
        { head: say.heads.allowed, width: 2.6 },
      ],
      rows: starts.map((one) => {
        const heat = one.start.heatBalance
        return [
          title(one),
          one.name,
          percent(heat?.ofStart ?? null, 1),
          percent(heat?.before ?? null, 1),
          percent(heat?.after ?? null, 1),
          ofMaker(one.motorId),
          heat?.inSuccession ? `${heat.inSuccession.cold} / ${heat.inSuccession.hot ?? dash}` : dash,
          decimals(heat?.restBeforeNext === null || heat === undefined ? null : heat.restBeforeNext / 60, 1),
          heat?.perHour === null || heat === undefined ? dash : String(heat.perHour),
          allowed(one),
        ]
      }),
    }),
  ]
}
