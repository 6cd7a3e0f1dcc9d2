/**
 * Base demand of a protein hydrolysis held at constant pH.
 *
 * Source   Adler-Nissen 1986, Enzymic Hydrolysis of Food Proteins (pH-stat technique).
 */

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
