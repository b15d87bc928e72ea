import { type Hertz, type RadianPerSecond, radianPerSecond } from './si'

/** Mechanical speed in rad/s of a speed in revolutions per minute. */
export const fromRpm = (rpm: number): RadianPerSecond => radianPerSecond((rpm * Math.PI) / 30)

/** Speed in revolutions per minute of a mechanical speed in rad/s. */
export const toRpm = (speed: RadianPerSecond): number => (speed * 30) / Math.PI

/** Synchronous mechanical speed ω_s = 4πf/poles, in rad/s; poles is the even number of poles. */
export const synchronousSpeed = (frequency: Hertz, poles: number): RadianPerSecond =>
  radianPerSecond((4 * Math.PI * frequency) / poles)
