import type { ReactElement } from 'react'
import { formatNumber } from '@/lib/quantity/format-number'
import { printQuantity } from '@/lib/quantity/print-quantity'
import { busTag } from '@/lib/study/words/tags'
import { chosenStart } from '../hand-check/chosen-start'
import { type HandCalculation, handCalculation } from '../hand-check/hand-calculation'
import { dataTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { appendix, type ReportContext } from '../report-context'
import { current, dash, percent } from '../values/figures'
import type { Section } from './section'

const partsTable = ({ paper, words, width }: ReportContext, hand: HandCalculation): ReactElement => {
  const say = words.handCheck
  const ohm = (value: number) => formatNumber(value, { decimals: 3 })
  const strong = 'semibold' as const
  const sum = (name: string, { re, im }: { re: number; im: number }) => [
    { text: name, weight: strong },
    '',
    { text: ohm(re), weight: strong },
    { text: ohm(im), weight: strong },
  ]
  return dataTable(paper, {
    width,
    columns: [
      { head: say.heads.part, width: 110, fixed: true },
      { head: say.heads.how, width: 1 },
      { head: say.heads.r, width: 56, fixed: true, align: 'right' },
      { head: say.heads.x, width: 56, fixed: true, align: 'right' },
    ],
    rows: [
      ...hand.parts.map(({ name, how, impedance }) => [
        { text: name, weight: strong },
        how,
        ohm(impedance.re),
        ohm(impedance.im),
      ]),
      sum(say.beyond, hand.beyond),
      sum(say.total, hand.total),
    ],
  })
}

/** The program's own figures for the reduced network. */
const toolFigures = ({ input }: ReportContext, hand: HandCalculation) => {
  const run = input.handCheck?.result
  const place = run?.places.find(({ busId }) => busId === hand.supply.bus)
  const start = run?.motors.find(({ motorId }) => motorId === hand.motor.id)?.start
  if (!place || !start) return null
  return {
    change: (place.before - place.first) / place.before,
    motorVoltage: start.standstill.motorVoltage / hand.motor.ratedVoltage.si,
    current: start.standstill.motorCurrent,
  }
}

const resultTable = (context: ReportContext, hand: HandCalculation): ReactElement => {
  const { paper, input, words, width } = context
  const say = words.handCheck
  const tool = toolFigures(context, hand)
  const row = (what: string, print: (value: number) => string, own: number, other: number | undefined) => [
    what,
    print(own),
    other === undefined ? dash : print(other),
    other === undefined ? dash : print(other - own),
  ]
  const ampere = (value: number) => (Math.abs(value) < 10 ? formatNumber(value, { decimals: 2 }) : current(value))
  return dataTable(paper, {
    width,
    columns: [
      { head: say.results.what, width: 1.8 },
      { head: say.results.hand, width: 1, align: 'right' },
      { head: say.results.tool, width: 1, align: 'right' },
      { head: say.results.difference, width: 1, align: 'right' },
    ],
    rows: [
      row(say.change(busTag(input.document, hand.supply.bus)), (v) => percent(v, 3), hand.change, tool?.change),
      row(say.motorVoltage, (v) => percent(v, 3), hand.motorVoltage, tool?.motorVoltage),
      row(say.current, ampere, hand.current, tool?.current),
    ],
  })
}

/** One motor alone at standstill by impedance arithmetic, with the program's own figures beside it. */
export const handCheck: Section = (context) => {
  const { paper, input, words, width } = context
  const { document, result } = input
  const say = words.handCheck
  const head = appendix(context, 'hand-check', say.title)
  const told = input.handCheck
  const given = document.cases.find(({ id }) => id === told?.caseId)
  const motor = document.plant.motors.find(({ id }) => id === told?.motorId)
  const start = given && motor ? { record: given, motor } : chosenStart(document)
  if (!start) return [head, ...paragraph(paper, say.none.noStart, { width })]
  const hand = handCalculation(document, start.record, start.motor, say)
  if (!hand) return [head, ...paragraph(paper, say.none.noPath, { width })]
  const place = busTag(document, hand.supply.bus)
  const run = result.cases.find(({ caseId }) => caseId === start.record.id)
  const own = run?.places.find(({ busId }) => busId === hand.supply.bus)
  return [
    head,
    ...paragraph(paper, say.intro(hand.motor.tag, place), { width }),
    partsTable(context, hand),
    ...paragraph(paper, say.resultFormulas(place), { width }),
    ...paragraph(paper, say.emf(printQuantity(hand.source, 'voltage', { digits: 5 })), { width }),
    resultTable(context, hand),
    ...(toolFigures(context, hand) ? [] : paragraph(paper, say.toolMissing, { width, ink: 'soft' })),
    ...(own
      ? paragraph(
          paper,
          say.runningLoad(
            start.record.tag,
            percent((own.before - own.first) / own.before),
            percent((own.before - own.deepest.voltage) / own.before),
          ),
          { width },
        )
      : []),
  ]
}
