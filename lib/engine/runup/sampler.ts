/** Observations kept for the plots, one row a sample, in one growing block. */
export interface SampleStore {
  readonly width: number
  count: number
  time: Float64Array
  /** Rows of `width` numbers. */
  data: Float64Array
}

export const sampleStore = (width: number): SampleStore => ({
  width,
  count: 0,
  time: new Float64Array(256),
  data: new Float64Array(256 * width),
})

export function addSample(store: SampleStore, t: number, observation: Float64Array): void {
  if (store.count === store.time.length) {
    const time = new Float64Array(2 * store.time.length)
    const data = new Float64Array(2 * store.data.length)
    time.set(store.time)
    data.set(store.data)
    store.time = time
    store.data = data
  }
  store.time[store.count] = t
  store.data.set(observation, store.count * store.width)
  store.count++
}

/** One sample's observation, as a view. */
export const sampleAt = (store: SampleStore, index: number): Float64Array =>
  store.data.subarray(index * store.width, (index + 1) * store.width)

/** Largest departure from the straight line between samples, in parts of each channel's range, when a run is thinned. */
const roughness = 5e-4

/**
 * Samples that are needed so that straight lines between them show the rest (Ramer, Douglas, Peucker on all given
 * channels at once). The first and last one and both samples of every switching stay.
 *
 * @param scale what counts as one whole in each channel, at least; a larger range of the run takes its place
 */
export function thinSamples(store: SampleStore, channels: readonly number[], scale: Float64Array): number[] {
  const { count, time } = store
  const range = Float64Array.from(channels, (c) => Math.max(scale[c]!, rangeOf(store, c)))
  const keep = new Uint8Array(count)
  if (count > 0) keep[0] = keep[count - 1] = 1
  const open: number[] = []
  let from = 0
  for (let i = 1; i < count; i++) {
    if (time[i] !== time[i - 1]) continue
    keep[i] = keep[i - 1] = 1
    if (i - 1 > from) open.push(from, i - 1)
    from = i
  }
  open.push(from, count - 1)
  while (open.length > 0) {
    const last = open.pop()!
    const first = open.pop()!
    const worst = farthest(store, first, last, channels, range)
    if (worst < 0) continue
    keep[worst] = 1
    open.push(first, worst, worst, last)
  }
  return Array.from({ length: count }, (_, i) => i).filter((i) => keep[i] === 1)
}

/** The sample farthest from the lines between two others, or −1 where all are within the roughness. */
function farthest(
  store: SampleStore,
  first: number,
  last: number,
  channels: readonly number[],
  range: Float64Array,
): number {
  const { time, data, width } = store
  const span = time[last]! - time[first]!
  let index = -1
  let most = roughness
  for (let k = 0; k < channels.length; k++) {
    const c = channels[k]!
    const begin = data[first * width + c]!
    const slope = span > 0 ? (data[last * width + c]! - begin) / span : 0
    const inverse = 1 / range[k]!
    for (let i = first + 1; i < last; i++) {
      const off = Math.abs(data[i * width + c]! - begin - slope * (time[i]! - time[first]!)) * inverse
      if (off > most) {
        most = off
        index = i
      }
    }
  }
  return index
}

function rangeOf(store: SampleStore, c: number): number {
  let low = Number.POSITIVE_INFINITY
  let high = Number.NEGATIVE_INFINITY
  for (let i = 0; i < store.count; i++) {
    const value = store.data[i * store.width + c]!
    if (value < low) low = value
    if (value > high) high = value
  }
  return high - low
}
