import 'server-only'
import { notFound } from 'next/navigation'
import type * as z from 'zod'
import { signedIn } from '@/app/_action/signed-in'
import { DomainError } from '@/lib/errors'
import { type OwnQuery, type Query, read } from '@/lib/server/read'

const isHidden = (error: unknown): boolean =>
  error instanceof DomainError && ['not-found', 'forbidden', 'invalid'].includes(error.code)

/** The answer for the signed-in person; null where there is none, or it is not theirs to see. */
export const seek = async <Shape extends z.ZodType, Subject, Answer>(
  asked: Query<Shape, Subject, Answer> | OwnQuery<Shape, Answer>,
  input: z.input<Shape>,
): Promise<Answer | null> => {
  const actor = await signedIn()
  try {
    return await read(asked, actor, input)
  } catch (error) {
    if (isHidden(error)) return null
    throw error
  }
}

/**
 * What a page shows: the answer for the signed-in person. Whatever is not there, or not theirs to see, is one and the same page,
 * so that an address tells nobody what exists.
 */
export const ask = async <Shape extends z.ZodType, Subject, Answer>(
  asked: Query<Shape, Subject, Answer> | OwnQuery<Shape, Answer>,
  input: z.input<Shape>,
): Promise<NonNullable<Answer>> => (await seek(asked, input)) ?? notFound()
