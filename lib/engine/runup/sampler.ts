/** Instants kept for the plots: time and a copy of the observation. */
export interface Sample {
  t: number
  observation: Float64Array
}

/**
 * Largest departure from the straight line between samples, in parts of each channel's range, when the run is thinned.
 */
const roughness = 5e-4

/**
 * Leaves out samples that the straight lines between the others show anyway (Ramer, Douglas, Peucker on all channels
 * at once). The first and last sample, both samples of every switching and the given instants stay.
 */
export function thinSamples(samples: readonly Sample[], range: Float64Array): Sample[] {
  if (samples.length < 3) return [...samples]
  const keep = new Uint8Array(samples.length)
  keep[0] = 1
  keep[samples.length - 1] = 1
  const stack: [number, number][] = []
  let from = 0
  for (let i = 1; i < samples.length; i++) {
    if (samples[i]!.t === samples[i - 1]!.t) {
      keep[i] = 1
      keep[i - 1] = 1
      if (i - 1 > from) stack.push([from, i - 1])
      from = i
    }
  }
  stack.push([from, samples.length - 1])
  for (let pair = stack.pop(); pair !== undefined; pair = stack.pop()) {
    const [a, b] = pair
    const worst = farthest(samples, a, b, range)
    if (worst.distance <= roughness) continue
    keep[worst.index] = 1
    stack.push([a, worst.index], [worst.index, b])
  }
  return samples.filter((_, i) => keep[i] === 1)
}

function farthest(
  samples: readonly Sample[],
  a: number,
  b: number,
  range: Float64Array,
): { index: number; distance: number } {
  const [first, last] = [samples[a]!, samples[b]!]
  const width = last.t - first.t
  const worst = { index: a, distance: 0 }
  for (let i = a + 1; i < b; i++) {
    const { t, observation } = samples[i]!
    const part = width > 0 ? (t - first.t) / width : 0
    let distance = 0
    for (let c = 0; c < range.length; c++) {
      if (range[c] === 0) continue
      const line = first.observation[c]! + part * (last.observation[c]! - first.observation[c]!)
      const off = Math.abs(observation[c]! - line) / range[c]!
      if (off > distance) distance = off
    }
    if (distance > worst.distance) {
      worst.index = i
      worst.distance = distance
    }
  }
  return worst
}

/** Range of every channel over the samples; channels that hardly move in parts of `floor` count as still (0). */
export function channelRange(samples: readonly Sample[], floor: (channel: number) => number): Float64Array {
  const length = samples[0]?.observation.length ?? 0
  const [low, high] = [new Float64Array(length).fill(Infinity), new Float64Array(length).fill(-Infinity)]
  for (const { observation } of samples) {
    for (let c = 0; c < length; c++) {
      if (observation[c]! < low[c]!) low[c] = observation[c]!
      if (observation[c]! > high[c]!) high[c] = observation[c]!
    }
  }
  return low.map((least, c) => Math.max(high[c]! - least, floor(c)))
}
