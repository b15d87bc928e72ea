/** Current of a motor over a run: rising times in s, two alike at a switching, and values at them in A. */
export interface CurrentRecord {
  time: readonly number[]
  current: readonly number[]
}

/** The record with points of its own at the given instants, on the straight lines between its samples. */
export function splitAt({ time, current }: CurrentRecord, instants: readonly number[]): CurrentRecord {
  const wanted = instants.filter((t) => t > time[0]! && t < time.at(-1)!).toSorted((a, b) => a - b)
  const times: number[] = []
  const currents: number[] = []
  let next = 0
  time.forEach((t, i) => {
    for (; next < wanted.length && wanted[next]! < t; next++) {
      const at = wanted[next]!
      const from = time[i - 1]!
      if (at > from) {
        times.push(at)
        currents.push(current[i - 1]! + ((current[i]! - current[i - 1]!) * (at - from)) / (t - from))
      }
    }
    times.push(t)
    currents.push(current[i]!)
  })
  return { time: times, current: currents }
}
