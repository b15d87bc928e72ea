import { describe, expect, it } from 'vitest'
import { directStartPeaks } from '@/lib/engine/direct-start-peaks'
import { runCase } from '@/lib/engine/run-case'
import { ohm } from '@/lib/units/si'
import { autotransformer, simpleMotor, simplePlant, squareLoad, started } from '../support/simple-plant'

const motor = (at = 0) => simpleMotor('M', started({ kind: 'direct' }, squareLoad(300), at))

describe('peaks of a direct start', () => {
  it('stand above the symmetrical peak by what the DC part adds: one to two times it', () => {
    for (const reactance of [1e-4, 0.003, 0.01]) {
      const input = simplePlant([motor()], reactance)
      const [peak] = directStartPeaks(input)
      const { standstill } = runCase(input).motors[0]!.start!
      const share = peak!.peakCurrent.current / (Math.SQRT2 * standstill.motorCurrent)
      expect(share).toBeGreaterThan(1.1)
      expect(share).toBeLessThan(2)
      expect(peak!.peakCurrent.at).toBeLessThan(0.03)
    }
  })

  it('have a torque above that of locked rotor, and one below zero', () => {
    const input = simplePlant([motor()], 0.003)
    const [peak] = directStartPeaks(input)
    expect(peak!.peakTorque.torque).toBeGreaterThan(2 * runCase(input).motors[0]!.start!.standstill.torque)
    expect(peak!.lowestTorque.torque).toBeLessThan(peak!.peakTorque.torque)
  })

  it('fall with the supply, like the RMS current', () => {
    const currents = [0.001, 0.004, 0.016].map(
      (reactance) => directStartPeaks(simplePlant([motor()], reactance))[0]!.peakCurrent.current,
    )
    expect(currents.toSorted((a, b) => b - a)).toEqual(currents)
  })

  it('are none of a rotor with next to no leakage, whose fluxes no time step follows; the run-up is there all the same', () => {
    for (const reactance of [0, 1e-9]) {
      const plain = motor()
      if (!('cages' in plain.circuit)) throw new Error('the simple motor has a circuit')
      const cages = plain.circuit.cages.map((cage) => ({ ...cage, reactance: ohm(reactance) }))
      const input = simplePlant([{ ...plain, circuit: { ...plain.circuit, cages } }], 0.003)
      expect(directStartPeaks(input)).toEqual([])
      expect(runCase(input).motors[0]!.start!.outcome.kind).toBe('started')
    }
  })

  it('are none of a start on a tap, of a later start, and of a case that cannot be set up', () => {
    const tapped = simpleMotor('M', started(autotransformer(0.65, { rpm: 1450 }), squareLoad(300)))
    expect(directStartPeaks(simplePlant([tapped], 0.003))).toEqual([])
    const later = { ...motor(5), id: 'N' }
    expect(directStartPeaks(simplePlant([motor(), later], 0.003)).map(({ motorId }) => motorId)).toEqual(['M'])
    expect(directStartPeaks({ ...simplePlant([motor()], 0.003), buses: [] })).toEqual([])
  })
})
