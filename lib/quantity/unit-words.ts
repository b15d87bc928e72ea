/** One unit word: how it is printed, and its name in the unit parser. */
export interface UnitWord {
  label: string
  expression: string
}

const word = (label: string, expression: string): UnitWord => ({ label, expression })

/** Words whose case matters (mΩ and MΩ). Everything else is also found by its lower-case spelling. */
const exact = new Map<string, UnitWord>([
  ['V', word('V', 'V')],
  ['mV', word('mV', 'mV')],
  ['kV', word('kV', 'kV')],
  ['GV', word('GV', 'GV')],
  ['A', word('A', 'A')],
  ['mA', word('mA', 'mA')],
  ['kA', word('kA', 'kA')],
  ['VA', word('VA', 'voltampere')],
  ['mVA', word('mVA', 'mvoltampere')],
  ['kVA', word('kVA', 'kvoltampere')],
  ['MVA', word('MVA', 'Mvoltampere')],
  ['GVA', word('GVA', 'Gvoltampere')],
  ['W', word('W', 'W')],
  ['mW', word('mW', 'mW')],
  ['kW', word('kW', 'kW')],
  ['MW', word('MW', 'MW')],
  ['GW', word('GW', 'GW')],
  ['var', word('var', 'reactivevar')],
  ['kvar', word('kvar', 'kreactivevar')],
  ['Mvar', word('Mvar', 'Mreactivevar')],
  ['Gvar', word('Gvar', 'Greactivevar')],
  ['hp', word('hp', 'mechanicalhorsepower')],
  ['PS', word('PS', 'metrichorsepower')],
  ['Ω', word('Ω', 'ohm')],
  ['mΩ', word('mΩ', 'mohm')],
  ['kΩ', word('kΩ', 'kohm')],
  ['MΩ', word('MΩ', 'Mohm')],
  ['S', word('S', 'S')],
  ['mS', word('mS', 'mS')],
  ['μS', word('µS', 'uS')],
  ['uS', word('µS', 'uS')],
  ['nS', word('nS', 'nS')],
  ['m', word('m', 'm')],
  ['km', word('km', 'km')],
  ['cm', word('cm', 'cm')],
  ['mm', word('mm', 'mm')],
  ['in', word('in', 'in')],
  ['ft', word('ft', 'ft')],
  ['kft', word('kft', 'kilofoot')],
  ['yd', word('yd', 'yd')],
  ['mi', word('mi', 'mi')],
  ['Hz', word('Hz', 'Hz')],
  ['kHz', word('kHz', 'kHz')],
  ['rad', word('rad', 'rad')],
  ['r', word('r', 'cycle')],
  ['N', word('N', 'N')],
  ['kN', word('kN', 'kN')],
  ['MN', word('MN', 'MN')],
  ['g', word('g', 'g')],
  ['kg', word('kg', 'kg')],
  ['t', word('t', 'tonne')],
  ['kgf', word('kgf', 'kgf')],
  ['lb', word('lb', 'lbm')],
  ['lbf', word('lbf', 'lbf')],
  ['slug', word('slug', 'slug')],
  ['s', word('s', 's')],
  ['ms', word('ms', 'ms')],
  ['μs', word('µs', 'us')],
  ['min', word('min', 'minute')],
  ['h', word('h', 'hour')],
])

/** Other spellings, in lower case, of the words above. */
const spellings: Record<string, string> = {
  volt: 'V',
  volts: 'V',
  amp: 'A',
  amps: 'A',
  ampere: 'A',
  amperes: 'A',
  watt: 'W',
  watts: 'W',
  mw: 'MW',
  mva: 'MVA',
  mvar: 'Mvar',
  ohm: 'Ω',
  ohms: 'Ω',
  mohm: 'mΩ',
  kohm: 'kΩ',
  feet: 'ft',
  foot: 'ft',
  inch: 'in',
  mile: 'mi',
  miles: 'mi',
  metre: 'm',
  metres: 'm',
  meter: 'm',
  meters: 'm',
  rev: 'r',
  revs: 'r',
  tr: 'r',
  kp: 'kgf',
  lbs: 'lb',
  lbm: 'lb',
  lbsf: 'lbf',
  sec: 's',
  second: 's',
  seconds: 's',
  msec: 'ms',
  minute: 'min',
  minutes: 'min',
  mins: 'min',
  hr: 'h',
  hrs: 'h',
  hour: 'h',
  hours: 'h',
  cv: 'PS',
}

/** Words written together; an exponent behind belongs to the last part. */
const joined: Record<string, readonly string[]> = {
  nm: ['N', 'm'],
  knm: ['kN', 'm'],
  mnm: ['MN', 'm'],
  kgm: ['kg', 'm'],
  tm: ['t', 'm'],
  kgfm: ['kgf', 'm'],
  kpm: ['kgf', 'm'],
  lbft: ['lb', 'ft'],
  lbfft: ['lbf', 'ft'],
  ftlb: ['ft', 'lb'],
  ftlbs: ['ft', 'lb'],
  ftlbf: ['ft', 'lbf'],
  lbin: ['lb', 'in'],
  lbfin: ['lbf', 'in'],
  inlb: ['in', 'lb'],
  inlbf: ['in', 'lbf'],
  slugft: ['slug', 'ft'],
}

const lowerCase = new Map([...exact].map(([key, value]) => [key.toLowerCase(), value]))
for (const [key, value] of Object.entries(spellings)) {
  const found = exact.get(value)
  if (found) lowerCase.set(key, found)
}

/** The unit words that one typed word stands for (several for `lbft`); null when it is not known. */
export const findUnitWords = (typed: string): readonly UnitWord[] | null => {
  const found = exact.get(typed) ?? lowerCase.get(typed.toLowerCase())
  if (found) return [found]
  const parts = joined[typed.toLowerCase()]
  if (!parts) return null
  return parts.flatMap((part) => exact.get(part) ?? [])
}
