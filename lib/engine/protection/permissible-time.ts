import { type Second, second } from '../../units/si'

/**
 * Permissible time at a current, I²·t = const through the declared point.
 *
 * Common practice for a stalled rotor; with the current in proportion to the voltage the time goes with 1/U².
 */
export const permissibleTimeAt = (current: number, declared: { current: number; time: number }): Second =>
  second(declared.time * (declared.current / current) ** 2)
