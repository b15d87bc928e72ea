import type { ErrorCode } from '@/lib/errors'

/** Why a download was refused, as the page says it; the address carries the short word only. */
export const refusals = {
  passphrase: 'The passphrase does not fit: it came apart from the link, type it again.',
  waiting: 'Too many wrong passphrases: wait a quarter of an hour and try again.',
  used: 'All downloads of this link are used: ask whoever sent it for another one.',
} as const

export type RefusalWord = keyof typeof refusals

/** The word for a refusal; null where the page itself says what is the matter. */
export const refusalWord = (code: ErrorCode): RefusalWord | null => {
  if (code === 'forbidden') return 'passphrase'
  if (code === 'too-many') return 'waiting'
  return code === 'wrong-state' ? 'used' : null
}

export const isRefusal = (word: unknown): word is RefusalWord => typeof word === 'string' && word in refusals
