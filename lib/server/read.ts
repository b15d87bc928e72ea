import 'server-only'
import type * as z from 'zod'
import { DomainError } from '@/lib/errors'
import type { Permission } from '@/lib/policy/permission'
import type { PolicyActor } from '@/lib/policy/role'
import type { Actor } from './actor'
import { now } from './clock'
import type { ReadContext } from './context'
import { type Database, database, type Tx } from './db'
import { enter, enterEach } from './enter'
import { parseInput } from './parse-input'
import { policyActor, type Scope } from './place'

/** A question: what it needs, where it looks, who may ask, what it answers. */
export interface Query<Shape extends z.ZodType, Subject, Answer> {
  readonly input: Shape
  scope(input: z.output<Shape>): Exclude<Scope, { kind: 'self' }>
  load(context: ReadContext, input: z.output<Shape>): Promise<Subject>
  may(actor: PolicyActor, subject: Subject): Permission
  run(context: ReadContext, input: z.output<Shape>, subject: Subject): Promise<Answer>
}

/** What concerns the person alone and may reach into each of their organisations, one after the other. */
export interface OwnContext {
  tx: Tx
  actor: Actor
  at: Date
  each<T>(visit: (organisationId: string) => Promise<T>): Promise<T[]>
}

/** A question about the person who asks. */
export interface OwnQuery<Shape extends z.ZodType, Answer> {
  readonly input: Shape
  own(context: OwnContext, input: z.output<Shape>): Promise<Answer>
}

/** Names a query; its parts are inferred from each other. */
export const query = <Shape extends z.ZodType, Subject, Answer>(
  definition: Query<Shape, Subject, Answer>,
): Query<Shape, Subject, Answer> => definition

export const ownQuery = <Shape extends z.ZodType, Answer>(
  definition: OwnQuery<Shape, Answer>,
): OwnQuery<Shape, Answer> => definition

/**
 * Answers a query from one state of the database.
 * @throws DomainError for every refusal
 */
export async function read<Shape extends z.ZodType, Subject, Answer>(
  asked: Query<Shape, Subject, Answer> | OwnQuery<Shape, Answer>,
  actor: Actor,
  input: z.input<Shape>,
  db: Database = database(),
): Promise<Answer> {
  const parsed = parseInput(asked.input, input)
  return db.$transaction(
    async (tx) => {
      const at = now()
      if ('own' in asked) {
        return asked.own({ tx, actor, at, each: (visit) => enterEach(tx, actor, visit) }, parsed)
      }
      const place = await enter(tx, actor, asked.scope(parsed))
      const context: ReadContext = { tx, actor, place, policy: policyActor(actor.userId, place), at }
      const subject = await asked.load(context, parsed)
      const permission = asked.may(context.policy, subject)
      if (!permission.allowed) throw new DomainError('forbidden', permission.reason)
      return asked.run(context, parsed, subject)
    },
    { isolationLevel: 'RepeatableRead' },
  )
}
