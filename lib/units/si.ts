/** Branded SI numbers: a plain number that carries its unit in the type, so that a voltage cannot be handed over as a current. */
declare const unit: unique symbol
type Si<Name extends string> = number & { readonly [unit]: Name }

export type Volt = Si<'V'>
export type Ampere = Si<'A'>
export type Ohm = Si<'ohm'>
export type OhmPerMetre = Si<'ohm/m'>
export type Siemens = Si<'S'>
export type Watt = Si<'W'>
export type VoltAmpere = Si<'VA'>
export type Hertz = Si<'Hz'>
export type Second = Si<'s'>
export type RadianPerSecond = Si<'rad/s'>
export type NewtonMetre = Si<'N·m'>
export type KilogramSquareMetre = Si<'kg·m²'>
export type Joule = Si<'J'>
export type AmpereSquaredSecond = Si<'A²·s'>
/** A ratio of two like quantities: per unit, a fraction, a multiple. */
export type PerUnit = Si<'1'>

export const volt = (value: number) => value as Volt
export const ampere = (value: number) => value as Ampere
export const ohm = (value: number) => value as Ohm
export const ohmPerMetre = (value: number) => value as OhmPerMetre
export const siemens = (value: number) => value as Siemens
export const watt = (value: number) => value as Watt
export const voltAmpere = (value: number) => value as VoltAmpere
export const hertz = (value: number) => value as Hertz
export const second = (value: number) => value as Second
export const radianPerSecond = (value: number) => value as RadianPerSecond
export const newtonMetre = (value: number) => value as NewtonMetre
export const kilogramSquareMetre = (value: number) => value as KilogramSquareMetre
export const joule = (value: number) => value as Joule
export const ampereSquaredSecond = (value: number) => value as AmpereSquaredSecond
export const perUnit = (value: number) => value as PerUnit

/** A complex number in rectangular form; the unit is that of both parts. */
export interface Complex<T extends number = number> {
  re: T
  im: T
}
