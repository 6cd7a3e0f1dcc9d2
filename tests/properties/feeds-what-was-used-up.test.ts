/** A feed that comes when substrate or enzyme have long fallen below anything a double tells from nothing. */
import { expect, test } from 'vitest'
import { answerTo, asking, type File } from './asking.ts'

const after = (fed: { readonly [key: string]: string }): File => ({
  format: 'dosewright-scenario',
  version: 1,
  feed: {
    volume: '1 m3',
    substrate: { concentration: '50 g/L' },
    product: { massYield: 1, concentration: '0 g/L' },
  },
  enzyme: {
    rate: { specificRate: '500 g/g/h', reference: { temperature: '40 degC' }, Km: '0.5 g/L' },
    temperature: { Ea: '45 kJ/mol' },
    inactivation: { kd: '0.05 1/h', at: '40 degC', Ea: '300 kJ/mol' },
  },
  programme: {
    start: { temperature: '40 degC' },
    phases: [
      { phase: 'dose', amount: '2 kg' },
      { phase: 'hold', for: '20 h' },
      { phase: 'heat', to: '90 degC', ramp: '5 K/min' },
      { phase: 'hold', for: '5 h' },
      { phase: 'cool', to: '40 degC', ramp: '5 K/min' },
      { phase: 'feed', flow: '100 L/h', for: '2 h', concentration: '150 g/L', ...fed },
    ],
  },
  ask: { find: 'trace', at: ['25 h', '28 h', '30 h'] },
})

test('substrate fed to an enzyme long dead stays as it is', () => {
  const { trace } = answerTo(after({}))
  expect(trace?.conversion[2]).toBeCloseTo(50 / 80, 9)
  expect(trace?.enzyme[2]).toBe(0)
})

test('enzyme fed after all of it was lost goes to work', () => {
  const file = after({ enzyme: '1 g/L' })
  const { trace, check } = answerTo(file)
  expect(trace?.enzyme[2]).toBeGreaterThan(0.1)
  expect(trace?.conversion[2]).toBeGreaterThan(0.7)
  expect(check.relativeDifference).toBeLessThan(1e-5)
  expect(answerTo(asking(file, { find: 'time', conversion: 0.5 })).reachable).toBe(true)
})
