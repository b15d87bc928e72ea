import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { all } from '@/lib/policy/permission'
import { changeSentence } from '@/lib/study/diff/change-sentence'
import { diffInputs, type InputChange } from '@/lib/study/diff/diff-inputs'
import { diffResults, type ResultChange } from '@/lib/study/diff/diff-results'
import { diffVerdicts, type VerdictChange } from '@/lib/study/diff/diff-verdicts'
import { idInput } from '../identity'
import { query } from '../read'
import { loadGround } from '../reviews/ground'
import { loadRevision, type RevisionWithSubject } from '../revisions/subject'

/** One of the two sides, as it is named. */
export interface ComparedRevision {
  revisionId: string
  number: number
  attempt: number
}

export interface Comparison {
  studyId: string
  from: ComparedRevision
  to: ComparedRevision
  sentence: string
  verdicts: VerdictChange[]
  results: ResultChange[]
  inputs: InputChange[]
}

const named = ({ id, number, attempt }: RevisionWithSubject): ComparedRevision => ({ revisionId: id, number, attempt })

/** What is not the same in two revisions of one study: verdicts, figures, inputs. Both must be open to the person. */
export const compareRevisions = query({
  input: z.object({ from: idInput, to: idInput }),
  scope: ({ to }) => ({ kind: 'revision' as const, id: to }),
  load: async ({ tx }, { from, to }) => ({ from: await loadRevision(tx, from), to: await loadRevision(tx, to) }),
  may: (actor, { from, to }) => all(can(actor, 'read-revision', to.subject), can(actor, 'read-revision', from.subject)),
  run: async ({ tx }, _input, { from, to }): Promise<Comparison> => {
    if (from.row.studyId !== to.row.studyId) throw new DomainError('invalid', 'Choose two revisions of the same study.')
    const [before, after] = [await loadGround(tx, from.row.id), await loadGround(tx, to.row.id)]
    const inputs = diffInputs(before.document, after.document)
    const verdicts = diffVerdicts(before, after)
    return {
      studyId: to.row.studyId,
      from: named(from.row),
      to: named(to.row),
      sentence: changeSentence(inputs, verdicts),
      verdicts,
      results: diffResults(before, after),
      inputs,
    }
  },
})
