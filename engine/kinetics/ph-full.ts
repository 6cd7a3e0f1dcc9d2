/**
 * The full pH model: free enzyme and enzyme–substrate complex ionise with pKs of their own, so that pH moves
 * both the limiting rate and Km.
 *
 * Source   Michaelis pH functions (Dixon & Webb, Enzymes; Segel 1975).
 */
import type { PkPair } from '../scenario.ts'

/** 1 + 10^(pKa1 − pH) + 10^(pH − pKa2): total over active form of one species. */
export const ionisation = ({ pKa1, pKa2 }: PkPair, pH: number): number =>
  1 + 10 ** (pKa1 - pH) + 10 ** (pH - pKa2)

/** Factor on the limiting rate, relative to the pH-independent one. */
export const limitingRateFactor = (complex: PkPair, pH: number): number => 1 / ionisation(complex, pH)

/** Factor on Km, relative to the pH-independent one. */
export const kmFactor = (free: PkPair, complex: PkPair, pH: number): number =>
  ionisation(free, pH) / ionisation(complex, pH)

/**
 * pH of the highest rate at one substrate concentration.
 *
 * Units    S and the pH-independent Km in one unit.
 */
export const fullOptimum = (free: PkPair, complex: PkPair, Km: number, S: number): number =>
  0.5 *
  Math.log10(
    (Km * 10 ** free.pKa1 + S * 10 ** complex.pKa1) / (Km * 10 ** -free.pKa2 + S * 10 ** -complex.pKa2),
  )
