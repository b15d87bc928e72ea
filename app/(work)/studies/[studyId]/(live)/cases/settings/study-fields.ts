import type { Field } from '@/lib/ui/form/field'

const text = (name: string, label: string, hint?: string): Field => ({
  kind: 'text',
  name,
  label,
  hint,
  optional: true,
  lines: 4,
})

/** Head, settings and texts of a study as its sheet asks for them. */
export const studyFields: readonly Field[] = [
  {
    kind: 'group',
    name: 'head',
    label: 'Title block',
    fields: [
      { kind: 'text', name: 'title', label: 'Title' },
      { kind: 'text', name: 'documentNumber', label: 'Document number' },
      { kind: 'text', name: 'organisation', label: 'Organisation' },
      { kind: 'text', name: 'project', label: 'Project' },
      { kind: 'text', name: 'client', label: 'Client', optional: true },
      { kind: 'text', name: 'utility', label: 'Utility', optional: true },
    ],
  },
  {
    kind: 'quantity',
    name: 'frequency',
    label: 'Frequency',
    quantity: 'frequency',
  },
  {
    kind: 'choice',
    name: 'numberStyle',
    label: 'How numbers are typed',
    options: [
      { value: 'point', label: '1,250.5' },
      { value: 'comma', label: '1.250,5' },
    ],
  },
  {
    kind: 'group',
    name: 'settings',
    label: 'Settings of the calculation',
    fields: [
      {
        kind: 'quantity',
        name: 'speedCriterion',
        label: 'Started at',
        quantity: 'ratio',
        hint: 'Of rated speed, with the starting device in its running position.',
      },
      { kind: 'quantity', name: 'timeLimit', label: 'A start is given up after', quantity: 'time' },
      {
        kind: 'choice',
        name: 'thermalState',
        label: 'Heat is judged against the permissible time',
        options: [
          { value: 'hot', label: 'hot' },
          { value: 'cold', label: 'cold' },
        ],
      },
      {
        kind: 'quantity',
        name: 'closeOfLimit',
        label: 'Close: within this part of a limit',
        quantity: 'ratio',
        hint: 'On change, time, torque and heat.',
      },
      {
        kind: 'quantity',
        name: 'closeVoltage',
        label: 'Close: within this of a voltage limit',
        quantity: 'ratio',
        hint: 'On remaining and highest voltage.',
      },
      { kind: 'quantity', name: 'startsPerDay', label: 'Starts a day intended', quantity: 'number' },
      { kind: 'quantity', name: 'startsPerHour', label: 'Starts an hour at most', quantity: 'number' },
    ],
  },
  {
    kind: 'group',
    name: 'texts',
    label: 'Texts of the report',
    fields: [
      text('purpose', 'Purpose of the study'),
      text('scope', 'Scope'),
      text('exclusions', 'Exclusions'),
      text('system', 'The system'),
      text('conclusions', 'Conclusions'),
      text('recommendation', 'Recommendation', 'The engineer’s own words; the report has none of its own.'),
      {
        kind: 'choice',
        name: 'paper',
        label: 'Paper of the report',
        options: [
          { value: 'A4', label: 'A4' },
          { value: 'Letter', label: 'Letter' },
        ],
      },
      {
        kind: 'references',
        name: 'leftOut',
        label: 'Left out of the report',
        to: 'part',
        hint: 'The report says that they were left out. All other parts always print.',
        options: [
          { value: 'plots', label: 'plots' },
          { value: 'comparison', label: 'comparison of starting methods' },
          { value: 'commissioning', label: 'measurements that would validate the model' },
          { value: 'hand-check', label: 'hand check' },
          { value: 'tables', label: 'full tables' },
          { value: 'utility-sheet', label: 'data sheet for the utility' },
          { value: 'start-card', label: 'start-count card' },
          { value: 'glossary', label: 'glossary' },
        ],
      },
      {
        kind: 'list',
        name: 'added',
        label: 'Own texts in chapters of the report',
        item: 'text',
        hint: 'Printed at the end of the chapter. {verdict}, {C2 change PCC}, {C2 lowest voltage PCC}, {C2 run-up M4}, {C2 line current M4}, {C2 least torque M4} and {C2 heat M4} are filled with values; the first word is the case, the last the bus or motor.',
        fields: [
          {
            kind: 'choice',
            name: 'part',
            label: 'Chapter',
            options: [
              { value: 'criteria', label: 'acceptance criteria' },
              { value: 'system', label: 'system' },
              { value: 'input', label: 'input data' },
              { value: 'assumptions', label: 'assumptions and open data' },
              { value: 'method', label: 'method' },
              { value: 'cases', label: 'cases' },
              { value: 'results', label: 'results' },
              { value: 'matrix', label: 'limits matrix' },
              { value: 'plots', label: 'plots' },
              { value: 'comparison', label: 'comparison of starting methods' },
              { value: 'commissioning', label: 'measurements' },
              { value: 'cautions', label: 'limitations and cautions' },
            ],
          },
          { kind: 'text', name: 'text', label: 'Text', lines: 4 },
        ],
      },
    ],
  },
]
