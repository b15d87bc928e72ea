import { expect, test } from 'vitest'
import type { MotorResult, StartResult } from '@/lib/engine/case-result'
import type { VerdictWord } from '@/lib/engine/criteria/rule'
import { runDocument } from '@/lib/study/run-document'
import { type ChangeReference, voltageChange } from '@/lib/study/voltage-change'
import { toRpm } from '@/lib/units/speed'
import { example } from '../study/support/examples'

/**
 * The demo plant against figures of an independent reference calculation (quasi-static run-up, network solved at every
 * instant; C1, C2, C5, C7 and C8 from two independent formulations). Held to 0.1 % beside the half digit of the figure
 * as it was printed.
 */
const document = example('velmoor')
const result = runDocument(document)

const caseOf = (tag: string) => {
  const record = document.cases.find((one) => one.tag === tag)
  const found = result.cases.find(({ caseId }) => caseId === record?.id)
  if (!record || !found) throw new Error(`no case ${tag}`)
  return found
}
const place = (tag: string, busId: string) => {
  const found = caseOf(tag).places.find((one) => one.busId === busId)
  if (!found) throw new Error(`no place ${busId}`)
  return found
}
const started = (tag: string) => {
  const found = caseOf(tag).motors.find((motor): motor is MotorResult & { start: object } => motor.start !== null)
  if (!found) throw new Error(`nothing starts in ${tag}`)
  return found.start
}
const verdictOf = (tag: string, rule: string) => {
  const { caseId } = caseOf(tag)
  const limit = document.limits.find((one) => one.tag === rule)
  return result.verdicts.find((one) => one.caseId === caseId && one.ruleId === limit?.id)
}

/** Holds a figure to 0.1 % against one that was printed, for example `3.477`, and so itself known to half its last digit. */
const near = (value: number | null | undefined, printed: string, what: string) => {
  const wanted = Number(printed)
  const halfDigit = 0.5 * 10 ** -(printed.split('.')[1]?.length ?? 0)
  const room = 0.001 * Math.abs(wanted) + halfDigit
  expect(Math.abs((value ?? Number.NaN) - wanted), `${what}: ${value} instead of ${printed}`).toBeLessThanOrEqual(room)
}

const change = (tag: string, instant: 'first' | 'deepest', reference: ChangeReference = 'change-of-before') =>
  100 * (voltageChange(place(tag, 'pcc'), instant, reference) ?? Number.NaN)
const remaining = (tag: string, bus: string) => place(tag, bus).deepest.voltage / place(tag, bus).nominal

/** Case, PCC change at switching-on and deepest in %, its instant in s, MV and LV least in pu, line and motor A, motor pu. */
const voltages = `
C1   6.96  7.92  0.32  0.850 0.830  561   561   0.861
C2   3.06  3.48  0.30  0.938 0.919  247.7 381.1 0.585
C3   7.47  7.53  0.05  0.871 0.852  566   566   0.870
C4   3.30  3.33  0.05  0.955 0.937  250.8 385.8 0.592
C5   3.79  4.07  0.21  0.923 0.904  602   602   0.925
C6   1.64  1.76  0.21  0.992 0.974  261   402   0.617
C7   3.06  3.48  0.30  0.938 0.919  247.7 381.1 0.585
C8   3.06  4.77  10.15 0.918 0.900  247.7 381.1 0.585
C9   3.49  3.97  0.30  0.928 0.909  282.5 403.6 0.620
C10  4.40  5.00  0.30  0.908 0.889  355.8 444.8 0.683
C11  2.65  3.01  0.30  0.947 0.929  214.4 357.4 0.549
C12  2.26  2.86  16.27 0.956 0.937  182.9 332.5 0.510
C13  1.89  2.83  23.34 0.957 0.939  153.2 306.4 0.470
C14  5.06  5.57  0.25  0.890 0.871  583   583   0.896
C15  2.21  2.42  0.25  0.967 0.949  254.7 391.9 0.602
C16  11.07 11.16 0.10  0.799 0.778  210   323   0.496
C17  1.89  2.05  0.08  0.969 0.860  2424  2424  0.823
C18  0.71  1.20  1.48  0.986 0.920  917   917   0.934
`

/** Case, time to the speed criterion in s, least accelerating torque in % of rated, heat used in % from hot (– where not given). */
const runUps = `
C1  3.968  50.2 20.4
C2  10.318 16.0 24.3
C3  3.728  51.4 20.2
C4  9.769  16.8 24.0
C5  3.312  59.9 20.0
C6  8.833  19.3 23.4
C7  14.561 6.3  –
C8  10.201 16.0 24.3
C9  8.765  19.6 23.3
C10 6.772  26.6 22.1
C11 12.566 12.5 25.8
C12 16.137 9.1  28.2
C13 23.061 5.7  33.0
C14 3.581  55.3 20.1
C15 9.477  17.7 23.8
C16 16.09  7.8  28.1
C17 0.490  116  2.1
C18 1.500  32.3 –
C19 11.39  14.2 25.0
C20 8.59   20.1 27.9
C21 16.58  9.8  35.5
C22 12.51  12.5 29.3
C23 10.42  15.8 24.4
C24 10.63  15.5 24.5
C25 4.09   50.2 20.7
`

const rows = (table: string) =>
  table
    .trim()
    .split('\n')
    .map((line) => line.trim().split(/\s+/))

test.each(rows(voltages))('%s has the voltages and currents of the reference', (tag, ...figures) => {
  const [first, deepest, at, mv, lv, line, motor, terminals] = figures as [
    string,
    string,
    string,
    string,
    string,
    string,
    string,
    string,
  ]
  near(change(tag!, 'first'), first, 'PCC at switching-on')
  near(change(tag!, 'deepest'), deepest, 'PCC deepest')
  near(place(tag!, 'pcc').deepest.at, at, 'instant of the deepest')
  near(remaining(tag!, 'mv'), mv, 'MV')
  near(remaining(tag!, 'lv'), lv, 'LV')
  const { standstill } = started(tag!)
  near(standstill.lineCurrent, line, 'line current')
  near(standstill.motorCurrent, motor, 'motor current')
  const rated = document.plant.motors.find(({ id }) => id === caseOf(tag!).motors.find(({ start }) => start)?.motorId)
  near(standstill.motorVoltage / (rated?.ratedVoltage.si ?? 1), terminals, 'terminals at standstill')
})

/**
 * Running motors slow down in the first hundredths of a second, faster than the breakaway line falls, so the least torque
 * is met just after standstill (C1: 50.16 % at standstill, 49.97 % at 3 r/min). The sheet, sampled in time, lies between. `held` is the breakaway torque in N·m.
 */
const nearLeastTorque = ({ leastAccelerating, standstill }: StartResult, held: number, printed: string) => {
  const least = 100 * leastAccelerating.ofRated
  if (toRpm(leastAccelerating.speed) > 60) return near(least, printed, 'least accelerating torque')
  const rated = leastAccelerating.torque / leastAccelerating.ofRated
  const atStandstill = (100 * (standstill.torque - held)) / rated
  const half = 0.5 * 10 ** -(printed.split('.')[1]?.length ?? 0) + 0.001 * atStandstill
  expect(Number(printed), 'not below the least').toBeGreaterThan(least - half)
  expect(Number(printed), 'not above standstill').toBeLessThan(atStandstill + half)
}

test.each(rows(runUps))('%s runs up as in the reference', (tag, ...figures) => {
  const [time, torque, heat] = figures as [string, string, string]
  const start = started(tag!)
  near(start.timeToCriterion, time, 'time to 98 %')
  nearLeastTorque(start, tag === 'C17' || tag === 'C18' ? 200 : 1400, torque)
  if (heat !== '–') near(100 * (start.heatUsed.figure ?? Number.NaN), heat, 'heat used')
})

test.each([
  ['C19', '3.51'],
  ['C20', '4.08'],
  ['C21', '3.51'],
  ['C22', '3.48'],
  ['C23', '3.83'],
  ['C24', '3.38'],
  ['C25', '7.92'],
])('the sensitivity %s dips by %s %% at the PCC', (tag, deepest) => {
  near(change(tag, 'deepest'), deepest, 'PCC deepest')
})

test('C1 and C2 agree with two formulations to the last digit given', () => {
  near(started('C1').timeToCriterion, '3.9677', 'C1 time')
  near(change('C1', 'deepest'), '7.922', 'C1 deepest')
  near(started('C2').timeToCriterion, '10.3178', 'C2 time')
  near(change('C2', 'deepest'), '3.477', 'C2 deepest')
})

test('one start reads as three figures with three references', () => {
  near(change('C2', 'deepest'), '3.48', 'of the voltage before')
  near(change('C2', 'deepest', 'change-of-nominal'), '3.41', 'of nominal')
  near(change('C2', 'deepest', 'remaining-of-nominal'), '94.8', 'remaining')
})

test('before the last start the station takes 3.80 MW + j1.54 Mvar from 33.479 kV behind the supply', () => {
  const { supply } = caseOf('C2')
  near((supply?.powerBefore.re ?? 0) / 1e6, '3.80', 'P')
  near((supply?.powerBefore.im ?? 0) / 1e6, '1.54', 'Q')
  near((supply?.emf ?? 0) / 1e3, '33.479', 'EMF')
  near(place('C2', 'pcc').before / 1e3, '32.4', 'PCC before')
  near(place('C2', 'mv').before / 1e3, '6.645', 'MV before')
  near(place('C2', 'lv').before, '395.4', 'LV before')
})

test('energies of the start on the tap, and what is left running', () => {
  const c2 = started('C2')
  near(c2.i2t / 1e6, '1.2384', 'I²t of C2')
  near(c2.slipEnergy / 1e6, '2.451', 'slip energy of C2')
  near(c2.kineticEnergy / 1e6, '1.762', 'kinetic energy at 98 %')
  near(100 * (c2.heatUsed.byRotor ?? 0), '21.6', 'rotor heat of C2')
  near(started('C1').i2t / 1e6, '1.0372', 'I²t of C1')
  near(started('C1').slipEnergy / 1e6, '2.087', 'slip energy of C1')
  near((place('C2', 'pcc').settledAfterStart ?? 0) / 33_000, '0.9735', 'PCC settled')
  const pumps = caseOf('C1').motors.filter(({ motorId }) => ['m1', 'm2', 'm3'].includes(motorId))
  near(
    Math.min(...pumps.map(({ running }) => (running ? toRpm(running.lowestSpeed.speed) : 0))),
    '989.8',
    'lowest pump speed',
  )
})

test('once the valve is open direct-on-line and autotransformer end in the same state', () => {
  for (const tag of ['C1', 'C2', 'C25'])
    near(100 * (voltageChange(place(tag, 'pcc'), 'settled-after-process', 'change-of-before') ?? 0), '1.38', tag)
})

const word = (tag: string, rule: string): VerdictWord | 'no row' => verdictOf(tag, rule)?.word ?? 'no row'

test('direct-on-line and the 65 % tap against every limit of the sheet', () => {
  const sheet = Object.fromEntries(document.limits.map(({ tag }) => [tag, `${word('C1', tag)}, ${word('C2', tag)}`]))
  expect(sheet).toEqual({
    R1: 'fails, meets',
    R2: 'fails, meets',
    R3: 'fails, fails',
    R4: 'meets, meets',
    R5: 'close, meets',
    R6: 'meets, meets',
    R7: 'meets, meets',
    R8: 'meets, meets',
    R9: 'meets, no row',
    R10: 'meets, meets',
    R11: 'meets, meets',
    R12: 'meets, meets',
    R13: 'meets, meets',
    E1: 'fails, fails',
  })
  const inUse = document.limits.filter(({ tag }) => verdictOf('C1', tag)?.inUse).map(({ tag }) => tag)
  expect(inUse.join(' ')).toBe('R1 R4 R5 R6 R7 R8 R9 R10 R11 R12 R13')
})

test.each([
  ['C3', 'R1', 'fails'],
  ['C4', 'R1', 'meets'],
  ['C6', 'R1', 'meets'],
  ['C9', 'R1', 'close'],
  ['C10', 'R1', 'fails'],
  ['C10', 'R2', 'meets'],
  ['C11', 'R1', 'meets'],
  ['C12', 'R1', 'meets'],
  ['C12', 'R10', 'fails'],
  ['C13', 'R10', 'fails'],
  ['C13', 'R11', 'fails'],
  ['C14', 'R1', 'fails'],
  ['C14', 'R2', 'close'],
  ['C15', 'R1', 'meets'],
  ['C17', 'R1', 'meets'],
  ['C18', 'R1', 'meets'],
  ['C19', 'R1', 'meets'],
  ['C22', 'R10', 'meets'],
  ['C23', 'R1', 'close'],
  ['C24', 'R1', 'meets'],
] as const)('%s against %s: %s', (tag, rule, wanted) => {
  expect(word(tag, rule)).toBe(wanted)
})

test('trap: on the strongest supply direct-on-line meets the limit at standstill and fails it over the run', () => {
  expect(change('C5', 'first')).toBeLessThan(4)
  expect(change('C5', 'deepest')).toBeGreaterThan(4)
  expect(word('C5', 'R1')).toBe('fails')
  near(100 * -(verdictOf('C5', 'R1')?.margin ?? 0), '0.07', 'fails by')
})

test('trap: transferred at 95 % of synchronous speed the dip at the transfer fails the limit', () => {
  expect(word('C8', 'R1')).toBe('fails')
  const transfer = caseOf('C8').changeOvers.at(-1)
  expect(transfer?.tooEarly).toBe(true)
  near(transfer?.state.lineCurrent, '349.5', 'line current at transfer')
  near(place('C8', 'pcc').deepest.at, '10.15', 'instant')
  expect(caseOf('C8').notices.map(({ kind }) => kind)).toContain('change-over-too-early')
  expect(caseOf('C2').changeOvers.at(-1)?.tooEarly).toBe(false)
  near(caseOf('C2').changeOvers.at(-1)?.at, '10.38', 'transfer of C2')
})

test('trap: with the valve open the motor hangs on the tap at 974 r/min and is never transferred', () => {
  const { outcome, leastAccelerating } = started('C7')
  if (outcome.kind !== 'not-transferred') throw new Error(`C7 ended as ${outcome.kind}`)
  near(toRpm(outcome.speed), '974', 'speed')
  near(toRpm(leastAccelerating.speed), '933', 'speed of the least accelerating torque')
  expect(word('C7', 'R11')).toBe('fails')
  expect(verdictOf('C7', 'R4')).toMatchObject({ word: 'not-assessed', reason: 'state-not-reached' })
})

test('trap: on the 55 % tap the PCC limit is met and the torque is short', () => {
  expect([word('C12', 'R1'), word('C12', 'R10')]).toEqual(['meets', 'fails'])
})

test('all four at once fail R1, R2, R3, R5, R6, R7, R8 and R10', () => {
  const failed = document.limits.filter(({ tag }) => word('C16', tag) === 'fails').map(({ tag }) => tag)
  expect(failed.filter((tag) => tag !== 'E1')).toEqual(['R1', 'R2', 'R3', 'R4', 'R5', 'R6', 'R7', 'R8', 'R10'])
  near(verdictOf('C16', 'R8')?.value, '0.767', 'booster')
  const times = caseOf('C16').motors.flatMap(({ start }) => start?.timeToCriterion ?? [])
  near(Math.min(...times), '16.09', 'first pump')
  near(Math.max(...times), '16.12', 'last pump')
})

test('with plus tolerance on the locked-rotor current R1 fails by 0.08', () => {
  expect(word('C20', 'R1')).toBe('fails')
  near(100 * -(verdictOf('C20', 'R1')?.margin ?? 0), '0.08', 'fails by')
})

test('in the corner of least torque R10 fails by 0.2 points', () => {
  expect(word('C21', 'R10')).toBe('fails')
  near(100 * -(verdictOf('C21', 'R10')?.margin ?? 0), '0.2', 'fails by')
})

test('the 65 % tap fails the envelope of the second sheet, which is not in use', () => {
  const row = verdictOf('C2', 'E1')
  expect(row).toMatchObject({ word: 'fails', inUse: false, limit: 0.03 })
  near(100 * (row?.value ?? 0), '3.46', 'change at 2 s')
  near(row?.at, '2', 'instant')
})

test('the design cases meet every limit in use; R1 governs at the last pump on the weakest supply', () => {
  expect(result.overall.word).toBe('meets')
  expect(result.overall.counts).toMatchObject({ close: 0, fails: 0, 'not-assessed': 0 })
  expect(result.overall.governing).toMatchObject({ ruleId: 'r1', caseId: 'case-2', busId: 'pcc' })
})

test('torque at reduced voltage is named for every start on the tap', () => {
  expect(caseOf('C2').notices).toContainEqual({
    kind: 'reduced-voltage-torque',
    motorId: 'm4',
    voltage: started('C2').standstill.motorVoltage / 6600,
  })
  expect(caseOf('C1').notices).toEqual([])
})
