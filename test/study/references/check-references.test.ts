import { expect, test } from 'vitest'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { checkReferences } from '@/lib/study/references/check-references'
import { example } from '../support/examples'

type Change = (document: StudyDocument) => void

const issuesAfter = (change: Change, name: 'velmoor' | 'one-motor' = 'one-motor') => {
  const document = example(name)
  change(document)
  return checkReferences(document).map(({ path, message }) => `${path.join('.')}: ${message}`)
}

test('the examples fit together', () => {
  expect(issuesAfter(() => {})).toEqual([])
  expect(issuesAfter(() => {}, 'velmoor')).toEqual([])
})

const set = <T extends { si: number }>(value: T | null, si: number): T => {
  if (!value) throw new Error('nothing to change')
  return { ...value, si }
}

test.each<[string, Change, string]>([
  [
    'a line to a bus that does not exist',
    ({ plant }) => {
      plant.lines[0]!.to = 'nowhere'
    },
    'plant.lines.0.to: Line W1 refers to bus “nowhere”, which does not exist; choose one that does, or add it.',
  ],
  [
    'a line with both ends at one bus',
    ({ plant }) => {
      plant.lines[0]!.to = 'board'
    },
    'plant.lines.0.to: Line W1 begins and ends at the same bus; change one end.',
  ],
  [
    'an identity that stands twice',
    ({ plant }) => {
      plant.buses.push({ ...plant.buses[0]! })
    },
    'plant.buses.3.id: The identity “pcc” stands twice in this list; give one of the two records another.',
  ],
  [
    'a case with a supply that does not exist',
    ({ cases }) => {
      cases[0]!.supply = 'strong'
    },
    'cases.0.supply: Case C1 refers to supply “strong”, which does not exist; choose one that does, or add it.',
  ],
  [
    'a load condition with a curve that the load does not have',
    ({ plant }) => {
      plant.loadConditions[0]!.curves[0]!.process = 'half-open'
    },
    'plant.loadConditions.0.curves.0.process: Load condition Damper closed, then open asks for curve “half-open” of motor MF1, which its driven load does not have; choose one of its curves.',
  ],
  [
    'a starting motor without its curve',
    ({ plant }) => {
      plant.loadConditions[0]!.curves = []
    },
    'cases.0.loadCondition: The load condition of case C1 does not say which curve motor MF1 starts against; add it there.',
  ],
  [
    'a motor that runs and starts',
    ({ plant }) => {
      plant.plantConditions[0]!.running = [{ motor: 'fan-motor', curve: 'damper-open' }]
    },
    'cases.0.schedule: Motor MF1 both runs before the start and is started in case C1; choose another plant condition or schedule.',
  ],
  [
    'a motor that starts twice in a schedule',
    ({ schedules }) => {
      schedules[0]!.starts.push({ ...schedules[0]!.starts[0]! })
    },
    'schedules.0.starts.1.motor: Motor “fan-motor” stands twice in Schedule MF1 direct-on-line; remove one of the two.',
  ],
  [
    'a sensitivity without a reason',
    ({ cases }) => {
      cases[0]!.role = 'sensitivity'
    },
    'cases.0.reason: Say in words what the sensitivity C1 is for.',
  ],
  [
    'a design case that departs from the records',
    ({ cases, plant }) => {
      cases[0]!.changes = [{ kind: 'voltage-before', voltage: plant.supplies[0]!.before.voltage }]
    },
    'cases.0.role: Case C1 departs from the records, so it cannot be a design case; make it a sensitivity.',
  ],
  [
    'a limit on run-up time at a bus',
    ({ limits }) => {
      limits[1]!.place = { kind: 'every-bus' }
    },
    'limits.1.place: Limit R2 limits what exists at the starting motors only; choose that place.',
  ],
  [
    'a limit on voltage change against rated voltage',
    ({ limits }) => {
      limits[0]!.reference = 'rated'
    },
    'limits.0.reference: Limit R1 is set against the voltage before the start or nominal voltage; choose that reference.',
  ],
  [
    'a time limit given as a ratio',
    ({ limits }) => {
      limits[1]!.limit = limits[0]!.limit
    },
    'limits.1.limit: Limit R2 needs a time as its value.',
  ],
  [
    'a supply without X/R',
    ({ plant }) => {
      plant.supplies[0]!.xOverR = null
    },
    'plant.supplies.0.xOverR: Give the X/R of supply weakest; the report cannot leave it open, and there is no default for a weak network.',
  ],
  [
    'a rated speed above synchronous',
    ({ plant }) => {
      plant.motors[0]!.ratedSpeed = set(plant.motors[0]!.ratedSpeed, (1510 * Math.PI) / 30)
    },
    'plant.motors.0.ratedSpeed: Rated speed of motor MF1 must lie a little below 1500 r/min, which 4 poles give; check speed and poles.',
  ],
  [
    'an efficiency above one',
    ({ plant }) => {
      plant.motors[0]!.efficiency = set(plant.motors[0]!.efficiency, 95.6)
    },
    'plant.motors.0.efficiency: Efficiency of motor MF1 must lie above 0 and at most at 1 (100 %).',
  ],
  [
    'an estimated circuit without a locked-rotor current',
    ({ plant }) => {
      plant.motors[0]!.lockedRotorCurrent = null
    },
    'plant.motors.0.lockedRotorCurrent: The circuit of motor MF1 is estimated from its nameplate, which needs its locked-rotor current; enter it or type the circuit.',
  ],
  [
    'a bus that nothing joins to the supply',
    ({ plant }) => {
      plant.buses.push({ ...plant.buses[0]!, id: 'far', tag: 'FAR' })
    },
    'plant.buses.3: No line or transformer joins bus FAR to the supply at bus PCC; connect it or remove it.',
  ],
])('%s is named at its field', (_, change, sentence) => {
  expect(issuesAfter(change)).toEqual([sentence])
})

test('points that go backwards, a tap of zero and a factor on an absent motor are named too', () => {
  const change: Change = ({ plant, cases }) => {
    const points = plant.drivenLoads[0]!.curves[1]!
    if (points.kind !== 'points') throw new Error('not points')
    points.points.reverse()
    const at65 = plant.starters.find(({ id }) => id === 'at-65')
    if (at65?.kind === 'autotransformer') at65.tap = set(at65.tap, 0)
    cases[19]!.changes = [
      {
        kind: 'motor-torque',
        motor: 'm3',
        factor: cases[20]!.changes.flatMap((c) => ('factor' in c ? [c.factor] : []))[0]!,
      },
    ]
    cases[19]!.plantCondition = 'first'
  }
  const issues = issuesAfter(change, 'velmoor')
  expect(issues).toContain(
    'cases.19.changes.0.motor: A change of case C20 is about motor M3, which neither runs nor starts in it; remove the change or choose another motor.',
  )
  expect(issues).toContain(
    'plant.drivenLoads.0.curves.1.points.0.speed: The first point of a curve of P1 stands at 0 r/min; add it.',
  )
  expect(issues).toContain(
    'plant.starters.4.tap: The tap of starting method Autotransformer 65 % must lie above 0 and at most at 1 (100 %).',
  )
})

test('an envelope begins at once and its steps follow one another', () => {
  const change: Change = ({ limits }) => {
    const value = limits[0]!.limit.kind === 'ratio' ? limits[0]!.limit.value : null
    const time = (si: number) => ({ text: `${si} s`, si, quantity: 'time', style: 'point', provenance: null }) as const
    if (!value) throw new Error('no value')
    limits[0]!.limit = {
      kind: 'envelope',
      steps: [
        { from: time(0.1), value },
        { from: time(0.1), value },
      ],
    }
  }
  expect(issuesAfter(change)).toEqual([
    'limits.0.limit.steps.0.from: The first step of limit R1 begins at 0 s.',
    'limits.0.limit.steps.1.from: The steps of limit R1 must follow one another in time.',
  ])
})
