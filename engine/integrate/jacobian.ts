import type { RateInto } from './problem.ts'

/** Increment of a component, of its magnitude: truncation and round-off both come to about 1e-10. */
const STATE_PART = 2 ** -17

/** Part of the step over which time is differenced; its square is what the result is wrong by. */
const TIME_PART = 2 ** -10

/**
 * Jacobian ∂f/∂y and ∂f/∂t by one-sided differences of second order: a Rosenbrock method has
 * no iteration to make up for a poor Jacobian.
 *
 * Shapes   y, f (n) the point and its rate; h the step about to be tried; jacobian (n·n)
 *          row-major and slopes (n) are filled; moved, nearRate, farRate scratch (n).
 *          Costs 2n + 2 evaluations.
 *          Increments suit a component of any magnitude: what its tolerance is a part of
 *          (just 1 where the tolerance is absolute, as in logarithmic coordinates), or
 *          what the step moves it by, if that is more. Time stays inside the step.
 * Fails    entries are not finite where the rate is not.
 */
export const jacobianInto = (
  jacobian: Float64Array,
  slopes: Float64Array,
  rate: RateInto,
  t: number,
  h: number,
  y: Float64Array,
  f: Float64Array,
  relative: number,
  absolute: number,
  moved: Float64Array,
  nearRate: Float64Array,
  farRate: Float64Array,
): void => {
  const n = y.length
  const tightest = Math.max(relative, absolute)
  for (let i = 0; i < n; i++) moved[i] = y[i] as number
  for (let j = 0; j < n; j++) {
    const value = y[j] as number
    const magnitude = (absolute + relative * Math.abs(value)) / tightest
    const slope = f[j] as number
    const reach = STATE_PART * Math.max(magnitude, Math.abs(h * slope))
    // Along the flow, where the rate is surely defined.
    moved[j] = slope < 0 ? value - reach : value + reach
    const once = (moved[j] as number) - value
    rate(nearRate, moved, t)
    moved[j] = (moved[j] as number) + once
    const twice = (moved[j] as number) - value
    rate(farRate, moved, t)
    for (let i = 0; i < n; i++) {
      const bend = (farRate[i] as number) - 4 * (nearRate[i] as number) + 3 * (f[i] as number)
      jacobian[i * n + j] = -bend / twice
    }
    moved[j] = value
  }
  const soon = t + TIME_PART * h
  const later = soon + (soon - t)
  rate(slopes, y, soon)
  rate(farRate, y, later)
  const across = later - t
  for (let i = 0; i < n; i++) {
    slopes[i] = (4 * (slopes[i] as number) - (farRate[i] as number) - 3 * (f[i] as number)) / across
  }
}
