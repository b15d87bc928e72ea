import { type StudyDocument, type StudyDocumentInput, studyDocument } from '@/lib/study/document/study-document'
import { reportDocument } from './report-document'

const bus = (id: string, nominal: string, name = '') => ({ id, tag: id.toUpperCase(), name, nominal })

const cable = (id: string, from: string, to: string, parallel = 1) => ({
  id,
  tag: id.toUpperCase(),
  kind: 'cable' as const,
  from,
  to,
  resistance: '0.193 Ω/km',
  reactance: '0.1 Ω/km',
  susceptance: null,
  length: '180 m',
  parallel,
})

const transformer = (id: string, from: string, to: string, volts: readonly [string, string]) => ({
  id,
  tag: id.toUpperCase(),
  from,
  to,
  rating: '10 MVA',
  fromVoltage: volts[0],
  toVoltage: volts[1],
  impedance: '8 %',
  xOverR: '14',
  tap: '−2.5 %',
  vectorGroup: 'Dyn11',
})

const motor = (id: string, at: string, power: string, voltage: string) => ({
  id,
  tag: id.toUpperCase(),
  bus: at,
  ratedPower: power,
  ratedVoltage: voltage,
  poles: 4,
  ratedSpeed: '1487 r/min',
  efficiency: '95 %',
  powerFactor: '0.88',
  ratedCurrent: null,
  lockedRotorCurrent: '600 A',
  lockedRotorTorque: '0.9',
  pullUpTorque: null,
  breakdownTorque: '2.3',
  lockedRotorPowerFactor: null,
  circuit: { kind: 'estimated' as const },
  inertia: '40 kg·m²',
  permissibleCold: null,
  permissibleHot: null,
  startsCold: null,
  startsHot: null,
  startsPerHour: null,
})

/** Boards of a large plant: two transformers in parallel, boards tied to one another, motors behind cables, long names. */
const plant = (boards: number, motorsPerBoard: number): StudyDocumentInput['plant'] => {
  const names = Array.from({ length: boards }, (_, i) => `b${i + 1}`)
  const motors = names.flatMap((board) =>
    Array.from({ length: motorsPerBoard }, (_, k) => ({ board, id: `${board}m${k + 1}` })),
  )
  return {
    buses: [
      bus('sub', '33 kV', 'Intake substation of the whole works, metering of the utility'),
      bus('main', '6.6 kV', 'Main switchboard'),
      ...names.map((id, i) =>
        bus(id, '6.6 kV', `Sub-distribution board of area ${i + 1} with a name of sixty letters, no less`.slice(0, 60)),
      ),
      ...motors.map(({ id }) => bus(`${id}t`, '6.6 kV')),
    ],
    supplies: [
      {
        id: 'weakest',
        tag: 'weakest',
        bus: 'sub',
        level: { form: 'power', power: '180 MVA' },
        statedAt: '33 kV',
        voltageFactor: { kind: 'unknown' },
        instant: 'unknown',
        plantMotorsIncluded: 'unknown',
        xOverR: '4',
        before: { kind: 'open-circuit', voltage: '33 kV' },
        date: null,
      },
    ],
    transformers: [
      transformer('t1', 'sub', 'main', ['33 kV', '6.9 kV']),
      transformer('t2', 'sub', 'main', ['33 kV', '6.9 kV']),
    ],
    lines: [
      ...names.map((board) => cable(`c-${board}`, 'main', board, 2)),
      ...motors.map(({ board, id }) => cable(`c-${id}`, board, `${id}t`)),
      ...names.slice(1).map((board, i) => cable(`tie-${board}`, names[i]!, board)),
    ],
    loads: names.map((board) => ({
      id: `l-${board}`,
      tag: `L-${board.toUpperCase()}`,
      bus: board,
      active: '0.4 MW',
      reactive: '0.2 Mvar',
      ratedVoltage: '6.6 kV',
      mix: { impedance: 0.4, current: 0.2, power: 0.4 },
      floor: '0.7',
    })),
    capacitors: [{ id: 'k1', tag: 'K1', bus: 'main', rating: '2 Mvar', ratedVoltage: '7.2 kV' }],
    motors: motors.map(({ id }) => motor(id, `${id}t`, '750 kW', '6.6 kV')),
    drivenLoads: [],
    starters: [],
    plantConditions: [],
    loadConditions: [],
  }
}

/** A plant of 2 + boards · (1 + motors) buses, meshed and parallel in places. */
export const largePlant = (boards: number, motorsPerBoard: number): StudyDocument =>
  studyDocument.parse({ ...reportDocument, plant: plant(boards, motorsPerBoard), schedules: [], cases: [], limits: [] })
