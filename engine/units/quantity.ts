/**
 * Branded numbers: one brand per kind of quantity, so that the compiler refuses a pressure where a
 * temperature is due. The brands exist only for the compiler; every value is a plain double in coherent SI.
 *
 * Units    K, s, m³, kg, mol, J; so kg/m³ reads as g/L and mol/m³ as mmol/L. Money per SI unit.
 */
declare const dimension: unique symbol

/** A plain double in coherent SI whose kind the compiler knows. */
export type Quantity<D extends string> = number & { readonly [dimension]: D }

/** K */
export type Temperature = Quantity<'temperature'>
/** K, a difference: 1 degC of difference is 1 K */
export type TemperatureDifference = Quantity<'temperature difference'>
/** s */
export type Time = Quantity<'time'>
/** kg */
export type Mass = Quantity<'mass'>
/** m³ */
export type Volume = Quantity<'volume'>
/** kg/m³ (g/L) */
export type Concentration = Quantity<'concentration'>
/** kg/mol */
export type MolarMass = Quantity<'molar mass'>
/** J/mol */
export type MolarEnergy = Quantity<'molar energy'>
/** 1/s */
export type FirstOrderRate = Quantity<'first-order rate'>
/** kg of substrate per kg of enzyme preparation and s */
export type SpecificRate = Quantity<'specific rate'>
/** mol/s per kg of preparation (kat/kg) */
export type Activity = Quantity<'activity per mass'>
/** mol/s per m³ of preparation (kat/m³) */
export type VolumetricActivity = Quantity<'activity per volume'>
/** kg/m³ */
export type Density = Quantity<'density'>
/** m³/s */
export type Flow = Quantity<'flow'>
/** kg/s */
export type MassFlow = Quantity<'mass flow'>
/** K/s */
export type Ramp = Quantity<'ramp'>
/** W */
export type Power = Quantity<'power'>
/** J */
export type Energy = Quantity<'energy'>

/** Brands a number that is already in SI; the only cast of the engine lives here. */
export const quantity = <Q extends Quantity<string>>(value: number): Q => value as Q

/** Temperature from degrees Celsius (0 degC = 273.15 K). */
export const celsius = (degrees: number): Temperature => quantity<Temperature>(degrees + 273.15)

/** Time from hours. */
export const hours = (h: number): Time => quantity<Time>(h * 3600)

/** Time from minutes. */
export const minutes = (min: number): Time => quantity<Time>(min * 60)

/** Concentration from g/L, which is kg/m³. */
export const gramsPerLitre = (value: number): Concentration => quantity<Concentration>(value)

/** Molar energy from kJ/mol. */
export const kilojoulesPerMole = (value: number): MolarEnergy => quantity<MolarEnergy>(value * 1000)

/** First-order rate from 1/h. */
export const perHour = (value: number): FirstOrderRate => quantity<FirstOrderRate>(value / 3600)
