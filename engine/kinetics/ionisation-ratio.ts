import type { PkPair } from '../scenario.ts'
import { ionisation } from './ph-full.ts'

/**
 * Total over active form at one pH, over the same at another: by how much an effect of ionisation differs from
 * where it was measured.
 *
 * Source   Michaelis pH functions (Segel 1975); in logarithms where the pKs lie so far off that each alone leaves
 *          the range of doubles.
 */
export function ionisationRatio(pKs: PkPair, pH: number, other: number): number {
  const ratio = ionisation(pKs, pH) / ionisation(pKs, other)
  if (ratio > 0 && ratio < Number.POSITIVE_INFINITY) return ratio
  return Math.min(10 ** (decadesOf(pKs, pH) - decadesOf(pKs, other)), 1e300)
}

const decadesOf = ({ pKa1, pKa2 }: PkPair, pH: number): number => {
  const highest = Math.max(0, pKa1 - pH, pH - pKa2)
  const sum = 10 ** -highest + 10 ** (pKa1 - pH - highest) + 10 ** (pH - pKa2 - highest)
  return highest + Math.log10(sum)
}
