/** Words of scope, criteria, system, input data, assumptions and cases. */
export const records = {
  scope: {
    title: 'Purpose, scope and exclusions',
    purpose: 'Purpose',
    scope: 'Scope',
    exclusions: 'Exclusions',
    notTyped: (what: string) => `No ${what} was typed.`,
  },
  criteria: {
    title: 'Acceptance criteria',
    intro: (ofLimit: string, voltage: string) =>
      `The limits sheet as agreed for this study. A figure is **close** when it is inside its limit by less than ${ofLimit} of the limit (change, time, torque, heat) or by less than ${voltage} pu (remaining and highest voltage). Unrounded figures are compared.`,
    heads: {
      tag: 'No.',
      place: 'Place',
      what: 'What is limited',
      value: 'Limit',
      applies: 'Written for',
      source: 'Document, clause, edition',
    },
    all: 'all cases',
    notInUse: 'not in use for the starts declared',
    verify: 'verify against your edition',
    noDocument: 'no document stated',
    references:
      'Three references are used for voltages and never mixed: change in per cent of the voltage before the start; change in per cent of nominal voltage; remaining voltage in per cent, or in per unit, of nominal or rated voltage.',
  },
  system: {
    title: 'System',
    diagram: 'Single-line diagram',
    noText: 'No description was typed; the diagram and the input data describe the system.',
    diagramNote: (supply: string) =>
      `Supply condition “${supply}” is drawn at the source; all conditions are in the input data.`,
    noDiagram: 'There is no supply at a bus of the plant, so no diagram can be drawn.',
    goesOn: (sheet: number, of: number) => `Single-line diagram, sheet ${sheet} of ${of}`,
  },
  input: {
    title: 'Input data',
    intro:
      'Values stand as they were typed. The mark before a value says where it came from, the raised number which source it is in the list at the end of this section.',
    legendNone: 'no source stated',
    noSourceMark: '□',
    sources: 'Sources',
    sourceHeads: { number: 'No.', kind: 'Provenance', source: 'Document, formula or reason', count: 'Values' },
    none: 'none',
    kinds: {
      settings: 'Settings of the study',
      buses: 'Buses',
      supplies: 'Supply conditions',
      transformers: 'Transformers',
      lines: 'Lines and cables',
      loads: 'Static loads',
      capacitors: 'Capacitors',
      motors: 'Motors',
      circuits: 'Equivalent circuits of the motors',
      drivenLoads: 'Driven loads',
      starters: 'Starting methods',
      plantConditions: 'Plant conditions',
      loadConditions: 'Load conditions',
    },
    empty: 'No record of this kind.',
    record: 'Record',
    field: 'Value',
    study: 'This study',
  },
  assumptions: {
    title: 'Assumptions and open data',
    intro: 'Written from the provenance of the records: everything that nobody stated, and everything that is missing.',
    assumed: 'Assumed and derived values',
    heads: { record: 'Record', field: 'Value', value: 'As used', kind: 'Provenance', reason: 'Reason or formula' },
    noneAssumed: 'No value is assumed or derived.',
    unsourced: 'Values without a source',
    unsourcedNote: (count: number) => `${count} value${count === 1 ? '' : 's'} without a stated source:`,
    noneUnsourced: 'Every value has a source.',
    open: 'Open data',
    noneOpen: 'Nothing that the calculation asks for is missing.',
    openItems: {
      voltageFactor: (tags: string) =>
        `**Supply ${tags}**: the voltage factor contained in the level is unknown. It is taken as 1.00; a hidden 1.10 makes the supply a tenth weaker.`,
      instant: (tags: string) =>
        `**Supply ${tags}**: it is unknown whether the level is an initial, a transient or a steady value.`,
      motorsIncluded: (tags: string) =>
        `**Supply ${tags}**: it is unknown whether the level contains the plant's own motors; it is taken as not.`,
      date: (tags: string) => `**Supply ${tags}**: the level has no date.`,
      estimated: (tags: string) =>
        `**${tags}**: the equivalent circuit is estimated from the nameplate. A nameplate does not fix the run-up: the range over circuits that meet it stands with the results. Ask the maker for the torque-speed curve.`,
      pullUp: (tags: string) =>
        `**${tags}**: no pull-up torque is declared; a saddle in the torque below breakdown would not be seen.`,
      lockedRotorPowerFactor: (tags: string) => `**${tags}**: the power factor with locked rotor is not declared.`,
      permissible: (tags: string) =>
        `**${tags}**: no permissible locked-rotor time is declared, so the heat is not assessed.`,
      starts: (tags: string) => `**${tags}**: the maker's number of starts in succession is not recorded.`,
      middleStep: (tags: string) =>
        `**${tags}**: the closed transition is taken as instantaneous; the reactance of its middle step is not recorded.`,
      duty: (tags: string) => `**${tags}**: the duty of the starting device is not recorded.`,
    },
  },
  cases: {
    title: 'Cases',
    intro:
      'A case is a supply condition, a plant condition, a start schedule and a load condition. Design cases carry the verdict; compared cases show what other methods or settings would do; sensitivities depart from the records on purpose.',
    roles: { design: 'Design cases', comparison: 'Compared with the proposal', sensitivity: 'Sensitivities' },
    heads: { tag: 'Case', sentence: 'What is computed', outcome: 'How it ended' },
    none: 'none',
  },
}
