/** Words of the hand check. */
export const handCheck = {
  title: 'Hand check',
  intro: (motor: string, place: string) =>
    `To be followed with a pocket calculator: motor ${motor} alone, switched directly onto the line at standstill, with every other machine, static load and capacitor off. All impedances in ohm per phase, referred to ${place} with the ratios of the transformers.`,
  none: {
    noStart: 'No case starts a motor, so there is nothing to check by hand.',
    noPath:
      'The motor is not fed by one chain of lines and transformers, or no circuit fits its record; impedances in a row do not describe it.',
  },
  heads: { part: 'Part', how: 'How', r: 'R, Ω', x: 'X, Ω' },
  supply: (tag: string) => `Supply “${tag}”`,
  supplyLevel: (factor: string, voltage: string, level: string, ratio: string) =>
    `|Z| = ${factor} × (${voltage})² / ${level}, parted by X/R ${ratio}`,
  supplyImpedance: 'as stated',
  supplyGenerator: 'reactance of the generator at the first instant, in ohm at its rated voltage',
  line: (length: string, r: string, x: string, parallel: number) =>
    `${length} × (${r} + j ${x})${parallel > 1 ? ` / ${parallel}` : ''}`,
  transformer: (impedance: string, voltage: string, rating: string, ratio: string) =>
    `${impedance} × (${voltage})² / ${rating}, parted by X/R ${ratio}`,
  motorCircuit: 'its circuit at standstill',
  referred: (how: string, ratio: string) => `${how}; × ${ratio}² to refer it`,
  total: 'Sum',
  beyond: 'Sum without the supply',
  results: { what: 'Result', hand: 'By hand', tool: 'By the program', difference: 'Difference' },
  change: (place: string) => `Change at ${place}, % of the voltage before the start`,
  motorVoltage: 'Voltage at the motor, % of its rated voltage',
  current: 'Current of the motor, A',
  resultFormulas: (place: string) =>
    `Change at ${place}: 1 − |Z without supply| / |Z|. Voltage at the motor: |Z_{motor}| / |Z| times the voltage of the source, through the ratios. Current: the voltage of the source over √3 |Z|, through the ratios.`,
  emf: (voltage: string) =>
    `The voltage of the source is ${voltage}: with nothing else on, it is the voltage before the start.`,
  toolMissing:
    'The figures of the program for this reduced network were not handed over with the study, so that column is empty.',
  runningLoad: (tag: string, first: string, deepest: string) =>
    `With the running load of case ${tag}, its motors and its own starting method, the program finds ${first} % at switching-on and ${deepest} % at the deepest point of the run.`,
}
