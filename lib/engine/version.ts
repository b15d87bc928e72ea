/** Rises whenever a number of the engine moves, so that stored results say what computed them. */
export const ENGINE_VERSION = '1.4.0'

/**
 * What changed in the numbers and why, newest first.
 * @public
 */
export const ENGINE_LOG: readonly { version: string; change: string }[] = [
  {
    version: '1.4.0',
    change:
      'Limits on voltage where the network closes on residual voltages have the worse of steady circuits and rotor fluxes; machines switched on near synchronous speed are of fifth order.',
  },
  {
    version: '1.3.0',
    change: 'Limits on flicker and with an envelope in time come from the worst of the circuits that meet a plate.',
  },
  {
    version: '1.2.0',
    change:
      'Circuits that meet one plate reach to the ends of run-up time and least torque; a plate that none meets has them too.',
  },
  {
    version: '1.1.0',
    change: 'Verdicts on an estimated circuit come from the worst of the circuits that meet its plate.',
  },
  { version: '1.0.1', change: 'A voltage collapse during a start fails limits on voltage, run-up and torque.' },
  { version: '1.0.0', change: 'First numbers: quasi-static run-up with the network solved at every instant.' },
]
