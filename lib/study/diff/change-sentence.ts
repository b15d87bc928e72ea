import { listed } from '../words/list-words'
import type { InputChange } from './diff-inputs'
import type { VerdictChange } from './diff-verdicts'

/** More than these are counted. */
const mostNamed = 3

const input = ({ record, field, before, after }: InputChange): string => {
  if (field === 'the record') return `${record} ${after === null ? 'removed' : 'added'}`
  return `${record}, ${field}: ${before ?? 'none'} to ${after ?? 'none'}`
}

const named = (texts: readonly string[]): string =>
  texts.length <= mostNamed
    ? listed(texts)
    : `${texts.slice(0, mostNamed).join('; ')}; and ${texts.length - mostNamed} more`

/** What changed against the revision before, for the revision table: inputs, then verdicts with another word. */
export const changeSentence = (inputs: readonly InputChange[], verdicts: readonly VerdictChange[]): string => {
  // the words of sources and of the report change no figure
  const counted = inputs.filter(({ field, record }) => !field.startsWith('source of ') && record !== 'Study')
  const flipped = verdicts.filter((one) => one.flipped)
  const first = counted.length === 0 ? 'No input of the calculation changed.' : `Changed: ${named(counted.map(input))}.`
  const word = (text: string | null): string => text?.split(', ').at(-1) ?? 'not there'
  const second =
    flipped.length === 0
      ? 'No verdict changed.'
      : `Verdicts changed: ${named(flipped.map((one) => `${one.limit} in ${one.case} from ${word(one.before)} to ${word(one.after)}`))}.`
  return `${first} ${second}`
}
