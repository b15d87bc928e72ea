import type { Happened } from './happened'

const words: Record<string, string> = {
  'comment-made': 'made a comment',
  'comment-replied': 'replied to a comment',
  'comment-answered': 'answered a comment',
  'comment-closed': 'closed a comment',
  'comment-reopened': 'took up a comment again',
  'hold-up-waived': 'waived what held up the review',
  'revision-frozen': 'froze a revision',
  'revision-send-for-check': 'sent the revision for check',
  'revision-accept-check': 'accepted the check',
  'revision-reject-check': 'sent the revision back',
  'revision-accept-review': 'accepted the review',
  'revision-reject-review': 'rejected the review',
  'revision-close-review': 'closed the review',
  'revision-back-to-draft': 'took the revision back to draft',
  'revision-issue': 'issued the revision',
  'revision-withdraw': 'withdrew the revision',
  'record-added': 'added a record',
  'record-changed': 'changed a record',
  'record-removed': 'removed a record',
  'study-changed': 'changed the study',
  'computing-finished': 'finished computing the cases',
  'report-signed': 'signed the report',
}

/** What happened, for those who hear the page rather than see it; null where it is not worth saying. */
export const happenedSentence = ({ by, action, own }: Happened): string | null =>
  own || !words[action] ? null : `${by} ${words[action]}.`
