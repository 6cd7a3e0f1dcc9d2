import { factorise, solveFactorised } from '../numeric/linear.ts'
import { allFinite } from './finite.ts'
import { jacobianInto } from './jacobian.ts'
import type { Method } from './method.ts'
import type { RateInto } from './problem.ts'
import { rodas } from './rodas-table.ts'

/**
 * Implicit method for stiff problems: RODAS, L-stable, of order four with an estimate of order
 * three, its Jacobian by differences.
 *
 * Inside a step it takes a shorter one from the same start. The method's own interpolant would
 * be free, but its error is not damped as that of the step is: where a state is tied to a course
 * by a rate constant of 1e6 and the step is good to 1e-8, the interpolant is 4e-6 off.
 *
 * Shapes   one instance serves problems of one size, one at a time.
 * Source   Hairer & Wanner, Solving Ordinary Differential Equations II, IV.7.
 */
export const createRosenbrock = (size: number): Method => {
  const { gamma, alpha, d, a, c } = rodas
  const from = new Float64Array(size)
  const fromRate = new Float64Array(size)
  const next = new Float64Array(size)
  const nextRate = new Float64Array(size)
  const jacobian = new Float64Array(size * size)
  const slopes = new Float64Array(size)
  const matrix = new Float64Array(size * size)
  const pivots = new Int32Array(size)
  const stages = [0, 1, 2, 3, 4, 5].map(() => new Float64Array(size))
  const at = new Float64Array(size)
  const rateAt = new Float64Array(size)
  let rate: RateInto = () => {}
  let relative = 0
  let absolute = 0
  // A step tried again after a rejection starts from the same point and keeps its Jacobian, taken at this time.
  let time = Number.NaN
  let start = 0
  let length = 0

  const combine = (weights: readonly number[], into: Float64Array, scale: number): void => {
    for (let j = 0; j < weights.length; j++) {
      const weight = scale * (weights[j] as number)
      const stage = stages[j] as Float64Array
      for (let i = 0; i < size; i++) into[i] = (into[i] as number) + weight * (stage[i] as number)
    }
  }

  const solveStage = (s: number, h: number): void => {
    const stage = stages[s] as Float64Array
    stage.set(rateAt)
    combine(c[s] as readonly number[], stage, 1 / h)
    const shift = h * (d[s] ?? 0)
    if (shift !== 0)
      for (let i = 0; i < size; i++) stage[i] = (stage[i] as number) + shift * (slopes[i] as number)
    solveFactorised(matrix, pivots, stage)
  }

  /** One step of length h from the point last attempted from; false if it cannot be solved. */
  const take = (h: number, result: Float64Array): boolean => {
    for (let i = 0; i < matrix.length; i++) matrix[i] = -(jacobian[i] as number)
    for (let i = 0; i < matrix.length; i += size + 1) matrix[i] = (matrix[i] as number) + 1 / (gamma * h)
    if (!factorise(matrix, pivots)) return false
    rateAt.set(fromRate)
    solveStage(0, h)
    for (let s = 1; s < 5; s++) {
      at.set(from)
      combine(a[s] as readonly number[], at, 1)
      rate(rateAt, at, start + (alpha[s] ?? 1) * h)
      solveStage(s, h)
    }
    const fifth = stages[4] as Float64Array
    const sixth = stages[5] as Float64Array
    for (let i = 0; i < size; i++) at[i] = (at[i] as number) + (fifth[i] as number)
    rate(rateAt, at, start + h)
    solveStage(5, h)
    for (let i = 0; i < size; i++) result[i] = (at[i] as number) + (sixth[i] as number)
    return true
  }

  return {
    exponent: 1 / 4,
    next,
    nextRate,
    rateEvaluations: 0,
    jacobians: 0,

    adopt(newRate, newRelative, newAbsolute) {
      rate = newRate
      relative = newRelative
      absolute = newAbsolute
      time = Number.NaN
      this.rateEvaluations = 0
      this.jacobians = 0
    },

    attempt(t, h, y, f) {
      if (t !== time) {
        jacobianInto(jacobian, slopes, rate, t, h, y, f, relative, absolute, at, rateAt, next)
        this.jacobians += 1
        this.rateEvaluations += 2 * size + 2
        from.set(y)
        fromRate.set(f)
        start = t
      }
      length = h
      this.rateEvaluations += 5
      // Differences over part of a step too long may be what was not finite: a shorter one takes its own.
      time = Number.NaN
      if (!take(h, next)) return Number.POSITIVE_INFINITY
      const error = stages[5] as Float64Array
      let worst = 0
      for (let i = 0; i < size; i++) {
        const magnitude = Math.max(Math.abs(from[i] as number), Math.abs(next[i] as number))
        const part = Math.abs(error[i] as number) / (absolute + relative * magnitude)
        if (!(part <= worst)) {
          if (!(part < Number.POSITIVE_INFINITY)) return Number.POSITIVE_INFINITY
          worst = part
        }
      }
      time = t
      if (!(worst <= 1)) return worst
      rate(nextRate, next, t + h)
      this.rateEvaluations += 1
      return allFinite(nextRate) ? worst : Number.POSITIVE_INFINITY
    },

    settle() {},

    at(theta, out) {
      out.set(theta === 0 ? from : next)
      if (theta === 0 || theta === 1) return
      take(theta * length, out)
      this.rateEvaluations += 5
    },

    strain: () => 0,
  }
}
