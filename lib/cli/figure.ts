/** One measured figure: its name is stable from run to run, so that runs can be compared. */
export interface Figure {
  name: string
  value: number
  unit: 'µs' | 'ms' | 's' | 'kB' | '1'
}

/** A figure that only counts or compares has the unit 1. */
export const figure = (name: string, value: number, unit: Figure['unit']): Figure => ({
  name,
  value: Number(value.toPrecision(4)),
  unit,
})
