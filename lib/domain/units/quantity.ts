/**
 * Physical quantities as branded numbers in SI, so that a newton is not a number.
 * The functions below are the one door in: each checks finiteness and throws a RangeError that names the
 * offending value. A brand vanishes at run time; arithmetic gives plain numbers, which go back through a door.
 */
declare const quantity: unique symbol

export type Quantity<Name extends string> = number & { readonly [quantity]: Name }

const door =
  <Name extends string>(name: Name) =>
  (value: number): Quantity<Name> => {
    if (!Number.isFinite(value)) throw new RangeError(`${name}: ${value} is not a finite number`)
    return value as Quantity<Name>
  }

export type Metres = Quantity<'metres'>
export type Kilograms = Quantity<'kilograms'>
export type KilogramsPerMetre = Quantity<'kilograms per metre'>
export type KilogramsPerCubicMetre = Quantity<'kilograms per cubic metre'>
export type Newtons = Quantity<'newtons'>
export type Hertz = Quantity<'hertz'>
export type Pascals = Quantity<'pascals'>
export type DegreesCelsius = Quantity<'degrees Celsius'>
export type Seconds = Quantity<'seconds'>
export type MetresPerSecond = Quantity<'metres per second'>
export type MetresPerSecondSquared = Quantity<'metres per second squared'>
export type SquareMetres = Quantity<'square metres'>
export type PerKelvin = Quantity<'per kelvin'>
export type Degrees = Quantity<'degrees'>
export type Cents = Quantity<'cents'>
export type Joules = Quantity<'joules'>
/** Bending stiffness EI. */
export type NewtonSquareMetres = Quantity<'newton square metres'>
/** Second moment of area. */
export type MetresToTheFourth = Quantity<'metres to the fourth'>
/** Kinematic viscosity. */
export type SquareMetresPerSecond = Quantity<'square metres per second'>
/** Viscous drag of a length of string. */
export type KilogramsPerMetreSecond = Quantity<'kilograms per metre and second'>

export const metres = door('metres')
export const kilograms = door('kilograms')
export const kilogramsPerMetre = door('kilograms per metre')
export const kilogramsPerCubicMetre = door('kilograms per cubic metre')
export const newtons = door('newtons')
export const hertz = door('hertz')
export const pascals = door('pascals')
export const degreesCelsius = door('degrees Celsius')
export const seconds = door('seconds')
export const metresPerSecond = door('metres per second')
export const metresPerSecondSquared = door('metres per second squared')
export const squareMetres = door('square metres')
export const perKelvin = door('per kelvin')
export const degrees = door('degrees')
export const cents = door('cents')
export const joules = door('joules')
export const newtonSquareMetres = door('newton square metres')
export const metresToTheFourth = door('metres to the fourth')
export const squareMetresPerSecond = door('square metres per second')
export const kilogramsPerMetreSecond = door('kilograms per metre and second')
