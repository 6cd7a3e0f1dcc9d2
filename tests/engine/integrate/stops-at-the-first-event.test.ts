import { expect, test } from 'vitest'
import { integrate } from '../../../engine/integrate/integrator.ts'
import type { Problem } from '../../../engine/integrate/problem.ts'
import { expectArrival } from './expect-arrival.ts'

const decay: Problem = {
  rate: (out, y) => {
    out[0] = -(y[0] as number)
  },
  start: 0,
  end: 10,
  initial: Float64Array.of(1),
}
const control = { relative: 1e-9, absolute: 1e-12, maxSteps: 10_000 }

test.each([
  { level: 0.9, source: 'closed form: ln(1/0.9)' },
  { level: 0.5, source: 'closed form: ln 2' },
  { level: 0.001, source: 'closed form: ln 1000' },
])('a decay passes $level when the closed form says', ({ level }) => {
  const arrival = expectArrival(integrate({ ...decay, event: (_t, y) => (y[0] as number) - level }, control))
  expect(arrival.event).toBe(true)
  // Relative errors add up over the time constants passed.
  expect(Math.abs(arrival.time + Math.log(level))).toBeLessThan(3e-9 * Math.max(1, arrival.time))
  expect(Math.abs((arrival.state[0] as number) - level)).toBeLessThan(4e-16)
})

test.each(['automatic', 'explicit', 'implicit'] as const)(
  'an event without bottom is met though a step may pass it by ages (%s)',
  (method) => {
    // Source: closed form; the logarithm falls at a constant rate, so nothing but the event limits a step.
    const at = (3.7 - Math.log(20)) / 1.67e-4
    const problem: Problem = {
      rate: (out) => {
        out[0] = -1.67e-4
        out[1] = 0
      },
      start: 0,
      end: 1e8,
      initial: Float64Array.of(3.7, -3),
      event: (_t, y) => Math.log(Math.exp(y[0] as number) / 20),
    }
    const arrival = expectArrival(integrate(problem, { ...control, method }))
    expect(arrival.event).toBe(true)
    expect(Math.abs(arrival.time / at - 1)).toBeLessThan(1e-14)
  },
)

test('an oscillation stops at its first zero, not at a later one', () => {
  const arrival = expectArrival(
    integrate(
      {
        rate: (out, y) => {
          out[0] = y[1] as number
          out[1] = -(y[0] as number)
        },
        start: 0,
        end: 100,
        initial: Float64Array.of(1, 0),
        event: (_t, y) => y[0] as number,
      },
      control,
    ),
  )
  expect(Math.abs(arrival.time - Math.PI / 2)).toBeLessThan(2e-9)
})

test('an event already past at the start stops the run there', () => {
  const arrival = expectArrival(integrate({ ...decay, event: () => 0 }, control))
  expect(arrival).toMatchObject({ time: 0, event: true, state: Float64Array.of(1) })
  expect(arrival.work.rateEvaluations).toBe(0)
})

test('an event that is not met leaves the run to its end', () => {
  const arrival = expectArrival(integrate({ ...decay, event: (_t, y) => (y[0] as number) - 1e-6 }, control))
  expect(arrival).toMatchObject({ time: 10, event: false })
})

test('an event on time alone is located to round-off', () => {
  const arrival = expectArrival(integrate({ ...decay, event: (t) => 1 / 3 - t }, control))
  expect(Math.abs(arrival.time - 1 / 3)).toBeLessThan(1e-15)
})
