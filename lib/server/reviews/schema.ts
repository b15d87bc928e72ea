import * as z from 'zod'
import { parseAnchor } from '@/lib/study/anchors/anchor'
import { commentClasses, responses } from '@/lib/study/review-words'
import { idInput } from '../identity'
import { ofRevision } from '../revisions/schema'

export const mostCommentLength = 4000

export const commentText = z
  .string()
  .trim()
  .min(1, 'Write what there is to say.')
  .max(mostCommentLength, `Keep this within ${mostCommentLength} characters.`)

export const anchorText = z
  .string()
  .max(300, 'This is no place of a revision.')
  .refine((text) => parseAnchor(text) !== null, 'Choose what the comment is about.')

export const newComment = ofRevision.extend({
  anchor: anchorText,
  kind: z.enum(commentClasses, 'Choose what kind of comment it is.'),
  text: commentText,
  assigneeId: idInput.nullable().default(null),
  dueOn: z.iso.date('Give a day.').nullable().default(null),
})

export const ofComment = ofRevision.extend({ commentId: idInput })

export const newReply = ofComment.extend({ text: commentText })

export const newResponse = ofComment.extend({ response: z.enum(responses), text: commentText })

export const newClosing = ofComment.extend({ reason: z.string().trim().max(2000).default('') })

export const newWaiver = ofRevision.extend({
  kind: z.enum(['check', 'comment']),
  subjectId: idInput,
  reason: z.string().trim().min(1, 'Give the reason in a sentence.').max(2000, 'Keep this within 2000 characters.'),
})

export const newTick = ofRevision.extend({ anchor: anchorText, ticked: z.boolean() })
