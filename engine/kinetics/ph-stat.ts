/**
 * Base demand of a protein hydrolysis held at constant pH.
 *
 * Source   Adler-Nissen 1986, Enzymic Hydrolysis of Food Proteins (pH-stat technique).
 */
import type { Temperature } from '../units/quantity.ts'

/** Share of freed amino groups that has given off its proton at this pH. */
export const dissociatedShare = (pH: number, pK: number): number => 1 / (1 + 10 ** (pK - pH))

/**
 * Degree of hydrolysis from the base used.
 *
 * Units    base in mol, protein in kg, bonds in mol of peptide bonds per kg of protein; returns 0..1.
 */
export const degreeOfHydrolysisFromBase = (
  base: number,
  share: number,
  protein: number,
  bonds: number,
): number => base / (share * protein * bonds)

/** Base needed for a degree of hydrolysis, mol; the inverse of `degreeOfHydrolysisFromBase`. */
export const baseForDegreeOfHydrolysis = (
  degreeOfHydrolysis: number,
  share: number,
  protein: number,
  bonds: number,
): number => degreeOfHydrolysis * share * protein * bonds

/**
 * pK of the freed amino groups at T.
 *
 * Units    `at25` is the pK at 25 degC, `slope` K.
 * Source   Adler-Nissen 1986: pK falls with 1/T as van 't Hoff's law has it, at25 + slope·(1/T − 1/298.15).
 */
export const pKAt = (at25: number, slope: number, T: Temperature): number =>
  at25 + (slope * (298.15 - T)) / (298.15 * T)
