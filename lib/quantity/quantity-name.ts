/** Every kind of quantity that a record can hold; the SI unit behind each is what the parser returns. */
export const quantityNames = [
  'voltage', // V
  'current', // A
  'apparent-power', // VA
  'active-power', // W
  'reactive-power', // var
  'impedance', // Ω
  'impedance-per-length', // Ω/m
  'susceptance-per-length', // S/m
  'length', // m
  'ratio', // 1; %, pu and × are understood
  'number', // 1; no unit
  'frequency', // Hz
  'speed', // rad/s
  'torque', // N·m
  'inertia', // kg·m²
  'time', // s
] as const

export type QuantityName = (typeof quantityNames)[number]

/** How numbers are written: `1,250.5` or `1.250,5`. */
export type NumberStyle = 'point' | 'comma'
