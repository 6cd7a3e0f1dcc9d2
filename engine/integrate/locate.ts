import type { Method } from './method.ts'

const MOST_ITERATIONS = 80

/**
 * Fraction of the settled step at which the event passes from > 0 to ≤ 0, to round-off.
 *
 * Shapes   before > 0 and after ≤ 0 are its values at the two ends; `state` is scratch and
 *          holds the state at the returned fraction. An event that is not a number counts as past.
 * Source   T. R. Chandrupatla, "A new hybrid quadratic/bisection algorithm for finding the zero
 *          of a nonlinear function without using derivatives", Adv. Eng. Software 28 (1997) 145.
 */
export const locate = (
  event: (t: number, y: Float64Array) => number,
  method: Method,
  t: number,
  h: number,
  before: number,
  after: number,
  state: Float64Array,
): number => {
  const past = after <= 0 ? after : -before
  let a = 1
  let fa = past
  let b = 0
  let fb = before
  let c = b
  let fc = fb
  // First guess by the secant: steps are short, so events are nearly straight inside them.
  let share = fa / (fa - fb)
  const resolution = 2 ** -53 * Math.max(1, Math.abs(t) / h)
  for (let iteration = 0; iteration < MOST_ITERATIONS; iteration++) {
    const x = a + share * (b - a)
    method.at(x, state)
    const value = event(t + x * h, state)
    const fx = Number.isNaN(value) ? -before : value
    if (fx === 0) return x
    if (fx > 0 === fa > 0) {
      c = a
      fc = fa
    } else {
      c = b
      fc = fb
      b = a
      fb = fa
    }
    a = x
    fa = fx
    const tolerance = resolution / Math.abs(b - a)
    if (tolerance >= 0.5) break
    const xi = (a - b) / (c - b)
    const phi = (fa - fb) / (fc - fb)
    if (phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi) {
      share = (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb))
    } else {
      share = 0.5
    }
    if (share < tolerance) share = tolerance
    else if (share > 1 - tolerance) share = 1 - tolerance
  }
  const root = Math.abs(fa) <= Math.abs(fb) ? a : b
  method.at(root, state)
  return root
}
