import { expect, test } from 'vitest'
import { integrate } from '../../../engine/integrate/integrator.ts'
import type { Control, Problem } from '../../../engine/integrate/problem.ts'
import { expectArrival, expectFailure } from './expect-arrival.ts'

const control: Control = { relative: 1e-8, absolute: 1e-8, maxSteps: 10_000 }
const methods = ['automatic', 'explicit', 'implicit'] as const

const failsAtThree: Problem = {
  rate: (out, _y, t) => {
    out[0] = 1
    out[1] = t > 3 ? Number.NaN : -1
  },
  start: 0,
  end: 10,
  initial: Float64Array.of(0, 0),
}

test.each(methods)('a rate that turns to NaN is named with its place and component (%s)', (method) => {
  const failure = expectFailure(integrate(failsAtThree, { ...control, method }))
  expect(failure).toMatchObject({ kind: 'rate-not-finite', component: 1 })
  expect(Math.abs(failure.time - 3)).toBeLessThan(1e-6)
  expect(failure.reached.time).toBeLessThanOrEqual(3)
  expect(Math.abs((failure.reached.state[0] as number) - failure.reached.time)).toBeLessThan(1e-12)
})

test('a rate that is not finite at the start is named at once', () => {
  const rate: Problem['rate'] = (out) => {
    out[0] = 0
    out[1] = Number.POSITIVE_INFINITY
  }
  const failure = expectFailure(integrate({ ...failsAtThree, rate }, control))
  expect(failure).toMatchObject({ kind: 'rate-not-finite', time: 0, component: 1 })
})

test('an overshoot out of the domain of the rate is only a step to be shortened', () => {
  // Source: closed form of y′ = −√y, y(0) = 1: y = (1 − t/2)²; the root of a trial below zero is NaN.
  const problem: Problem = {
    rate: (out, y) => {
      out[0] = -Math.sqrt(y[0] as number)
    },
    start: 0,
    end: 1.99,
    initial: Float64Array.of(1),
  }
  const arrival = expectArrival(integrate(problem, { ...control, firstStep: 1.99 }))
  expect(Math.abs((arrival.state[0] as number) - 0.005 ** 2)).toBeLessThan(1e-7)
})

test.each(methods)('a solution that ends in finite time stops there, with a name (%s)', (method) => {
  // Source: y′ = y², y(0) = 1 is 1/(1 − t).
  const problem: Problem = {
    rate: (out, y) => {
      out[0] = (y[0] as number) ** 2
    },
    start: 0,
    end: 2,
    initial: Float64Array.of(1),
  }
  const failure = expectFailure(integrate(problem, { ...control, method }))
  expect(['step-too-small', 'too-many-steps', 'rate-not-finite']).toContain(failure.kind)
  expect(Math.abs(failure.time - 1)).toBeLessThan(1e-6)
})

test('a budget of steps ends the run with the count', () => {
  const rate: Problem['rate'] = (out, y) => {
    out[0] = y[1] as number
    out[1] = -(y[0] as number)
  }
  const problem = { rate, start: 0, end: 1e6, initial: Float64Array.of(1, 0) }
  const failure = expectFailure(integrate(problem, { ...control, maxSteps: 50 }))
  expect(failure).toMatchObject({ kind: 'too-many-steps', taken: 50 })
  expect(failure.reached.time).toBeGreaterThan(0)
  expect(Math.abs((failure.reached.state[0] as number) - Math.cos(failure.reached.time))).toBeLessThan(1e-5)
})

test('a step lost in the round-off of time is named', () => {
  // A discontinuity far from zero: no step over it is good enough.
  const rate: Problem['rate'] = (out, _y, t) => {
    out[0] = t < 1e15 + 3 ? 0 : 1e9
  }
  const problem = { rate, start: 1e15, end: 1e15 + 10, initial: Float64Array.of(0) }
  expect(expectFailure(integrate(problem, control)).kind).toBe('step-too-small')
})

test('a senseless problem or control is a bug and throws', () => {
  expect(() => integrate({ ...failsAtThree, end: -1 }, control)).toThrow(RangeError)
  expect(() => integrate(failsAtThree, { ...control, absolute: 0 })).toThrow(RangeError)
  expect(() => integrate({ ...failsAtThree, event: () => Number.NaN }, control)).toThrow(RangeError)
})
