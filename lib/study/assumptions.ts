import type { StudyDocument } from './document/study-document'
import { walkEntered } from './walk-entered'
import { isShortCircuitLevel } from './words/level-text'

type Path = readonly (string | number)[]

/** Why a value lists itself: assumed, derived, without a source, or not stated so that the tool has to take something. */
export type AssumptionKind = 'assumed' | 'derived' | 'unsourced' | 'not-stated'

export interface Assumption {
  path: Path
  kind: AssumptionKind
  /** The value as typed, or what is computed with. */
  value: string
  /** The reason of an assumption, the formula of a derived value, what the tool does where nothing is stated. */
  reason: string
}

const noSource = 'No source is stated.'

const enteredAssumptions = (document: StudyDocument): Assumption[] =>
  [...walkEntered(document.frequency, ['frequency']), ...walkEntered(document.plant, ['plant'])].flatMap(
    ({ path, value }): Assumption[] => {
      const { provenance, text } = value
      if (!provenance || provenance.source.trim() === '')
        return [{ path, kind: 'unsourced', value: text, reason: noSource }]
      const { kind, source } = provenance
      return kind === 'assumed' || kind === 'derived' ? [{ path, kind, value: text, reason: source }] : []
    },
  )

const circuitNames = {
  'single-cage': 'single-cage circuit',
  'double-cage': 'double-cage circuit',
  'deep-bar': 'deep-bar circuit',
  'slot-bar': 'deep-bar circuit',
}

const circuitAssumptions = ({ plant }: StudyDocument): Assumption[] =>
  plant.motors.flatMap(({ circuit }, i): Assumption[] => {
    const path = ['plant', 'motors', i, 'circuit'] as const
    if (circuit.kind === 'estimated')
      return [
        {
          path,
          kind: 'derived',
          value: 'estimated circuit',
          reason: 'Fitted to the nameplate by least squares; many circuits fit one plate and differ in run-up time.',
        },
      ]
    if (circuit.kind === 'table') return []
    const value = circuitNames[circuit.kind]
    const { provenance } = circuit
    if (!provenance || provenance.source.trim() === '') return [{ path, kind: 'unsourced', value, reason: noSource }]
    const { kind, source } = provenance
    return kind === 'assumed' || kind === 'derived' ? [{ path, kind, value, reason: source }] : []
  })

const supplyAssumptions = ({ plant }: StudyDocument): Assumption[] =>
  plant.supplies.flatMap(({ voltageFactor, plantMotorsIncluded, instant, level }, i): Assumption[] => {
    const path = ['plant', 'supplies', i] as const
    const notStated = (field: string, value: string, reason: string): Assumption => ({
      path: [...path, field],
      kind: 'not-stated',
      value,
      reason,
    })
    return [
      ...(voltageFactor.kind === 'unknown' && isShortCircuitLevel({ level })
        ? [notStated('voltageFactor', '1.00', 'Unknown; a level that contains 1.1 makes every change a tenth deeper.')]
        : []),
      ...(plantMotorsIncluded === 'unknown' && level.form !== 'generator'
        ? [notStated('plantMotorsIncluded', 'no', "Unknown; a level that contains the plant's motors is too strong.")]
        : []),
      ...(instant === 'unknown' && level.form !== 'generator'
        ? [notStated('instant', 'as for the start', 'Unknown; an initial value is stronger than the supply is later.')]
        : []),
    ]
  })

/**
 * Every value of the plant that a reader must know to be weak: assumed, derived, without a source, or not stated at all.
 * Settings, schedules and limits are choices or carry their document with them and are not listed.
 */
export const assumptions = (document: StudyDocument): Assumption[] => [
  ...supplyAssumptions(document),
  ...enteredAssumptions(document),
  ...circuitAssumptions(document),
]
