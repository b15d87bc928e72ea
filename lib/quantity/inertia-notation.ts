/** How an inertia was named: J and Wk² are mass times radius of gyration squared, GD² is four times that. */
export type InertiaNotation = 'J' | 'GD²' | 'Wk²'

const names: readonly (readonly [RegExp, InertiaNotation])[] = [
  [/^gd ?\^?2$/i, 'GD²'],
  [/^w[kr] ?\^?2$/i, 'Wk²'],
  [/^j$/i, 'J'],
]

const marker = String.raw`(?:gd ?\^?2|w[kr] ?\^?2|j)`
const before = new RegExp(String.raw`^(${marker})(?: ?[=:] ?| |(?=\d))(.+)$`, 'i')
const behind = new RegExp(String.raw`^(.+?) ?\(?(${marker})\)?$`, 'i')

/** Takes `GD²`, `Wk²` or `J` off the text in plain notation, before or behind the value; null where it has none. */
export const takeInertiaNotation = (text: string): { notation: InertiaNotation | null; text: string } => {
  const [, first, value] = before.exec(text) ?? []
  const [, valueBefore, last] = first === undefined ? (behind.exec(text) ?? []) : []
  const name = first ?? last
  if (name === undefined) return { notation: null, text }
  const notation = names.find(([pattern]) => pattern.test(name))?.[1] ?? null
  return { notation, text: (value ?? valueBefore ?? '').trim() }
}
