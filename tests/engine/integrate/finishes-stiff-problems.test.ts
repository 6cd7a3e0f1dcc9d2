import { expect, test } from 'vitest'
import { integrate } from '../../../engine/integrate/integrator.ts'
import type { Problem } from '../../../engine/integrate/problem.ts'
import { expectArrival } from './expect-arrival.ts'

const follower: Problem = {
  rate: (out, y, t) => {
    out[0] = -1e6 * ((y[0] as number) - Math.cos(t))
  },
  start: 0,
  end: 10,
  initial: Float64Array.of(0),
}
// Source: closed form of y′ = −L(y − cos t) once the start is forgotten.
const L = 1e6
const followed = (t: number) => (L * L * Math.cos(t) + L * Math.sin(t)) / (L * L + 1)

test.each([1e-4, 1e-6, 1e-8])('a state tied to a slow course follows it cheaply at %s', (tolerance) => {
  const control = { relative: tolerance, absolute: tolerance, maxSteps: 100_000 }
  const outputs = Float64Array.from({ length: 50 }, (_, i) => 0.1 + i * 0.19)
  const arrival = expectArrival(integrate({ ...follower, outputs }, control))
  expect(Math.abs((arrival.state[0] as number) - followed(10))).toBeLessThan(5 * tolerance)
  for (const [i, t] of outputs.entries()) {
    expect(Math.abs((arrival.outputs[i] as number) - followed(t))).toBeLessThan(10 * tolerance)
  }
  expect(arrival.work.stepsAccepted).toBeLessThan(300)
  expect(arrival.work.jacobians).toBeGreaterThan(0)
})

test('an event of a stiff problem is located to its tolerance', () => {
  const control = { relative: 1e-8, absolute: 1e-8, maxSteps: 100_000 }
  const event = (_t: number, y: Float64Array) => (y[0] as number) + 0.5
  const arrival = expectArrival(integrate({ ...follower, initial: Float64Array.of(1), event }, control))
  // cos t = −1/2 at 2π/3, and the state lags 1/L behind.
  expect(Math.abs(arrival.time - (2 * Math.PI) / 3 - 1 / L)).toBeLessThan(5e-8)
})

const robertson: Problem = {
  rate: (out, y) => {
    const [a, b, c] = y as unknown as [number, number, number]
    out[0] = -0.04 * a + 1e4 * b * c
    out[1] = 0.04 * a - 1e4 * b * c - 3e7 * b * b
    out[2] = 3e7 * b * b
  },
  start: 0,
  end: 1e11,
  initial: Float64Array.of(1, 0, 0),
}

test.each([
  { tolerance: 1e-6, steps: 800 },
  { tolerance: 1e-8, steps: 2500 },
])("Robertson's reaction ends where the literature says, at $tolerance", ({ tolerance, steps }) => {
  const source = 'Mazzia & Magherini, Test Set for Initial Value Problem Solvers, problem ROBER, t = 1e11'
  const published = [0.2083340149701255e-7, 0.8333360770334713e-13, 0.999999979166505]
  const control = { relative: tolerance, absolute: tolerance * 1e-7, maxSteps: 100_000 }
  const arrival = expectArrival(integrate(robertson, control))
  for (const [i, value] of published.entries()) {
    expect(Math.abs((arrival.state[i] as number) / value - 1), source).toBeLessThan(10 * tolerance)
  }
  expect(arrival.work.stepsAccepted).toBeLessThan(steps)
  const [a, b, c] = arrival.state as unknown as [number, number, number]
  expect(Math.abs(a + b + c - 1)).toBeLessThan(1e-12)
})

test('a problem that is not stiff never meets the implicit method', () => {
  const control = { relative: 1e-9, absolute: 1e-9, maxSteps: 10_000 }
  const rate: Problem['rate'] = (out, y) => {
    out[0] = y[1] as number
    out[1] = -(y[0] as number)
  }
  const arrival = expectArrival(
    integrate({ rate, start: 0, end: 500, initial: Float64Array.of(1, 0) }, control),
  )
  expect(arrival.work.jacobians).toBe(0)
})
