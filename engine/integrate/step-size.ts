const SAFETY = 0.9
const SMALLEST_FACTOR = 0.2
const LARGEST_FACTOR = 6

/** An error of nearly nothing says no more than that the step may grow as fast as allowed. */
export const LEAST_LOG_ERROR = Math.log(1e-4)

/**
 * Factor by which to change the step after one was accepted, from the logarithms of this
 * error and of the one before (both relative to the tolerance).
 *
 * Source   K. Gustafsson's PI control as given in Hairer & Wanner, Solving Ordinary
 *          Differential Equations II, IV.2; a weight of 0 makes it the elementary law.
 */
export const growth = (logError: number, logBefore: number, exponent: number, memory: number): number => {
  const factor = SAFETY * Math.exp(memory * logBefore - (exponent - 0.75 * memory) * logError)
  if (factor > LARGEST_FACTOR) return LARGEST_FACTOR
  return Math.max(factor, SMALLEST_FACTOR)
}

/** Factor by which to shrink a step whose error was too large. */
export const shrinkage = (error: number, exponent: number): number => {
  const factor = SAFETY * Math.exp(-exponent * Math.log(error))
  return Math.max(factor, SMALLEST_FACTOR)
}
