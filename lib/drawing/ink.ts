/** Every colour that a figure may use, by its job. */
export const inks = [
  'sheet',
  'ink',
  'soft',
  'rule',
  'grid',
  'shade',
  'accent',
  'series-1',
  'series-2',
  'series-3',
  'series-4',
  'series-5',
  'series-6',
  'meets',
  'close',
  'fails',
] as const

export type Ink = (typeof inks)[number]

/** On paper, in files and on a light screen. */
export const lightInk: Record<Ink, string> = {
  sheet: '#FFFFFF',
  ink: '#17212B',
  soft: '#4C5866',
  rule: '#8B8576',
  grid: '#DEDBD2',
  shade: '#E4EEEE',
  accent: '#0B5A63',
  'series-1': '#0B5A63',
  'series-2': '#B4530A',
  'series-3': '#5B3E8C',
  'series-4': '#3B6E1F',
  'series-5': '#9C2F63',
  'series-6': '#2F5FA8',
  meets: '#1C6444',
  close: '#7A4E00',
  fails: '#9C2118',
}

/** On a dark screen. */
export const darkInk: Record<Ink, string> = {
  sheet: '#1A222A',
  ink: '#E8E6DF',
  soft: '#A9B3BD',
  rule: '#6F7A85',
  grid: '#323C46',
  shade: '#223338',
  accent: '#6CC5CC',
  'series-1': '#6CC5CC',
  'series-2': '#F0A35E',
  'series-3': '#B9A2E6',
  'series-4': '#9CCB7A',
  'series-5': '#E892BC',
  'series-6': '#8FB4EE',
  meets: '#7CCBA2',
  close: '#E0B25C',
  fails: '#F08A7E',
}

/** The custom property that carries an ink on the screen; without a style sheet the light colour holds. */
export const inkVariable = (ink: Ink): string => `var(--figure-${ink}, ${lightInk[ink]})`

/** Declarations of all custom properties for one theme, for a style sheet. */
export const inkDeclarations = (theme: 'light' | 'dark'): string => {
  const colours = theme === 'light' ? lightInk : darkInk
  return inks.map((ink) => `--figure-${ink}: ${colours[ink]};`).join(' ')
}
