import type { GeneratorResult } from '@/lib/engine/case-result'
import { formatNumber } from '@/lib/quantity/format-number'
import type { CaseSummary } from '@/lib/study/summary'
import { generatorOutcomeWords } from '@/lib/study/words/generator-words'
import { type FigureRow, FigureTable } from './figure-table'
import { activePower, orDash, percent, seconds, voltage } from './print'

const hertz = (value: number): string => `${formatNumber(value, { decimals: 2 })}\u2009Hz`

const dip = (value: number, held: number): string => `${voltage(value)}, dip ${percent((held - value) / held)}`

const rows: readonly FigureRow<GeneratorResult>[] = [
  { label: 'Outcome', print: ({ outcome }) => generatorOutcomeWords[outcome] },
  { label: 'Voltage held before the load step', print: ({ held }) => voltage(held) },
  {
    label: 'First instant, behind the first reactance',
    print: ({ first, held }) => orDash(first, (value) => dip(value, held)),
  },
  {
    label: 'Initial dip: lowest voltage',
    print: ({ lowest, held }) => `${dip(lowest.voltage, held)}, at ${seconds(lowest.at)}`,
  },
  {
    label: 'Sustained dip: after the regulator, speeds held',
    print: ({ sustained, held }) => orDash(sustained, (value) => dip(value, held)),
  },
  { label: 'Settled voltage', print: ({ settled }) => orDash(settled, voltage) },
  {
    label: 'Lowest frequency',
    print: ({ lowestFrequency: { frequency, at } }) => `${hertz(frequency)}, at ${seconds(at)}`,
  },
  {
    label: 'Highest frequency',
    print: ({ highestFrequency: { frequency, at } }) => `${hertz(frequency)}, at ${seconds(at)}`,
  },
  { label: 'Settled frequency', print: ({ settledFrequency }) => orDash(settledFrequency, hertz) },
  {
    label: 'Largest power across the air gap',
    print: ({ largestPower: { power, at } }) => `${activePower(power)}, at ${seconds(at)}`,
  },
  { label: 'Excitation at its ceiling for', print: ({ atCeiling }) => seconds(atCeiling) },
]

/** What the generator that supplies the plant goes through; nothing on the network. */
export function GeneratorTable({ result }: { result: CaseSummary }) {
  if (!result.generator) return null
  return (
    <FigureTable
      caption="Generator"
      items={[result.generator]}
      itemId={() => 'generator'}
      name={() => 'Generator'}
      rows={rows}
    />
  )
}
