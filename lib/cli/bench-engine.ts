import { estimateCircuit } from '../engine/estimate/estimate-circuit'
import type { Nameplate } from '../engine/estimate/nameplate'
import { runCase } from '../engine/run-case'
import { runWithVariants } from '../engine/run-variants'
import type { StudyDocument } from '../study/document/study-document'
import { runDocument } from '../study/run-document'
import { ampere, hertz, kilogramSquareMetre, newtonMetre, volt, watt } from '../units/si'
import { fromRpm } from '../units/speed'
import { type Figure, figure } from './figure'
import { largePlant } from './large-plant'
import { plainRunUp } from './plain-run-up'
import { speedCase } from './speed-case'
import { timeOf } from './timing'

/** How long each figure is measured, ms. */
const patience = 1500

/** An invented 1100 kW pump motor of six poles. */
const plate: Nameplate = {
  ratedPower: watt(1.1e6),
  ratedVoltage: volt(6600),
  frequency: hertz(50),
  poles: 6,
  ratedSpeed: fromRpm(992),
  efficiency: 0.957,
  powerFactor: 0.85,
  ratedCurrent: ampere(118.2),
  lockedRotorCurrent: ampere(651),
  lockedRotorTorque: newtonMetre(9053),
  breakdownTorque: newtonMetre(23_300),
  lockedRotorPowerFactor: null,
}

const runUp = (name: string, runningMotors: number): Figure[] => {
  const input = speedCase(runningMotors)
  const { counters, motors } = runCase(input)
  const { microseconds } = timeOf(() => runCase(input), patience)
  return [
    figure(`${name}: time of one run-up`, microseconds, 'µs'),
    figure(`${name}: steps`, counters.steps, '1'),
    figure(`${name}: evaluations`, counters.evaluations, '1'),
    figure(`${name}: run-up to 98 % of rated speed`, motors[0]?.start?.timeToCriterion ?? Number.NaN, 's'),
  ]
}

/** The speed case with an inertia that makes its run-up last ten seconds, and beside two running motors, by the models with transients. */
const withTransients = (): Figure[] => {
  const slow = speedCase()
  const long = { ...slow, motors: slow.motors.map((motor) => ({ ...motor, inertia: kilogramSquareMetre(376) })) }
  const fifth = { ...long, model: { kind: 'fifth-order' as const, switchingAngle: null } }
  const third = { ...speedCase(2), model: { kind: 'third-order' as const } }
  const [first] = runWithVariants(fifth).motors
  return [
    figure('fifth order beside quasi-static: run-up', first?.start?.timeToCriterion ?? Number.NaN, 's'),
    figure('fifth order beside quasi-static: time', timeOf(() => runWithVariants(fifth), patience).microseconds, 'µs'),
    figure('third order, three motors: time', timeOf(() => runCase(third), patience).microseconds, 'µs'),
  ]
}

/** How the time of a re-acceleration grows with buses and motors: everything fails for 0.3 s and comes back together. */
const growth = (): Figure[] =>
  [
    [50, 5],
    [100, 10],
    [200, 10],
    [200, 40],
    [500, 10],
    [500, 50],
  ].flatMap(([buses = 0, motors = 0]) => {
    const input = largePlant(buses, motors, true)
    const { counters, outcome } = runCase(input)
    if (outcome.kind !== 'complete') throw new Error(`the plant of ${buses} buses was not computed`)
    const { microseconds } = timeOf(() => runCase(input), patience)
    const name = `re-acceleration, ${buses} buses, ${motors} motors`
    return [
      figure(`${name}: time`, microseconds / 1000, 'ms'),
      figure(`${name}: evaluations`, counters.evaluations, '1'),
    ]
  })

/** Run-ups of the speed case, the same written by hand, one estimate and a whole study. */
export const benchEngine = (study: StudyDocument): Figure[] => {
  const alone = runUp('run-up, one motor', 0)
  const input = speedCase()
  const plain = timeOf(() => plainRunUp(input, 2000, 10), patience).microseconds
  const estimate = timeOf(() => estimateCircuit(plate), patience).microseconds
  const from = performance.now()
  const { cases } = runDocument(study)
  const whole = performance.now() - from
  return [
    ...alone,
    figure('run-up, one motor: hand-written loop of 2000 fixed steps', plain, 'µs'),
    figure('run-up, one motor: engine over hand-written loop', (alone[0]?.value ?? Number.NaN) / plain, '1'),
    ...runUp('run-up, two more motors running', 2),
    ...withTransients(),
    ...growth(),
    figure('estimate of a circuit from a nameplate', estimate, 'µs'),
    figure('demo study: time of all cases', whole, 'ms'),
    figure('demo study: cases', cases.length, '1'),
  ]
}
