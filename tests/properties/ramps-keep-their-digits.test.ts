/** Corners of ramps that random plans brought to light: both routes must agree there. */
import { expect, test } from 'vitest'
import { answerTo, type File, type Json, plainFeed } from './asking.ts'

const plan = (phases: Json, conversion: number, temperature: Json = {}, rate: Json = {}): File => ({
  format: 'dosewright-scenario',
  version: 1,
  feed: plainFeed,
  enzyme: {
    rate: {
      specificRate: '100 g/g/h',
      reference: { temperature: '40 degC' },
      Km: '5 g/L',
      ...(rate as object),
    },
    temperature: { Ea: '60 kJ/mol', ...(temperature as object) },
  },
  programme: { start: { temperature: '20 degC' }, phases },
  ask: { find: 'time', conversion },
})

test.each([1e-6, 1e-4, 1e-2])(
  'a conversion of %f early in a long ramp is timed by both routes',
  (conversion) => {
    const answer = answerTo(
      plan(
        [
          { phase: 'dose', amount: '5 kg' },
          { phase: 'heat', to: '60 degC', ramp: '0.01 K/min' },
        ],
        conversion,
      ),
    )
    expect(answer.check.relativeDifference).toBeLessThan(1e-8)
  },
)

test('a ramp through the reversible loss of an enzyme is summed by both routes', () => {
  const answer = answerTo(
    plan(
      [
        { phase: 'dose', amount: '5 kg' },
        { phase: 'heat', to: '90 degC', ramp: '0.5 K/min' },
      ],
      0.97,
      { reversibleLoss: { half: '60 degC', energy: '425 kJ/mol' } },
    ),
  )
  expect(answer.check.relativeDifference).toBeLessThan(1e-8)
})

test('a hold that waits for a conversion beyond the equilibrium waits in vain, by both routes', () => {
  const answer = answerTo(
    plan(
      [
        { phase: 'dose', amount: '5 kg' },
        { phase: 'hold', until: { conversion: 0.7 }, atMost: '40 h' },
        { phase: 'hold', for: '1 h' },
      ],
      0.8,
      {},
      { Keq: 1 },
    ),
  )
  expect(answer.reachable).toBe(false)
  expect(answer.conversion).toBeCloseTo(0.5, 9)
  expect(answer.check.relativeDifference).toBeLessThan(1e-8)
})
