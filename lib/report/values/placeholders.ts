import type { CaseResult } from '@/lib/engine/case-result'
import { printQuantity } from '@/lib/quantity/print-quantity'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { verdictWords } from '@/lib/study/words/verdict-words'
import type { ReportInput } from '../report-input'
import { current, withPercent, withSeconds } from './figures'

/** A named figure of a case: how it is found, and whether its last word is a bus or a started motor. */
interface CaseFigure {
  name: string
  of: 'bus' | 'motor'
  find: (run: CaseResult, id: string) => string | null
}

const place = (run: CaseResult, id: string) => run.places.find(({ busId }) => busId === id)
const startOf = (run: CaseResult, id: string) => run.motors.find(({ motorId }) => motorId === id)?.start
const kilovolts = (value: number): string => printQuantity(value, 'voltage', { digits: 4 })

/** `{C2 change PCC}`: case, figure, bus or motor. Longer names first, so that none hides in another. */
const caseFigures: readonly CaseFigure[] = [
  {
    name: 'voltage before',
    of: 'bus',
    find: (run, id) => {
      const at = place(run, id)
      return at ? kilovolts(at.before) : null
    },
  },
  {
    name: 'lowest voltage',
    of: 'bus',
    find: (run, id) => {
      const at = place(run, id)
      return at ? kilovolts(at.deepest.voltage) : null
    },
  },
  {
    name: 'change',
    of: 'bus',
    find: (run, id) => {
      const at = place(run, id)
      return at ? withPercent((at.before - at.deepest.voltage) / at.before) : null
    },
  },
  {
    name: 'run-up',
    of: 'motor',
    find: (run, id) => {
      const outcome = startOf(run, id)?.outcome
      return outcome?.kind === 'started' ? withSeconds(outcome.at) : null
    },
  },
  {
    name: 'line current',
    of: 'motor',
    find: (run, id) => {
      const start = startOf(run, id)
      return start ? `${current(start.standstill.lineCurrent)}\u2009A` : null
    },
  },
  {
    name: 'least torque',
    of: 'motor',
    find: (run, id) => {
      const start = startOf(run, id)
      return start ? withPercent(start.leastAccelerating.ofRated, 1) : null
    },
  },
  {
    name: 'heat',
    of: 'motor',
    find: (run, id) => {
      const figure = startOf(run, id)?.heatUsed.figure
      return figure === null || figure === undefined ? null : withPercent(figure, 1)
    },
  },
]

const ofCase = (words: string, { document, result }: Pick<ReportInput, 'document' | 'result'>): string | null => {
  // The longest tag that fits, because one tag may begin another.
  const [one] = document.cases
    .filter(({ tag }) => words.startsWith(`${tag} `))
    .toSorted((a, b) => b.tag.length - a.tag.length)
  const run = result.cases.find(({ caseId }) => caseId === one?.id)
  if (!one || !run) return null
  const rest = words.slice(one.tag.length + 1)
  const figure = caseFigures.find(({ name }) => rest.startsWith(`${name} `))
  if (!figure) return null
  const tag = rest.slice(figure.name.length + 1)
  const records: readonly { id: string; tag: string }[] =
    figure.of === 'bus' ? document.plant.buses : document.plant.motors
  const record = records.find((each) => each.tag === tag)
  return record ? figure.find(run, record.id) : null
}

const ofStudy = (words: string, { document, result }: Pick<ReportInput, 'document' | 'result'>): string | null => {
  const { head } = document
  const known: Record<string, string> = {
    verdict: verdictWords[result.overall.word],
    title: head.title,
    client: head.client,
    utility: head.utility,
    'document number': head.documentNumber,
    'number of cases': String(document.cases.length),
  }
  return known[words] ?? null
}

/**
 * A typed text with `{verdict}`, `{C2 change PCC}` or `{C2 run-up M4}` filled from document and result.
 *
 * @returns the text, and what stands in braces and names nothing; that prints as it was typed
 */
export const filledText = (
  text: string,
  input: Pick<ReportInput, 'document' | 'result'>,
): { text: string; unknown: readonly string[] } => {
  const unknown: string[] = []
  const filled = text.replace(/\{([^{}\n]{1,120})\}/g, (whole, inside: string) => {
    const words = inside.trim().replace(/\s+/g, ' ')
    const value = ofStudy(words, input) ?? ofCase(words, input)
    if (value === null) unknown.push(words)
    return value ?? whole
  })
  return { text: filled, unknown }
}

/** Names in braces in the author's texts that name nothing. */
export const unknownPlaceholders = (document: StudyDocument, result: ReportInput['result']): readonly string[] =>
  document.texts.added.flatMap(({ text }) => filledText(text, { document, result }).unknown)
