import type { CaseModel } from '../../engine/case-input'
import type { CaseRecord } from '../document/case-records'

/** The model that a case asks for; nothing where it is the quasi-static one. */
export const caseModelInput = ({ model, switchingAngle }: CaseRecord): { model?: CaseModel } => {
  if (model === 'quasi-static') return {}
  if (model === 'third-order') return { model: { kind: model } }
  return { model: { kind: model, switchingAngle: switchingAngle && (switchingAngle.si * Math.PI) / 180 } }
}
