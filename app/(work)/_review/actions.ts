'use server'

import { attempt } from '@/app/_action/attempt'
import { perform } from '@/lib/server/perform'
import {
  backToDraft,
  closeReview,
  decideCheck,
  decideReview,
  freezeRevision,
  issueRevision,
  sendForCheck,
  withdrawRevision,
} from '@/lib/server/revisions/commands'
import { completeSignature, prepareSignature } from '@/lib/server/signoff/commands'
import type { SignOffRole } from '@/lib/study/states'

export async function freeze(studyId: string, note: string) {
  return attempt((actor) => perform(freezeRevision, actor, { studyId, note }))
}

export async function send(revisionId: string, note: string) {
  return attempt((actor) => perform(sendForCheck, actor, { revisionId, note }))
}

export async function decideOnCheck(revisionId: string, accepted: boolean, note: string) {
  return attempt((actor) => perform(decideCheck, actor, { revisionId, accepted, note }))
}

export async function decideOnReview(revisionId: string, accepted: boolean, note: string) {
  return attempt((actor) => perform(decideReview, actor, { revisionId, accepted, note }))
}

export async function close(revisionId: string, purpose: string) {
  return attempt((actor) => perform(closeReview, actor, { revisionId, purpose }))
}

export async function takeBack(revisionId: string, reason: string) {
  return attempt((actor) => perform(backToDraft, actor, { revisionId, reason }))
}

export async function issue(revisionId: string, note: string) {
  return attempt((actor) => perform(issueRevision, actor, { revisionId, note }))
}

export async function withdraw(revisionId: string, reason: string) {
  return attempt((actor) => perform(withdrawRevision, actor, { revisionId, reason }))
}

export async function prepare(revisionId: string, role: SignOffRole) {
  return attempt((actor) => perform(prepareSignature, actor, { revisionId, role }))
}

export async function complete(revisionId: string, answer: { value: string; token: string }) {
  return attempt((actor) => perform(completeSignature, actor, { revisionId, ...answer }))
}
