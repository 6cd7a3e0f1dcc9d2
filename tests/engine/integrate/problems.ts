import type { Problem } from '../../../engine/integrate/problem.ts'

export interface Known {
  readonly name: string
  readonly problem: Problem
  readonly at: (t: number) => readonly number[]
  readonly source: string
  /** Errors of one step grow into this many of the whole run; known from the equation. */
  readonly carried: number
}

export const exponential: Known = {
  name: 'an exponential decay',
  problem: {
    rate: (out, y) => {
      out[0] = -(y[0] as number)
    },
    start: 0,
    end: 5,
    initial: Float64Array.of(1),
  },
  at: (t) => [Math.exp(-t)],
  source: 'closed form: exp(−t)',
  carried: 5,
}

export const logistic: Known = {
  name: 'a logistic growth',
  problem: {
    rate: (out, y) => {
      out[0] = (y[0] as number) * (1 - (y[0] as number))
    },
    start: 0,
    end: 12,
    initial: Float64Array.of(0.01),
  },
  at: (t) => [1 / (1 + 99 * Math.exp(-t))],
  source: 'closed form: 1/(1 + 99·exp(−t))',
  carried: 5,
}

export const oscillation: Known = {
  name: 'a harmonic oscillation',
  problem: {
    rate: (out, y) => {
      out[0] = y[1] as number
      out[1] = -(y[0] as number)
    },
    start: 0,
    end: 10,
    initial: Float64Array.of(1, 0),
  },
  at: (t) => [Math.cos(t), -Math.sin(t)],
  source: 'closed form: cos t, −sin t',
  carried: 10,
}

/** Depends on time, is nonlinear, and couples its components. */
export const driven: Known = {
  name: 'a driven nonlinear pair',
  problem: {
    rate: (out, y, t) => {
      out[0] = Math.cos(t) * Math.sqrt(y[1] as number)
      out[1] = 2 * (y[0] as number) * (y[0] as number) * Math.cos(t)
    },
    start: 0,
    end: 3,
    initial: Float64Array.of(1, 1),
  },
  at: (t) => [Math.exp(Math.sin(t)), Math.exp(2 * Math.sin(t))],
  source: 'closed form: exp(sin t) and its square, by substitution',
  carried: 60,
}
