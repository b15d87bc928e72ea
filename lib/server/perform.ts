import 'server-only'
import type * as z from 'zod'
import { DomainError } from '@/lib/errors'
import type { Permission } from '@/lib/policy/permission'
import type { PolicyActor } from '@/lib/policy/role'
import type { Actor } from './actor'
import { appendEvents, type Event, lockHead } from './audit'
import { now } from './clock'
import type { WriteContext } from './context'
import { type Database, database } from './db'
import { enter } from './enter'
import { parseInput } from './parse-input'
import { policyActor, type Scope } from './place'

/** What a command gives back: the answer for the page, and the events that say what it did. */
export interface Done<Answer> {
  answer: Answer
  events: readonly Event[]
}

/** A change: what it needs, where it happens, who may do it, what it does. */
export interface Command<Shape extends z.ZodType, Subject, Answer> {
  readonly input: Shape
  scope(input: z.output<Shape>): Exclude<Scope, { kind: 'self' }>
  /** Reads, under the lock, what the permission depends on. */
  load(context: WriteContext, input: z.output<Shape>): Promise<Subject>
  may(actor: PolicyActor, subject: Subject, input: z.output<Shape>): Permission
  run(context: WriteContext, input: z.output<Shape>, subject: Subject): Promise<Done<Answer>>
}

/** Names a command; its parts are inferred from each other. */
export const command = <Shape extends z.ZodType, Subject, Answer>(
  definition: Command<Shape, Subject, Answer>,
): Command<Shape, Subject, Answer> => definition

/**
 * Carries out a command in one transaction: parse, enter, lock the head row, load, permission, run, audit. Nothing of it is seen by
 * others, or kept, unless all of it is.
 * @throws DomainError for every refusal
 */
export async function perform<Shape extends z.ZodType, Subject, Answer>(
  { input: shape, scope, load, may, run }: Command<Shape, Subject, Answer>,
  actor: Actor,
  input: z.input<Shape>,
  db: Database = database(),
): Promise<Answer> {
  const parsed = parseInput(shape, input)
  return db.$transaction(async (tx) => {
    const place = await enter(tx, actor, scope(parsed))
    const head = await lockHead(tx, place.organisationId, place.projectId)
    const context: WriteContext = { tx, actor, place, policy: policyActor(actor.userId, place), at: now() }
    const subject = await load(context, parsed)
    const permission = may(context.policy, subject, parsed)
    if (!permission.allowed) throw new DomainError('forbidden', permission.reason)
    const { answer, events } = await run(context, parsed, subject)
    // whoever comes by a link has no account, so that the row names no person
    await appendEvents(tx, head, { userId: actor.userId || null, name: actor.name }, context.at, events)
    return answer
  })
}
