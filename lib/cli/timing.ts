/** Time of one call as the middle of many, in microseconds, and how many were made. */
export interface Timing {
  microseconds: number
  calls: number
}

/** Calls first without looking at the clock, so that the code is compiled, then until `milliseconds` have gone. */
export function timeOf(call: () => unknown, milliseconds: number): Timing {
  for (let i = 0; i < 5; i++) call()
  const times: number[] = []
  const end = performance.now() + milliseconds
  do {
    const from = performance.now()
    call()
    times.push(performance.now() - from)
  } while (performance.now() < end)
  times.sort((a, b) => a - b)
  return { microseconds: 1000 * times[Math.floor(times.length / 2)]!, calls: times.length }
}
