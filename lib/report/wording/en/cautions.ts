import type { OptionalPart } from '@/lib/study/document/study-document'

/** Limitations, cautions, what is missing and the glossary. */
export const cautions = {
  title: 'Limitations and cautions',
  disclaimer: [
    'This report supports the judgement of a licensed engineer and does not replace it. Local codes, the written acceptance of the utility and the data of the makers prevail over anything printed here.',
    'The model is balanced, at fundamental frequency and in RMS values. Switching surges, torsional stress, harmonics, unbalance and arc flash are not assessed. A weak source can lengthen the clearing of faults: these levels must not be reused for a hazard study.',
    'A start curve below a trip curve is no protection setting.',
    'The number of starts allowed is the least of what the utility, the maker of the motor, the maker of the starting device and the process allow. The heat figures here may lower it, never raise it.',
  ],
  touched: 'Named because the data of this study touch them',
  capacitors:
    'Capacitors are in the plant: overvoltage after load rejection, switching surges and resonance are not assessed; a bank tied to a motor must not be able to self-excite it.',
  openTransition:
    'A starting device changes over with a gap: the transient on reclosing can exceed the currents and torques given here and is not assessed.',
  autotransformer:
    'An autotransformer is used: its duty, and the middle step of a closed transition, are to be confirmed by its maker.',
  reacceleration:
    'Motors run while another starts: stored energy and residual voltage after an interruption, and reclosing onto them, are not assessed.',
  repeated: 'Repeated starts heat the rotor further: the maker’s cooling times between starts hold.',
  transformer:
    'Energising a transformer on a weak line can dip its voltage deeper than a motor start and is not assessed; the delay of line regulators is taken as longer than the run.',
  process: 'A pump or fan can surge or hammer when its motor dips or trips; the process side is not assessed.',
  missing: {
    title: 'What this report does not contain',
    intro: 'Parts that a reader may look for, and why they are not here.',
    items: [
      [
        'Breakeven level',
        'The least short-circuit level at which every limit still holds is not part of the computed study.',
      ],
      [
        'Tolerance analysis',
        'Tolerances were not sampled; named corners are computed as sensitivities where they are listed.',
      ],
      ['Flicker severity', 'No limit on Pst or Plt is in the limits sheet; limits on single changes are held instead.'],
      ['Protection overlay', 'No protection curve is part of the records.'],
      ['Starter failed or bypassed', 'Covered only where a compared case starts the motor direct-on-line.'],
    ] as readonly (readonly [string, string])[],
    flicker: 'Flicker severity',
    leftOut: 'Left out by the author of this revision.',
    parts: {
      plots: 'Plots',
      comparison: 'Comparison of starting methods',
      commissioning: 'Measurements that would validate the model',
      'hand-check': 'Hand check',
      tables: 'Full tables',
      'utility-sheet': 'Data sheet for the utility',
      'start-card': 'Start-count card',
      glossary: 'Glossary',
    } satisfies Record<OptionalPart, string>,
    heads: { part: 'Part', why: 'Why it is missing' },
  },
  glossary: {
    title: 'Glossary',
    heads: { term: 'Term', us: 'Also called', meaning: 'Meaning in this report' },
    rows: [
      [
        'Point of common coupling',
        'PCC',
        'Place in the public network, nearest to the plant, where others are or could be connected.',
      ],
      [
        'Short-circuit level',
        'fault level, fault MVA',
        'Apparent power √3 · U · I_{k} of a three-phase fault, with the voltage it is stated at.',
      ],
      ['X/R', '', 'Ratio of reactance to resistance of an impedance.'],
      ['Voltage factor c', '', 'Factor between the driving voltage of the stated level and the nominal voltage.'],
      ['Voltage change, dip', 'sag', 'Fall of the RMS voltage during the start; always given with its reference.'],
      ['Remaining voltage', 'retained voltage', 'Lowest RMS voltage during the start.'],
      [
        'Locked-rotor current',
        'inrush, starting current',
        'Steady RMS current at standstill; at rated voltage unless another is said.',
      ],
      ['Pull-up torque', '', 'Least torque between standstill and breakdown.'],
      ['Breakdown torque', 'pull-out torque', 'Largest torque at steady rated voltage.'],
      ['Accelerating torque', '', 'Torque of the motor less that of the load.'],
      [
        'Run-up time',
        'acceleration time',
        'From switching-on to the speed criterion with the starting device in its running position.',
      ],
      [
        'Permissible locked-rotor time',
        'safe stall time',
        'Time for which the motor may stand with locked rotor at rated voltage, from cold or from hot.',
      ],
      ['Inertia J', 'Wk², GD² = 4 J', 'Moment of inertia referred to the motor shaft.'],
      [
        'Direct-on-line',
        'across-the-line, full-voltage',
        'Start by connecting the motor to the line without a device between.',
      ],
      ['Autotransformer start', 'reduced-voltage start, Korndörfer', 'Start on a tap, then transfer to the line.'],
      ['Star-delta', 'wye-delta', 'Start with the winding in star, then transfer to delta.'],
      ['Thevenin equivalent', '', 'Voltage behind an impedance that acts like the public network at the supply bus.'],
    ] as readonly (readonly [string, string, string])[],
  },
}
