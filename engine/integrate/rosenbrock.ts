import { factorise, solveFactorised } from '../numeric/linear.ts'
import { allFinite } from './finite.ts'
import { jacobianInto } from './jacobian.ts'
import type { Method } from './method.ts'
import type { RateInto } from './problem.ts'
import { rodas } from './rodas-table.ts'

/**
 * Implicit method for stiff problems: RODAS, L-stable, of order four with an estimate of order
 * three, its Jacobian by differences and its own interpolant of order three.
 *
 * Shapes   one instance serves problems of one size, one at a time.
 * Source   Hairer & Wanner, Solving Ordinary Differential Equations II, IV.7.
 */
export const createRosenbrock = (size: number): Method => {
  const { gamma, alpha, d, a, c, dense } = rodas
  const from = new Float64Array(size)
  const next = new Float64Array(size)
  const nextRate = new Float64Array(size)
  const jacobian = new Float64Array(size * size)
  const slopes = new Float64Array(size)
  const matrix = new Float64Array(size * size)
  const pivots = new Int32Array(size)
  const stages = [0, 1, 2, 3, 4, 5].map(() => new Float64Array(size))
  const at = new Float64Array(size)
  const rateAt = new Float64Array(size)
  const bend = new Float64Array(size)
  const twist = new Float64Array(size)
  let rate: RateInto = () => {}
  let relative = 0
  let absolute = 0
  // A step tried again after a rejection starts from the same point and keeps its Jacobian.
  let linearisedAt = Number.NaN

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

  return {
    exponent: 1 / 4,
    memory: 0,
    next,
    nextRate,
    rateEvaluations: 0,
    jacobians: 0,

    adopt(newRate, newRelative, newAbsolute) {
      rate = newRate
      relative = newRelative
      absolute = newAbsolute
      linearisedAt = Number.NaN
      this.rateEvaluations = 0
      this.jacobians = 0
    },

    attempt(t, h, y, f) {
      if (t !== linearisedAt) {
        jacobianInto(jacobian, slopes, rate, t, h, y, f, relative, absolute, at, rateAt)
        linearisedAt = t
        this.jacobians += 1
        this.rateEvaluations += size + 2
      }
      for (let i = 0; i < matrix.length; i++) matrix[i] = -(jacobian[i] as number)
      for (let i = 0; i < matrix.length; i += size + 1) matrix[i] = (matrix[i] as number) + 1 / (gamma * h)
      if (!factorise(matrix, pivots)) return Number.POSITIVE_INFINITY
      from.set(y)
      rateAt.set(f)
      solveStage(0, h)
      for (let s = 1; s < 5; s++) {
        at.set(from)
        combine(a[s] as readonly number[], at, 1)
        rate(rateAt, at, t + (alpha[s] ?? 1) * h)
        solveStage(s, h)
      }
      const fifth = stages[4] as Float64Array
      const last = stages[5] as Float64Array
      for (let i = 0; i < size; i++) at[i] = (at[i] as number) + (fifth[i] as number)
      rate(rateAt, at, t + h)
      solveStage(5, h)
      this.rateEvaluations += 5
      let worst = 0
      for (let i = 0; i < size; i++) {
        const value = (at[i] as number) + (last[i] as number)
        next[i] = value
        const scale = absolute + relative * Math.max(Math.abs(from[i] as number), Math.abs(value))
        const error = Math.abs(last[i] as number) / scale
        if (!(error <= worst)) {
          if (!(error < Number.POSITIVE_INFINITY)) return Number.POSITIVE_INFINITY
          worst = error
        }
      }
      if (!(worst <= 1)) return worst
      rate(nextRate, next, t + h)
      this.rateEvaluations += 1
      return allFinite(nextRate) ? worst : Number.POSITIVE_INFINITY
    },

    settle() {
      bend.fill(0)
      twist.fill(0)
      combine(dense[0], bend, 1)
      combine(dense[1], twist, 1)
    },

    at(theta, out) {
      const rest = 1 - theta
      for (let i = 0; i < size; i++) {
        const inner = (bend[i] as number) + theta * (twist[i] as number)
        out[i] = rest * (from[i] as number) + theta * ((next[i] as number) + rest * inner)
      }
    },

    strain: () => 0,
  }
}
