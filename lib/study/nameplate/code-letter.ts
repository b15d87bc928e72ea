import { type Ampere, ampere, type Volt, type Watt } from '../../units/si'

/** Letters of the locked-rotor code and the kVA per horsepower at which each begins; I, O and Q are not used. */
const begins = [
  ['A', 0],
  ['B', 3.15],
  ['C', 3.55],
  ['D', 4],
  ['E', 4.5],
  ['F', 5],
  ['G', 5.6],
  ['H', 6.3],
  ['J', 7.1],
  ['K', 8],
  ['L', 9],
  ['M', 10],
  ['N', 11.2],
  ['P', 12.5],
  ['R', 14],
  ['S', 16],
  ['T', 18],
  ['U', 20],
  ['V', 22.4],
] as const

export type CodeLetter = (typeof begins)[number][0]

export const isCodeLetter = (text: string): text is CodeLetter => begins.some(([letter]) => letter === text)

/** One mechanical horsepower (550 ft·lbf/s) in watt. */
export const horsepower = 745.699871582

/** Locked-rotor kVA per horsepower at rated voltage: √3·U·I_LR over rated shaft power. */
export const kvaPerHorsepower = (lockedRotorCurrent: Ampere, voltage: Volt, power: Watt): number =>
  (Math.sqrt(3) * voltage * lockedRotorCurrent) / 1000 / (power / horsepower)

/** Code letter of so many kVA per horsepower (0 or more): each range holds its lower figure. Source: NEMA MG 1, 10.37.2. */
export const codeLetter = (kvaPerHp: number): CodeLetter => {
  const found = begins.findLast(([, from]) => kvaPerHp >= from)
  if (!found) throw new RangeError('kVA per horsepower is zero or more')
  return found[0]
}

/** kVA per horsepower of a letter: from (held) and below (not held); null where the letter has no end. */
export const codeLetterRange = (letter: CodeLetter): { from: number; below: number | null } => {
  const at = begins.findIndex(([name]) => name === letter)
  return { from: begins[at]?.[1] ?? 0, below: begins[at + 1]?.[1] ?? null }
}

/** Locked-rotor current at rated voltage between the two ends of a letter's range, A; a derived value, never a measured one. */
export const lockedRotorCurrentOf = (
  letter: CodeLetter,
  power: Watt,
  voltage: Volt,
): { from: Ampere; below: Ampere | null } => {
  const { from, below } = codeLetterRange(letter)
  const current = (kvaPerHp: number) => ampere((kvaPerHp * 1000 * (power / horsepower)) / (Math.sqrt(3) * voltage))
  return { from: current(from), below: below === null ? null : current(below) }
}
