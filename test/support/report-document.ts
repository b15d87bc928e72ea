import { parseQuantity } from '@/lib/quantity/parse-quantity'
import type { ProvenanceKind } from '@/lib/quantity/provenance'
import type { QuantityName } from '@/lib/quantity/quantity-name'
import { type StudyDocument, type StudyDocumentInput, studyDocument } from '@/lib/study/document/study-document'

/** A value with its source, as the records hold it. */
export const stated = <Q extends QuantityName>(quantity: Q, text: string, kind: ProvenanceKind, source: string) => {
  const parsed = parseQuantity(text, quantity, 'point')
  if (!parsed.ok) throw new Error(parsed.message)
  return { text, si: parsed.si, quantity, style: 'point' as const, provenance: { kind, source } }
}

const cage = (r: number, x: number) => ({ r, x })

const pump = (id: string, bus: string) => ({
  id,
  tag: id.toUpperCase(),
  bus,
  maker: 'Brannoch Rotating Machines',
  ratedPower: stated('active-power', '1100 kW', 'guaranteed', 'tender sheet BRM-0461'),
  ratedVoltage: stated('voltage', '6.6 kV', 'guaranteed', 'tender sheet BRM-0461'),
  poles: 6,
  ratedSpeed: stated('speed', '992 r/min', 'guaranteed', 'tender sheet BRM-0461'),
  efficiency: stated('ratio', '95.7 %', 'guaranteed', 'tender sheet BRM-0461'),
  powerFactor: stated('ratio', '0.85', 'guaranteed', 'tender sheet BRM-0461'),
  ratedCurrent: stated('current', '118.2 A', 'guaranteed', 'tender sheet BRM-0461'),
  lockedRotorCurrent: stated('current', '651 A', 'guaranteed', 'tender sheet BRM-0461'),
  lockedRotorTorque: stated('ratio', '0.855', 'guaranteed', 'tender sheet BRM-0461'),
  pullUpTorque: null,
  breakdownTorque: stated('ratio', '2.2', 'guaranteed', 'tender sheet BRM-0461'),
  lockedRotorPowerFactor: stated('ratio', '0.181', 'guaranteed', 'tender sheet BRM-0461'),
  circuit: {
    kind: 'double-cage' as const,
    scale: { unit: 'pu' as const, base: '1350 kVA' },
    stator: { r: 0.0096, x: 0.11 },
    magnetising: 2.89,
    core: 43,
    provenance: { kind: 'guaranteed' as const, source: 'tender sheet BRM-0461' },
    inner: cage(0.01, 0.198),
    outer: cage(0.054, 0.1),
  },
  inertia: stated('inertia', '75 kg·m²', 'guaranteed', 'tender sheet BRM-0461'),
  permissibleCold: stated('time', '16 s', 'guaranteed', 'tender sheet BRM-0461'),
  permissibleHot: stated('time', '12 s', 'guaranteed', 'tender sheet BRM-0461'),
  startsCold: 2,
  startsHot: 1,
  startsPerHour: 2,
})

const closed = (id: string) => ({
  id: `${id}-closed`,
  name: 'valve closed',
  kind: 'power' as const,
  constant: '300 N·m',
  atRated: '4300 N·m',
  ratedSpeed: '992 r/min',
  exponent: '2',
  breakaway: { torque: '1400 N·m', until: '60 r/min' },
})

const open = (id: string) => ({
  id: `${id}-open`,
  name: 'valve open against static head',
  kind: 'points' as const,
  points: [
    { speed: '0 r/min', torque: '1400 N·m' },
    { speed: '400 r/min', torque: '950 N·m' },
    { speed: '780 r/min', torque: '2773 N·m' },
    { speed: '992 r/min', torque: '9430 N·m' },
  ],
})

const driven = (motor: string) => ({
  id: `${motor}-pump`,
  tag: `P${motor.slice(1)}`,
  motor,
  machine: 'radial-pump' as const,
  inertias: [
    { part: 'pump with water', inertia: '22 kg·m²', speedRatio: '1' },
    {
      part: 'surge flywheel',
      inertia: stated('inertia', '240 kg·m²', 'assumed', 'from the outline drawing'),
      speedRatio: '1',
    },
  ],
  curves: [closed(motor), open(motor)],
})

const everywhere = { supplies: null, plantConditions: null, methods: null, motors: null }

type Rule = StudyDocumentInput['limits'][number]

const limit = (
  id: string,
  rest: Pick<Rule, 'place' | 'quantity' | 'instant' | 'reference' | 'limit'> & Partial<Pick<Rule, 'startClass'>>,
): Rule => ({
  id,
  tag: id.toUpperCase(),
  appliesTo: everywhere,
  startClass: null,
  document: 'Ostrand Rural Distribution, connection letter OR-1147',
  clause: '4.2',
  edition: '2026',
  verify: true,
  ...rest,
})

const input: StudyDocumentInput = {
  format: 'breakaway-study',
  formatVersion: 1,
  head: {
    organisation: 'Lindqvar Engineering',
    project: 'Velmoor raw-water station, renewal of two pumps',
    client: 'Velmoor Water Board',
    utility: 'Ostrand Rural Distribution',
    title: 'Motor-starting study of pumps M1 and M2',
    documentNumber: 'VM-EL-0007',
  },
  frequency: '50 Hz',
  numberStyle: 'point',
  settings: {
    speedCriterion: '98 %',
    timeLimit: '60 s',
    thermalState: 'hot',
    closeOfLimit: '10 %',
    closeVoltage: '0.01',
    startsPerDay: '6',
    startsPerHour: '1',
  },
  texts: {
    purpose: 'To show whether the pumps can be started on the rural line at its weakest.',
    scope: 'Starting of M1 and M2 one at a time.',
    exclusions: 'Energisation of T1.',
    system: 'The station is fed by one overhead line and one transformer.',
    recommendation: '',
    conclusions: '',
  },
  plant: {
    buses: [
      {
        id: 'pcc',
        tag: 'PCC',
        name: 'tee on the rural line',
        nominal: stated('voltage', '33 kV', 'guaranteed', 'OR-1147'),
      },
      { id: 'mv', tag: 'MV', name: 'station switchboard', nominal: '6.6 kV' },
      { id: 'm1', tag: 'M1T', nominal: '6.6 kV' },
      { id: 'm2', tag: 'M2T', nominal: '6.6 kV' },
      { id: 'lv', tag: 'LV', name: 'auxiliary board', nominal: '400 V' },
    ],
    supplies: [
      {
        id: 'weakest',
        tag: 'weakest',
        bus: 'pcc',
        meaning: 'northern infeed out, one source transformer',
        level: { form: 'power', power: stated('apparent-power', '90 MVA', 'guaranteed', 'OR-1147 of 12 May 2026') },
        statedAt: '33 kV',
        voltageFactor: { kind: '1.00' },
        instant: 'initial',
        plantMotorsIncluded: 'no',
        xOverR: stated('ratio', '2.5', 'guaranteed', 'OR-1147 of 12 May 2026'),
        before: { kind: 'bus-voltage', voltage: stated('voltage', '32.4 kV', 'guaranteed', 'OR-1147 of 12 May 2026') },
        date: '2026-05-12',
        letter: 'OR-1147',
      },
    ],
    transformers: [
      {
        id: 't1',
        tag: 'T1',
        from: 'pcc',
        to: 'mv',
        rating: '8 MVA',
        fromVoltage: '33 kV',
        toVoltage: '6.9 kV',
        impedance: stated('ratio', '8 %', 'test', 'works test 1998-114'),
        xOverR: stated('ratio', '14', 'typical', 'maker’s catalogue'),
        tap: '0 %',
        vectorGroup: 'Dyn11',
      },
      {
        id: 't2',
        tag: 'T2',
        from: 'mv',
        to: 'lv',
        rating: '800 kVA',
        fromVoltage: '6.6 kV',
        toVoltage: '400 V',
        impedance: '5 %',
        xOverR: '5',
        tap: '0 %',
        vectorGroup: 'Dyn11',
      },
    ],
    lines: ['m1', 'm2'].map((motor, i) => ({
      id: `c${i + 1}`,
      tag: `C${i + 1}`,
      kind: 'cable' as const,
      from: 'mv',
      to: motor,
      resistance: '0.246 Ω/km',
      reactance: '0.105 Ω/km',
      susceptance: null,
      length: i === 0 ? '120 m' : '0.15 km',
      parallel: 1,
    })),
    loads: [
      {
        id: 'a2',
        tag: 'A2',
        bus: 'lv',
        active: stated('active-power', '0.15 MW', 'assumed', 'heating and control, by experience'),
        reactive: stated('reactive-power', '0.08 Mvar', 'assumed', 'heating and control, by experience'),
        ratedVoltage: '400 V',
        mix: { impedance: 0.4, current: 0.2, power: 0.4 },
        floor: '0.7',
      },
    ],
    capacitors: [{ id: 'k1', tag: 'K1', bus: 'mv', rating: '1.2 Mvar', ratedVoltage: '7.2 kV' }],
    motors: [pump('m1', 'm1'), pump('m2', 'm2')],
    drivenLoads: [driven('m1'), driven('m2')],
    starters: [
      { id: 'dol', tag: 'direct', kind: 'direct' },
      {
        id: 'at65',
        tag: 'AT 65 %',
        kind: 'autotransformer',
        tap: '65 %',
        own: { impedance: '6 %', rating: '4000 kVA', xOverR: '8' },
        changeOver: { kind: 'speed', at: '980 r/min' },
        gap: '0 s',
        duty: '3 starts of 20 s an hour (verify)',
      },
    ],
    plantConditions: [
      { id: 'last', tag: 'M1 running', running: [{ motor: 'm1', curve: 'm1-open' }], capacitors: ['k1'] },
    ],
    loadConditions: [
      {
        id: 'valve',
        tag: 'valve closed, then open',
        curves: [{ motor: 'm2', starting: 'm2-closed', process: 'm2-open' }],
      },
    ],
  },
  schedules: [
    { id: 's-dol', tag: 'M2 direct', starts: [{ motor: 'm2', at: '0 s', starter: 'dol' }] },
    { id: 's-at', tag: 'M2 on AT 65 %', starts: [{ motor: 'm2', at: '0 s', starter: 'at65' }] },
  ],
  cases: [
    {
      id: 'k-dol',
      tag: 'C1',
      supply: 'weakest',
      plantCondition: 'last',
      schedule: 's-dol',
      loadCondition: 'valve',
      role: 'design',
    },
    {
      id: 'k-at',
      tag: 'C2',
      supply: 'weakest',
      plantCondition: 'last',
      schedule: 's-at',
      loadCondition: 'valve',
      role: 'design',
    },
    {
      id: 'k-low',
      tag: 'C3',
      supply: 'weakest',
      plantCondition: 'last',
      schedule: 's-at',
      loadCondition: 'valve',
      role: 'sensitivity',
      reason: 'low end of the declared range',
      changes: [{ kind: 'voltage-before', voltage: '31.4 kV' }],
    },
  ],
  limits: [
    limit('r1', {
      place: { kind: 'bus', bus: 'pcc' },
      quantity: 'voltage-change',
      instant: 'deepest',
      reference: 'before',
      limit: { kind: 'ratio', value: '4.0 %' },
      startClass: { moreThanPerDay: 4, atMostPerDay: null, moreThanPerHour: null, atMostPerHour: 2 },
    }),
    limit('r4', {
      place: { kind: 'bus', bus: 'pcc' },
      quantity: 'voltage-change',
      instant: 'settled-after-process',
      reference: 'before',
      limit: { kind: 'ratio', value: '3.0 %' },
    }),
    limit('r5', {
      place: { kind: 'bus', bus: 'pcc' },
      quantity: 'remaining-voltage',
      instant: 'deepest',
      reference: 'nominal',
      limit: { kind: 'ratio', value: '0.90' },
    }),
    limit('r8', {
      place: { kind: 'running-motors' },
      quantity: 'remaining-voltage',
      instant: 'deepest',
      reference: 'rated',
      limit: { kind: 'ratio', value: '0.80' },
    }),
    limit('r11', {
      place: { kind: 'starting-motors' },
      quantity: 'run-up-time',
      instant: 'deepest',
      reference: 'rated',
      limit: { kind: 'time', value: '20 s' },
    }),
    limit('r13', {
      place: { kind: 'every-bus' },
      quantity: 'highest-voltage',
      instant: 'deepest',
      reference: 'nominal',
      limit: { kind: 'ratio', value: '1.10' },
    }),
  ],
}

/** A small invented station with every kind of record, for figures and reports. */
export const reportDocument: StudyDocument = studyDocument.parse(input)
