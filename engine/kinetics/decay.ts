/** Exponential expressions that keep their digits where the textbook form cancels. */

/** (1 − e^(−z))/z, 1 at z = 0. */
export const decayMean = (z: number): number => (z === 0 ? 1 : -Math.expm1(-z) / z)

/** u − (1 − e^(−u)) for u ≥ 0, to full relative precision from u = 0 on. */
export function excess(u: number): number {
  if (Math.abs(u) > 0.25) return u + Math.expm1(-u)
  // Taylor series u²/2! − u³/3! + …; the twelfth term is below 1e-17 of the first at u = 0.25.
  let term = 0.5 * u * u
  let sum = term
  for (let k = 3; k < 16; k++) {
    term *= -u / k
    sum += term
  }
  return sum
}

/** −ln(1 − x)/x, 1 at x = 0, without end at x = 1. */
export const logStretch = (x: number): number => (x < 1e-8 ? 1 + x * (0.5 + x / 3) : -Math.log1p(-x) / x)

/**
 * The divided difference of exp over 0, −a, −b for a, b ≥ 0: what ∬ of two decays in series comes to.
 *
 * Source   divided differences of the exponential (McCurdy, Ng & Parlett 1984): the closed form where the
 *          larger argument is not small, the power series in complete symmetric sums where it is.
 */
export function seriesMean(a: number, b: number): number {
  const small = Math.min(a, b)
  const large = Math.max(a, b)
  if (large >= 0.5) {
    if (small === 0) return (1 - decayMean(large)) / large
    const gone = -Math.expm1(-small)
    return (gone / small - Math.exp(-small) * decayMean(large - small)) / large
  }
  let sum = 0.5
  let factor = 0.5
  let homogeneous = 1
  let power = 1
  for (let n = 1; n < 24; n++) {
    power *= large
    homogeneous = homogeneous * small + power
    factor /= -(n + 2)
    sum += factor * homogeneous
  }
  return sum
}
