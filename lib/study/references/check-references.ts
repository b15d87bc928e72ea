import type { FieldIssue } from '../../errors'
import type { StudyDocument } from '../document/study-document'
import { caseReferences } from './case-references'
import { checkValues } from './check-values'
import { conditionReferences } from './condition-references'
import { duplicateIds } from './duplicate-ids'
import { islandHints } from './island-hints'
import { limitReferences } from './limit-references'
import { networkReferences } from './network-references'
import { recordIndex } from './record-index'

/**
 * What a document of the right shape still has wrong: references that lead nowhere, records that do not fit together,
 * values that no plant can have, buses without a supply. Each comes as one sentence with the path to its field.
 */
export const checkReferences = (document: StudyDocument): FieldIssue[] => {
  const index = recordIndex(document)
  const references = [
    ...duplicateIds(document),
    ...networkReferences(document, index),
    ...conditionReferences(document, index),
    ...caseReferences(document, index),
    ...limitReferences(document, index),
    ...checkValues(document),
  ]
  // Without sound references a missing connection is only an echo of them.
  return references.length > 0 ? references : islandHints(document)
}
