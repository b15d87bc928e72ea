import 'server-only'
import { notFound } from 'next/navigation'
import { DomainError } from '@/lib/errors'

/** What a link leads to; every link that is not in force is one and the same page. */
export const byLink = async <T>(find: () => Promise<T>): Promise<T> => {
  try {
    return await find()
  } catch (error) {
    if (error instanceof DomainError && ['not-found', 'invalid'].includes(error.code)) notFound()
    throw error
  }
}
