import type { RateInto } from './problem.ts'

const ROOT_EPSILON = Math.sqrt(Number.EPSILON)

/** Part of the step over which time is differenced; its square is what the result is wrong by. */
const TIME_PART = 2 ** -10

/**
 * Jacobian ∂f/∂y and ∂f/∂t by forward differences.
 *
 * Shapes   y, f (n) the point and its rate; h the step about to be tried; jacobian (n·n)
 *          row-major and slopes (n) are filled; moved, rate scratch (n). Costs n + 2 evaluations.
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
  movedRate: Float64Array,
): void => {
  const n = y.length
  const tightest = Math.max(relative, absolute)
  for (let i = 0; i < n; i++) moved[i] = y[i] as number
  for (let j = 0; j < n; j++) {
    const value = y[j] as number
    const magnitude = (absolute + relative * Math.abs(value)) / tightest
    const slope = f[j] as number
    const reach = ROOT_EPSILON * Math.max(magnitude, Math.abs(h * slope))
    // Along the flow, where the rate is surely defined; the difference as it is represented.
    moved[j] = slope < 0 ? value - reach : value + reach
    const increment = (moved[j] as number) - value
    rate(movedRate, moved, t)
    for (let i = 0; i < n; i++) {
      jacobian[i * n + j] = ((movedRate[i] as number) - (f[i] as number)) / increment
    }
    moved[j] = value
  }
  // Second order from one side: first order with a step short enough not to matter drowns in
  // the round-off of t once ∂f/∂t is as large as stiff problems make it.
  const soon = t + TIME_PART * h
  const later = soon + (soon - t)
  rate(slopes, y, soon)
  rate(movedRate, y, later)
  const across = later - t
  for (let i = 0; i < n; i++) {
    slopes[i] = (4 * (slopes[i] as number) - (movedRate[i] as number) - 3 * (f[i] as number)) / across
  }
}
