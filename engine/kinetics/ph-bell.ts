import type { PkPair } from '../scenario.ts'

/**
 * Share of the enzyme in its active protonation state, between two ionisations.
 *
 * Units    pH and pKa plain; returns 0..1.
 * Source   Michaelis pH functions (Dixon & Webb, Enzymes; Segel 1975): 1/(1 + 10^(pKa1−pH) + 10^(pH−pKa2)).
 */
export const bell = ({ pKa1, pKa2 }: PkPair, pH: number): number =>
  1 / (1 + 10 ** (pKa1 - pH) + 10 ** (pH - pKa2))

/** pH at which the bell is highest; right also where pKa1 ≥ pKa2. */
export const bellOptimum = ({ pKa1, pKa2 }: PkPair): number => 0.5 * (pKa1 + pKa2)

/** The two pH values at which the bell has half the height of its top. */
export function bellHalfWidth(pKs: PkPair): readonly [number, number] {
  // 1 + a·(h + 1/h) = 2(1 + 2a) with a = 10^((pKa1−pKa2)/2), h = 10^(pH − optimum).
  const a = 10 ** (0.5 * (pKs.pKa1 - pKs.pKa2))
  const halfSum = (1 + 4 * a) / (2 * a)
  const offset = Math.log10(halfSum + Math.sqrt(halfSum * halfSum - 1))
  const optimum = bellOptimum(pKs)
  return [optimum - offset, optimum + offset]
}
