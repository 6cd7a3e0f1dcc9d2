import { expect, test } from 'vitest'
import { integrate } from '../../../engine/integrate/integrator.ts'
import { expectArrival } from './expect-arrival.ts'
import { driven, exponential, logistic, oscillation } from './problems.ts'

const tolerances = [1e-4, 1e-5, 1e-6, 1e-7, 1e-8, 1e-9, 1e-10, 1e-11]
const explicit = tolerances.map((tolerance) => ({ method: 'explicit' as const, tolerance }))
const implicit = tolerances.slice(0, -2).map((tolerance) => ({ method: 'implicit' as const, tolerance }))

for (const known of [exponential, logistic, oscillation, driven]) {
  test.each([...explicit, ...implicit])(`${known.name}: $method at $tolerance`, ({ method, tolerance }) => {
    const { start, end, initial } = known.problem
    const size = initial.length
    const outputs = Float64Array.from({ length: 101 }, (_, i) => start + ((end - start) * i) / 100)
    const control = { relative: tolerance, absolute: tolerance, maxSteps: 5000, method }
    const arrival = expectArrival(integrate({ ...known.problem, outputs }, control))

    expect(arrival.outputsReached).toBe(101)
    let worst = 0
    outputs.forEach((t, row) => {
      known.at(t).forEach((value, i) => {
        const error = Math.abs((arrival.outputs[row * size + i] as number) - value)
        worst = Math.max(worst, error / (1 + Math.abs(value)))
      })
    })
    // Five tolerances is what an accepted step of a pure decay may be off; then it is carried on.
    expect(worst).toBeLessThan(5 * known.carried * tolerance)
    // Work as the order has it: five for the one method, three (of its estimate, at four) for the other.
    const order = method === 'explicit' ? 5 : 4
    expect(arrival.work.stepsAccepted).toBeLessThan(10 + 3 * (end - start) * tolerance ** (-1 / order))
    expect(arrival.work.stepsRejected).toBeLessThan(10 + arrival.work.stepsAccepted / 4)
  })
}

test('the first and the last output are the initial state and the arrival', () => {
  const outputs = Float64Array.of(0, 5)
  const control = { relative: 1e-8, absolute: 1e-8, maxSteps: 1000 }
  const arrival = expectArrival(integrate({ ...exponential.problem, outputs }, control))
  expect(arrival.outputs[0]).toBe(1)
  expect(arrival.outputs[1]).toBe(arrival.state[0])
})

test('outputs after an event are left out and counted', () => {
  const outputs = Float64Array.of(0.1, 0.2, 0.3, 4)
  const control = { relative: 1e-8, absolute: 1e-8, maxSteps: 1000 }
  const event = (t: number) => 0.25 - t
  const arrival = expectArrival(integrate({ ...exponential.problem, outputs, event }, control))
  expect(arrival.outputsReached).toBe(2)
  expect(arrival.outputs.length).toBe(4)
})

test('populations of prey and hunters keep their invariant', () => {
  // Source: Lotka–Volterra conserves x − ln x + y − ln y when all its constants are one.
  const invariant = (x: number, y: number) => x - Math.log(x) + y - Math.log(y)
  for (const tolerance of [1e-5, 1e-7, 1e-9, 1e-11]) {
    const arrival = expectArrival(
      integrate(
        {
          rate: (out, y) => {
            out[0] = (y[0] as number) * (1 - (y[1] as number))
            out[1] = (y[1] as number) * ((y[0] as number) - 1)
          },
          start: 0,
          end: 20,
          initial: Float64Array.of(2, 1),
          outputs: Float64Array.from({ length: 200 }, (_, i) => i / 10),
        },
        { relative: tolerance, absolute: tolerance, maxSteps: 5000 },
      ),
    )
    let worst = 0
    for (let row = 0; row < 200; row++) {
      const x = arrival.outputs[2 * row] as number
      const y = arrival.outputs[2 * row + 1] as number
      worst = Math.max(worst, Math.abs(invariant(x, y) - invariant(2, 1)))
    }
    expect(worst).toBeLessThan(60 * tolerance)
  }
})
