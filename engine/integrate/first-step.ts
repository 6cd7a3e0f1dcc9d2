import type { RateInto } from './problem.ts'

/**
 * Local error of a step as long as the problem's own time scale, over the change it makes:
 * the fifth derivative of an exponential gives two half steps 1/1920, of which several tolerances
 * are accepted.
 */
const ERROR_PER_CHANGE = 1 / 400

/** How far the trial step that measures the curvature moves any component, of its magnitude. */
const PROBE = 0.01

/** Longest time scale believed, in times to move by the magnitude of a component: curvatures may
 * cancel by chance. */
const LONGEST = 2

/**
 * A first step of about the right length, at the price of one rate evaluation.
 *
 * Shapes   y, f the state and its rate at the start; trial, trialRate scratch, overwritten.
 *          The guess scales with the unit of time. A poor one costs a rejected step.
 * Source   after the algorithm of Gladwell, Shampine & Brankin as given in Hairer, Nørsett &
 *          Wanner, Solving Ordinary Differential Equations I, II.4; but the time scale is
 *          |y′|/|y″|, where they take the unit of time for it and start far too short.
 */
export const firstStep = (
  rate: RateInto,
  t: number,
  span: number,
  y: Float64Array,
  f: Float64Array,
  relative: number,
  absolute: number,
  exponent: number,
  trial: Float64Array,
  trialRate: Float64Array,
): number => {
  const size = y.length
  const tightest = Math.max(relative, absolute)
  let slope = 0
  for (let i = 0; i < size; i++) {
    const s = Math.abs(f[i] as number) / (absolute + relative * Math.abs(y[i] as number))
    if (s > slope) slope = s
  }
  // Magnitude of a component: what its tolerance is a `tightest` part of.
  const moved = slope * tightest * span
  const h = moved > 1 ? (PROBE * span) / moved : PROBE * span
  for (let i = 0; i < size; i++) trial[i] = (y[i] as number) + h * (f[i] as number)
  rate(trialRate, trial, t + h)
  let bend = 0
  for (let i = 0; i < size; i++) {
    const scale = absolute + relative * Math.abs(y[i] as number)
    const b = Math.abs((trialRate[i] as number) - (f[i] as number)) / scale
    if (!(b <= bend)) bend = b
  }
  if (!(bend < Number.POSITIVE_INFINITY)) return h
  if (bend === 0) return span
  const change = slope * h > bend * h ? slope : bend
  const scaleOfTime = Math.min((h * change) / bend, LONGEST / (slope * tightest))
  const step = scaleOfTime * Math.exp(-exponent * Math.log(ERROR_PER_CHANGE * change * scaleOfTime))
  return Math.min(step, span)
}
