import { type OhmPerMetre, ohmPerMetre } from '../../units/si'

export type ConductorMaterial = 'copper' | 'aluminium'

/** Largest d.c. resistance at 20 °C of stranded conductors (class 2), Ω/km: cross-section mm², copper, aluminium. Source: IEC 60228. */
const classTwo: readonly (readonly [number, number, number | null])[] = [
  [1.5, 12.1, null],
  [2.5, 7.41, null],
  [4, 4.61, null],
  [6, 3.08, null],
  [10, 1.83, 3.08],
  [16, 1.15, 1.91],
  [25, 0.727, 1.2],
  [35, 0.524, 0.868],
  [50, 0.387, 0.641],
  [70, 0.268, 0.443],
  [95, 0.193, 0.32],
  [120, 0.153, 0.253],
  [150, 0.124, 0.206],
  [185, 0.0991, 0.164],
  [240, 0.0754, 0.125],
  [300, 0.0601, 0.1],
  [400, 0.047, 0.0778],
  [500, 0.0366, 0.0605],
  [630, 0.0283, 0.0469],
  [800, 0.0221, 0.0367],
  [1000, 0.0176, 0.0291],
]

/** Temperature at which the resistance of the metal would vanish, below zero, °C. */
const inferredZero: Record<ConductorMaterial, number> = { copper: 234.5, aluminium: 228 }

/** Cross-sections that the table has for a metal, mm². */
export const conductorSizes = (material: ConductorMaterial): readonly number[] =>
  classTwo.filter(([, , aluminium]) => material === 'copper' || aluminium !== null).map(([size]) => size)

/** R_T/R_20 = (K + T)/(K + 20) with K 234.5 for copper and 228 for aluminium; T in °C, about −50 to 250. */
export const temperatureFactor = (material: ConductorMaterial, celsius: number): number =>
  (inferredZero[material] + celsius) / (inferredZero[material] + 20)

/**
 * Largest d.c. resistance of a class 2 conductor at a temperature in °C, Ω/m; null for a size that the table lacks.
 * Skin and proximity effect are not in it: about 2 % more at 240 mm² and 50 Hz, more above.
 */
export const conductorResistance = (
  material: ConductorMaterial,
  squareMillimetres: number,
  celsius: number,
): OhmPerMetre | null => {
  const row = classTwo.find(([size]) => size === squareMillimetres)
  const perKilometre = row?.[material === 'copper' ? 1 : 2] ?? null
  return perKilometre === null ? null : ohmPerMetre((perKilometre * temperatureFactor(material, celsius)) / 1000)
}
