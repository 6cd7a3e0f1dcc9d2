/** Runs a property over random cases; the seed is printed, and DOSEWRIGHT_SEED sets another. */
import fc from 'fast-check'

/** The seed of this run. */
export const seed = Number(process.env.DOSEWRIGHT_SEED ?? 20_417)

/** The property holds for so many random cases; a case that does not fit may leave with `fc.pre`. */
export function holds<T>(cases: fc.Arbitrary<T>, property: (value: T) => void, numRuns = 300): void {
  console.info(`seed ${seed}`)
  fc.assert(fc.property(cases, property), { seed, numRuns, interruptAfterTimeLimit: 120_000 })
}
