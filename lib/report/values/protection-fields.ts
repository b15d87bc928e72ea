import type { MotorRecord } from '@/lib/study/document/machine-records'
import { elementPhrase } from '@/lib/study/words/protection-words'
import type { Wording } from '../wording/en'
import { ofEntered, ofWords, type RecordField } from './record-field'

/** Thermal data of a motor and the relay of its feeder. */
export const protectionFields = ({ protection: words, fields }: Wording): readonly RecordField<MotorRecord>[] => {
  const say = words.fields
  return [
    {
      label: say.thermalLimits,
      of: ({ thermalLimits }) => {
        const [first] = thermalLimits
        if (first === undefined) return null
        const points = thermalLimits.map(({ state, current, time }) =>
          say.limitPoint(fields.values[state], current.text, time.text),
        )
        return { text: points.join('; '), provenance: first.current.provenance }
      },
    },
    { label: say.coolingRunning, of: (one) => ofEntered(one.coolingRunning) },
    { label: say.coolingStopped, of: (one) => ofEntered(one.coolingStopped) },
    { label: say.relay, of: ({ protection }) => ofWords(protection?.relay ?? '') },
    { label: say.measures, of: ({ protection }) => protection && ofWords(say.sides[protection.measures]) },
    {
      label: say.transformer,
      of: ({ protection }) => {
        const transformer = protection?.currentTransformer ?? null
        return (
          transformer && {
            text: say.ratio(transformer.primary.text, transformer.secondary.text),
            provenance: transformer.primary.provenance,
          }
        )
      },
    },
    {
      label: say.elements,
      of: ({ protection }) => {
        const [first] = protection?.elements ?? []
        if (protection === null || first === undefined) return null
        const stated = { inverse: 'pickUp', definite: 'pickUp', 'overload-class': 'setting', 'thermal-image': 'base' }
        const source = Object.entries(first).find(([key]) => key === stated[first.kind])?.[1]
        const provenance = typeof source === 'object' && source !== null ? source.provenance : null
        const elements = protection.elements.map(elementPhrase).join('; ')
        return { text: say.settings(elements, say.settingsIn[protection.settingsIn]), provenance }
      },
    },
  ]
}
