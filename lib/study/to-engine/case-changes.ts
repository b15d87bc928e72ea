import type { CaseChange, CaseRecord } from '../document/case-records'

type OfKind<K extends CaseChange['kind']> = Extract<CaseChange, { kind: K }>

/** The changes of one kind that a case makes, in the order in which they are listed. */
export const changesOf = <K extends CaseChange['kind']>({ changes }: CaseRecord, kind: K): OfKind<K>[] =>
  changes.filter((change): change is OfKind<K> => change.kind === kind)

/** The product of the factors that a case puts on something of a motor; 1 where it puts none. */
export const factorOn = (
  record: CaseRecord,
  kind: 'motor-admittance' | 'motor-torque' | 'inertia',
  motorId: string,
): number =>
  changesOf(record, kind)
    .filter(({ motor }) => motor === motorId)
    .reduce((product, { factor }) => product * factor.si, 1)
