/** Whether a passphrase is good enough for a signing key, and one sentence about it. */
export interface PassphraseHint {
  readonly acceptable: boolean
  readonly sentence: string
}

const shortest = 12
const good = 20

/** Judges a passphrase by its length and variety, and against the words that others would try first: the person's own. */
export function passphraseHint(passphrase: string, ownWords: readonly string[]): PassphraseHint {
  const letters = [...passphrase.normalize('NFKC')]
  const lower = passphrase.toLowerCase()
  const own = ownWords.flatMap((words) => words.toLowerCase().split(/[\s@.]+/)).filter((word) => word.length > 3)
  if (letters.length < shortest)
    return no(`At least ${shortest} characters: four unrelated words are easy to remember.`)
  if (new Set(letters).size < 6) return no('Too few different characters: use four unrelated words.')
  if (own.some((word) => lower.includes(word))) return no('Leave out your own name, address and organisation.')
  if (letters.length < good) return { acceptable: true, sentence: 'Good enough; another word makes it much stronger.' }
  return { acceptable: true, sentence: 'Strong.' }
}

const no = (sentence: string): PassphraseHint => ({ acceptable: false, sentence })
