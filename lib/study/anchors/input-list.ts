import type { ValueProvenance } from '../document/entered'
import type { StudyDocument } from '../document/study-document'
import { fieldPlace } from '../field-place'
import { walkEntered } from '../walk-entered'

/** An entered value with the anchor by which it is spoken of. */
export interface InputLine {
  anchor: string
  field: string
  text: string
  source: ValueProvenance | null
}

export interface InputGroup {
  /** `Motor M4`; `Study` for what belongs to none of the records. */
  record: string
  inputs: InputLine[]
}

/** Every entered value of the plant and of the study's own records, by record, in the order of the document. */
export const inputGroups = (document: StudyDocument): InputGroup[] => {
  const groups = new Map<string, InputGroup>()
  for (const { path, value } of walkEntered(document)) {
    const { anchor, record, field } = fieldPlace(document, path)
    if (record === 'Study') continue
    const group = groups.get(record) ?? { record, inputs: [] }
    groups.set(record, group)
    group.inputs.push({ anchor: `record/${anchor}`, field, text: value.text, source: value.provenance })
  }
  return [...groups.values()]
}
