import type { NotAssessedReason, VerdictWord } from '../../engine/criteria/rule'

/** The word of a verdict as it prints. */
export const verdictWords: Record<VerdictWord, string> = {
  meets: 'meets',
  close: 'close',
  fails: 'fails',
  'not-assessed': 'not assessed',
}

/** What each word means; for legends. */
export const verdictMeanings: Record<VerdictWord, string> = {
  meets: 'inside the limit',
  close: 'inside the limit by less than the margin stated with the study',
  fails: 'beyond the limit',
  'not-assessed': 'no verdict, for the reason given',
}

/** Why a limit has no verdict in a case. */
export const notAssessedReasons: Record<NotAssessedReason, string> = {
  'case-not-computed': 'the case has no solution before the start',
  'case-collapsed': 'the voltage collapses during the start',
  'case-refused': 'the case cannot be set up',
  'state-not-reached': 'the start does not reach that state',
  'not-declared': 'the data sheet is silent on what the limit needs',
  'transient-only':
    'only a transient model can judge it: switching on near synchronous speed, or closing on a residual voltage',
  'no-pull-up-data': 'a pull-up torque is declared that the circuit cannot show',
  'place-not-in-case': 'the case does not have that place',
  'no-protection': 'no relay is stated for the feeder',
  'no-pick-up': 'the current of the start is below the setting of every element',
}
