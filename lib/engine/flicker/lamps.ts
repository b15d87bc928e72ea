/** The lamp whose light is watched, with the system that it burns on. */
export type Lamp = '230 V' | '120 V'

/** Weighting filter F(s) = kω₁s/(s²+2λs+ω₁²)·(1+s/ω₂)/((1+s/ω₃)(1+s/ω₄)), frequencies in Hz. */
export interface LampWeighting {
  k: number
  lambda: number
  f1: number
  f2: number
  f3: number
  f4: number
  /** Corner of the low-pass that takes out what is left of the carrier, Hz. */
  lowPass: number
  /** Frequency (Hz) and size (relative change, peak to peak) of the sine that just reaches a sensation of 1. */
  reference: { frequency: number; change: number }
}

/** Source: IEC 61000-4-15, weighting filters and reference points for lamps of 60 W. */
export const lampWeightings: Record<Lamp, LampWeighting> = {
  '230 V': {
    k: 1.74802,
    lambda: 4.05981,
    f1: 9.15494,
    f2: 2.27979,
    f3: 1.22535,
    f4: 21.9,
    lowPass: 35,
    reference: { frequency: 8.8, change: 0.0025 },
  },
  '120 V': {
    k: 1.6357,
    lambda: 4.167375,
    f1: 9.077169,
    f2: 2.939902,
    f3: 1.394468,
    f4: 17.31512,
    lowPass: 42,
    reference: { frequency: 8.8, change: 0.00321 },
  },
}

/** The lamp that a system of this frequency (Hz) is judged with. */
export const lampOf = (frequency: number): Lamp => (frequency > 55 ? '120 V' : '230 V')
