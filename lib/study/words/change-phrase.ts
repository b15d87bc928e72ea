import type { CaseChange } from '../document/case-records'
import type { StudyDocument } from '../document/study-document'
import { motorTag, transformerTag } from './tags'

/** One departure of a sensitivity from the records, as a phrase. */
export const changePhrase = (change: CaseChange, document: StudyDocument): string => {
  switch (change.kind) {
    case 'voltage-before':
      return `${change.voltage.text} before the start`
    case 'voltage-factor':
      return `voltage factor ${change.value.text} contained in the level`
    case 'transformer-impedance':
      return `impedance of ${transformerTag(document, change.transformer)} ${change.impedance.text}`
    case 'motor-admittance':
      return `admittances of ${motorTag(document, change.motor)} × ${change.factor.text}`
    case 'motor-torque':
      return `torque of ${motorTag(document, change.motor)} × ${change.factor.text}`
    case 'inertia':
      return `inertia of ${motorTag(document, change.motor)} × ${change.factor.text}`
  }
}
