import { expect, test } from 'vitest'
import type { MotorInput } from '@/lib/engine/case-input'
import { runCase } from '@/lib/engine/run-case'
import { reducedCase } from '@/lib/report/hand-check/reduced-case'
import { perUnit, radianPerSecond, second } from '@/lib/units/si'
import { simpleMotor, simplePlant, squareLoad, started } from '../../support/simple-plant'
import { softStarter, startCapacitor } from '../../support/starters'

test('the case for the pocket calculator is the bare direct start, whatever method, order, gear or dip the case has', () => {
  const duty = {
    ...started(softStarter(), squareLoad(900, 50), 4),
    after: { motorId: 'A', interval: second(5) },
    attempts: [{ runFor: second(3), rest: second(60) }],
    capacitors: [startCapacitor(200)],
    initialSpeed: radianPerSecond(-20),
  } as MotorInput['duty']
  const motors = [simpleMotor('A', started()), simpleMotor('M', duty, { shaft: 'S' })]
  const disturbance = { at: second(1), duration: second(0.2), remaining: perUnit(0.5) }
  const reduced = reducedCase(simplePlant(motors, 0.009, { disturbance }), 'M')!
  const plain = runCase(simplePlant([simpleMotor('M', started({ kind: 'direct' }, squareLoad(900, 50)))]))
  expect(reduced.disturbance).toBeUndefined()
  expect(runCase(reduced).motors[0]!.start!.standstill).toEqual(plain.motors[0]!.start!.standstill)
  expect(reducedCase(simplePlant(motors), 'X')).toBeNull()
})
