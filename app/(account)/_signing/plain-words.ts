import { DomainError } from '@/lib/errors'

/** What to tell the user about something that went wrong: a refusal's own sentence, else that it was not his doing. */
export function plainWords(error: unknown): string {
  return error instanceof DomainError
    ? error.message
    : 'Something went wrong in this browser: load the page again and repeat the step.'
}
