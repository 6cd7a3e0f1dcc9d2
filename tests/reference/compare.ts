/** Holds numbers against sourced ones and remembers the worst of them. */
import { expect } from 'vitest'

export interface Comparison {
  readonly what: string
  readonly got: number | undefined
  readonly due: number
  /** Relative difference allowed. */
  readonly within: number
  /** The difference is relative to this where the value due is smaller; 0 unless given. */
  readonly floor?: number
}

/** Difference relative to the value due, or to the floor where that is larger; 0 where the two are equal. */
export const relativeDifference = ({ got, due, floor = 0 }: Comparison): number => {
  if (got === undefined || Number.isNaN(got)) return Number.POSITIVE_INFINITY
  if (got === due) return 0
  return Math.abs(got - due) / Math.max(Math.abs(due), floor)
}

export interface Tally {
  /** Expects every comparison to hold; all that do not are named together, beside what was given. */
  readonly hold: (where: string, comparisons: readonly Comparison[], given?: string) => void
  /** The worst difference, and the largest share that any took of what it was allowed. */
  readonly worst: () => string
}

/** Counts what is held under one name. */
export const tally = (name: string): Tally => {
  let count = 0
  let worst = { difference: 0, at: 'none' }
  let fullest = { share: 0, at: 'none' }
  return {
    hold: (where, comparisons, given = where) => {
      expect(comparisons.length).toBeGreaterThan(0)
      const apart: string[] = []
      for (const comparison of comparisons) {
        const { what, got, due, within } = comparison
        const difference = relativeDifference(comparison)
        const at = `${where}, ${what}`
        count += 1
        if (difference > worst.difference) worst = { difference, at }
        if (difference / within > fullest.share) fullest = { share: difference / within, at }
        if (!(difference <= within)) apart.push(`${what}: ${got} for ${due}, ${difference} of ${within}`)
      }
      expect(apart, given).toEqual([])
    },
    worst: () =>
      `${name}: ${count} numbers, worst ${worst.difference.toExponential(1)} (${worst.at}), ` +
      `fullest ${(100 * fullest.share).toPrecision(2)} % of what is allowed (${fullest.at})`,
  }
}
