import fc from 'fast-check'
import { expect, test } from 'vitest'
import { createIntegrator, integrate } from '../../../engine/integrate/integrator.ts'
import type { Control, Problem } from '../../../engine/integrate/problem.ts'
import { expectArrival } from './expect-arrival.ts'
import { driven, oscillation } from './problems.ts'

const control: Control = { relative: 1e-8, absolute: 1e-10, maxSteps: 10_000 }

const chain: Problem = {
  rate: (out, y) => {
    const first = 2 * (y[0] as number)
    const second = ((y[1] as number) * 3) / (0.5 + (y[1] as number))
    out[0] = -first
    out[1] = first - second
    out[2] = second
  },
  start: 0,
  end: 4,
  initial: Float64Array.of(10, 1, 0),
  outputs: Float64Array.from({ length: 77 }, (_, i) => i / 20),
}

test('a sum the rate does not change stays what it is, to round-off', () => {
  const arrival = expectArrival(integrate(chain, { ...control, relative: 1e-5, method: 'explicit' }))
  for (let row = 0; row < arrival.outputsReached; row++) {
    const sum = arrival.outputs.subarray(3 * row, 3 * row + 3).reduce((a, b) => a + b)
    expect(Math.abs(sum - 11)).toBeLessThan(11 * 20 * Number.EPSILON)
  }
})

test('a problem is not changed by being solved', () => {
  const initial = Float64Array.of(10, 1, 0)
  const outputs = Float64Array.of(0, 1, 2)
  expectArrival(integrate(Object.freeze({ ...chain, initial, outputs }), Object.freeze(control)))
  expect(initial).toEqual(Float64Array.of(10, 1, 0))
  expect(outputs).toEqual(Float64Array.of(0, 1, 2))
})

const stiff: Problem = {
  rate: (out, y, t) => {
    out[0] = -1e5 * ((y[0] as number) - Math.sin(t))
    out[1] = (y[0] as number) - (y[1] as number)
  },
  start: 0,
  end: 3,
  initial: Float64Array.of(1, 1),
}

test('an integrator used before gives bit for bit what a fresh one gives', () => {
  const used = createIntegrator(2)
  for (const method of ['automatic', 'explicit', 'implicit'] as const) {
    for (const problem of [driven.problem, stiff, oscillation.problem, driven.problem, stiff]) {
      const c = { ...control, relative: 1e-6, method }
      expect(used.run(problem, c)).toEqual(createIntegrator(2).run(problem, c))
    }
  }
})

test('an arrival stays what it was when its integrator goes on', () => {
  const used = createIntegrator(2)
  const arrival = expectArrival(used.run(driven.problem, control))
  const copy = structuredClone(arrival)
  used.run(oscillation.problem, control)
  expect(arrival).toEqual(copy)
})

test('a run of no length returns its start', () => {
  const arrival = expectArrival(integrate({ ...chain, end: 0 }, control))
  expect(arrival).toMatchObject({ time: 0, event: false, state: chain.initial, outputsReached: 1 })
})

test('a run continued with the step it suggests rejects nothing', () => {
  const even: Control = { relative: 0, absolute: 1e-8, maxSteps: 1000 }
  const whole = expectArrival(integrate({ ...oscillation.problem, end: 4 }, even))
  const rest = { ...oscillation.problem, start: 4, initial: whole.state }
  const arrival = expectArrival(integrate(rest, { ...even, firstStep: whole.nextStep }))
  expect(arrival.work.stepsRejected).toBe(0)
  expect(Math.abs((arrival.state[0] as number) - Math.cos(10))).toBeLessThan(1e-6)
})

test('any chain of decays ends where its matrix exponential says', () => {
  // Source: Bateman's solution of A → B → with two different constants.
  fc.assert(
    fc.property(
      fc.double({ min: -2, max: 3, noNaN: true }),
      fc.double({ min: 0.1, max: 0.9, noNaN: true }),
      fc.constantFrom('automatic' as const, 'explicit' as const, 'implicit' as const),
      (logConstant, ratio, method) => {
        const k = 10 ** logConstant
        const l = k * ratio
        const problem: Problem = {
          rate: (out, y) => {
            out[0] = -k * (y[0] as number)
            out[1] = k * (y[0] as number) - l * (y[1] as number)
          },
          start: 0,
          end: 3 / k,
          initial: Float64Array.of(1, 0),
        }
        const tight = { relative: 1e-7, absolute: 1e-9, maxSteps: 5000, method }
        const { state } = expectArrival(integrate(problem, tight))
        const b = (k / (l - k)) * (Math.exp(-3) - Math.exp(-3 * ratio))
        expect(Math.abs((state[0] as number) - Math.exp(-3))).toBeLessThan(2e-7)
        expect(Math.abs((state[1] as number) - b)).toBeLessThan(2e-6)
      },
    ),
    { numRuns: 200 },
  )
})
