import rk4 from 'ode-rk4'
import { quinticInto } from './hermite.ts'
import type { Method } from './method.ts'
import type { RateInto } from './problem.ts'

/**
 * The difference of one whole and two half steps estimates the error of the fourth-order result,
 * but the run continues from the fifth-order extrapolation, which is far better.
 */
const ACCEPTED_ESTIMATE = 10

/** Length of a step times the stiffest rate constant at which damping is lost. */
const STABILITY_LIMIT = 4

/**
 * Explicit method: classical Runge–Kutta by step doubling with local extrapolation.
 *
 * Shapes   one instance serves problems of one size, one at a time.
 * Source   Hairer, Nørsett & Wanner, Solving Ordinary Differential Equations I, II.4
 *          ("Richardson extrapolation"); E. Fehlberg's classical fourth-order steps.
 */
export const createDoubling = (size: number): Method => {
  const idle: RateInto = () => {}
  const whole = rk4(new Float64Array(size), idle, 0, 0)
  const half = rk4(new Float64Array(size), idle, 0, 0)
  const from = new Float64Array(size)
  const fromRate = new Float64Array(size)
  const middle = new Float64Array(size)
  const middleRate = new Float64Array(size)
  const endRate = new Float64Array(size)
  const next = new Float64Array(size)
  let rate = idle
  let relative = 0
  let absolute = 0
  let time = 0
  let length = 0

  // The rate at the start of the step is known: both first stages take it from here,
  // and then hand the stepper over to the real rate.
  const replay: RateInto = (out) => {
    for (let i = 0; i < size; i++) out[i] = fromRate[i] as number
    whole.deriv = rate
    half.deriv = rate
  }

  return {
    exponent: 1 / 5,
    memory: 0.04,
    next,
    rateEvaluations: 0,
    jacobians: 0,

    adopt(newRate, newRelative, newAbsolute) {
      rate = newRate
      relative = newRelative
      absolute = newAbsolute
      this.rateEvaluations = 0
    },

    attempt(t, h, y, f) {
      const coarse = whole.y
      const fine = half.y
      for (let i = 0; i < size; i++) {
        const value = y[i] as number
        from[i] = value
        coarse[i] = value
        fine[i] = value
        fromRate[i] = f[i] as number
      }
      time = t
      length = h
      whole.t = t
      whole.dt = h
      whole.deriv = replay
      whole.step()
      half.t = t
      half.dt = 0.5 * h
      half.deriv = replay
      half.step()
      for (let i = 0; i < size; i++) middle[i] = fine[i] as number
      half.step()
      this.rateEvaluations += 10
      let worst = 0
      for (let i = 0; i < size; i++) {
        const correction = ((fine[i] as number) - (coarse[i] as number)) / 15
        const value = (fine[i] as number) + correction
        next[i] = value
        const before = Math.abs(from[i] as number)
        const after = Math.abs(value)
        const scale = ACCEPTED_ESTIMATE * (absolute + relative * Math.max(before, after))
        const error = Math.abs(correction) / scale
        if (!(error <= worst)) {
          if (!(error < Number.POSITIVE_INFINITY)) return Number.POSITIVE_INFINITY
          worst = error
        }
      }
      return worst
    },

    settle(fEnd) {
      // Half of the correction belongs to each of the two half steps.
      const coarse = whole.y
      const fine = half.y
      for (let i = 0; i < size; i++) {
        middle[i] = (middle[i] as number) + ((fine[i] as number) - (coarse[i] as number)) / 30
        endRate[i] = fEnd[i] as number
      }
      rate(middleRate, middle, time + 0.5 * length)
      this.rateEvaluations += 1
    },

    at(theta, out) {
      quinticInto(out, theta, length, from, fromRate, middle, middleRate, next, endRate)
    },

    strain(fEnd) {
      // The two results of the step differ most along the stiffest direction; middleRate is free
      // here, because a step is settled only when it is interpolated.
      rate(middleRate, whole.y, time + length)
      this.rateEvaluations += 1
      let rates = 0
      let states = 0
      for (let i = 0; i < size; i++) {
        const scale = absolute + relative * Math.abs(next[i] as number)
        const df = ((fEnd[i] as number) - (middleRate[i] as number)) / scale
        const dy = ((next[i] as number) - (whole.y[i] as number)) / scale
        rates += df * df
        states += dy * dy
      }
      return states > 0 ? (length * Math.sqrt(rates / states)) / STABILITY_LIMIT : 0
    },
  }
}
