import { describe, test } from 'vitest'
import { inStar, onTap, startOf } from './support/one-motor-case'
import { statedMotor } from './support/stated-motor'
import { within } from './support/within'

describe('Theraja, A Textbook of Electrical Technology (from memory, recomputed): starters', () => {
  test('a quarter of full-load torque from 4 pu locked-rotor current at slip 3 % needs a tap of 72.2 %', () => {
    const motor = statedMotor(4, 0.03)
    const torque = (tap: number) => startOf({ ...motor, starter: onTap(tap) }).standstill.torque / motor.ratedTorque
    within(torque(0.722), 0.25, 1.5e-3)
    within(torque(Math.sqrt(0.25 / 0.48)), 0.25, 1e-6)
  })

  test('5 pu locked-rotor current at slip 4 % starts with 0.333 pu torque in star and 0.25 pu on a tap of 50 %', () => {
    const motor = statedMotor(5, 0.04)
    const torque = (starter: Parameters<typeof startOf>[0]['starter']) =>
      startOf({ ...motor, starter }).standstill.torque / motor.ratedTorque
    within(torque(inStar), 1 / 3, 1e-6)
    within(torque(onTap(0.5)), 0.25, 1e-6)
  })
})
