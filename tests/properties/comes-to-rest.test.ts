/** Batches that come to rest long before the time that integration would have to cover. */
import { expect, test } from 'vitest'
import { answerTo, apart, type File, type Json, plainFeed } from './asking.ts'

const lossOf = (steps: Json): Json => ({ ...(steps as object), Kp: '20 g/L' }) as Json

const single: Json = { kd: '0.05 1/h', at: '40 degC', Ea: '200 kJ/mol' }
const series = (first: number, second: number): Json => ({
  series: [
    { kd: '0.4 1/h', at: '40 degC', Ea: '200 kJ/mol', residual: first },
    { kd: '9 1/h', at: '40 degC', Ea: '150 kJ/mol', residual: second },
  ],
})

const batch = (inactivation: Json, Keq: number | undefined, conversion: number, dose = 2): File => ({
  format: 'dosewright-scenario',
  version: 1,
  feed: plainFeed,
  enzyme: {
    rate: {
      specificRate: '100 g/g/h',
      reference: { temperature: '40 degC' },
      Km: '5 g/L',
      ...(Keq === undefined ? {} : { Keq }),
    },
    temperature: { Ea: '45 kJ/mol' },
    inactivation,
  },
  programme: { temperature: '40 degC', dose: `${dose} kg` },
  ask: { find: 'time', conversion },
})

test('an enzyme protected by its substrate comes to the equilibrium and no further', () => {
  const answer = answerTo(batch(lossOf(single), 1.5, 0.9))
  expect(answer.reachable).toBe(false)
  expect(apart(answer.limitingConversion ?? 0, 0.6)).toBeLessThan(1e-12)
  expect(answer.warnings.map(({ code }) => code)).toContain('beyond-equilibrium')
  expect(answer.remedies).toEqual([])
})

test('a target before the equilibrium is reached by a protected enzyme, by both routes', () => {
  const answer = answerTo(batch(lossOf(single), 1.5, 0.59))
  expect(answer.reachable).toBe(true)
  expect(answer.check.relativeDifference).toBeLessThan(1e-6)
})

test.each([
  ['keeps a last form at work', 0.5, 0.2, 2, true],
  ['loses every form', 0.5, 0, 0.2, false],
])('a protected enzyme that %s is followed to the end of its days', (_, first, second, dose, reachable) => {
  const answer = answerTo(batch(lossOf(series(first, second)), undefined, 1 - 1e-9, dose))
  expect(answer.reachable).toBe(reachable)
  if (!reachable) expect(answer.limitingConversion).toBeGreaterThan(0.1)
  expect(answer.check.relativeDifference).toBeLessThan(1e-6)
  expect(answer.warnings.map(({ code }) => code)).not.toContain('check-failed')
})

test('steps know the time of a target of a millionth', () => {
  const { Kp: _, ...unprotected } = lossOf(single) as { readonly Kp: string }
  for (const inactivation of [unprotected, lossOf(single)]) {
    const answer = answerTo(batch(inactivation, 1.5, 1e-6))
    expect(answer.check.relativeDifference).toBeLessThan(1e-6)
  }
})
