const SAFETY = 0.9
const SMALLEST_FACTOR = 0.2
const LARGEST_FACTOR = 6

/** An error of nearly nothing says no more than that the step may grow as fast as allowed. */
const LEAST_ERROR = 1e-4

/** An error, relative to the tolerance, as the length of a step it stands for: its root of the method's order. */
export const rootOf = (error: number, exponent: number): number =>
  Math.exp(exponent * Math.log(Math.max(error, LEAST_ERROR)))

/**
 * Factor by which to change the step after one was accepted: the elementary law, or less where the
 * error has lately grown faster than the steps, as it does while a batch is heated; the trend is
 * then taken to go on. A programme heated by 40 K at 1e-9 is spared four rejections in five so.
 *
 * Shapes   roots of this error and of the one before; `stretch` this step over the one before, 0 if
 *          there was none.
 * Source   K. Gustafsson's predictive control as given in Hairer & Wanner, Solving Ordinary
 *          Differential Equations II, IV.8; used one-sidedly, to be cautious but not bold.
 */
export const growth = (root: number, rootBefore: number, stretch: number): number => {
  let factor = SAFETY / root
  if (stretch > 0) {
    const trend = (stretch * rootBefore) / root
    if (trend < 1) factor *= trend
  }
  if (factor > LARGEST_FACTOR) return LARGEST_FACTOR
  return Math.max(factor, SMALLEST_FACTOR)
}

/** Factor by which to shrink a step whose error was too large. */
export const shrinkage = (error: number, exponent: number): number => {
  const factor = SAFETY * Math.exp(-exponent * Math.log(error))
  return Math.max(factor, SMALLEST_FACTOR)
}
