import { expect, test } from 'vitest'
import { writeAnswer } from '../../../app/contract/index.ts'
import { hours, type Time } from '../../../engine/index.ts'
import { asked, fullAnswer } from './answers.ts'

test('every part in the units of the format', () => {
  expect(writeAnswer(fullAnswer, asked)).toMatchObject({
    format: 'dosewright-answer',
    version: 1,
    ask: { find: 'time', conversion: 0.95 },
    reachable: true,
    time: { value: 9.412, unit: 'h' },
    dose: { value: 3.5, unit: 'kg' },
    temperature: { value: 42, unit: 'degC' },
    conversion: 0.95,
    cost: { value: 1012.149, unit: 'EUR/batch' },
    limitingConversion: 0.987,
    leastDose: { value: 2.532, unit: 'kg' },
    trace: {
      time: { unit: 'h', values: [0, 1] },
      substrate: { unit: 'g/L', values: [45, 27.8] },
      product: { unit: 'g/L', values: [0, 9.05] },
      enzyme: { unit: 'g/L', values: [0.2917, 0.2535] },
      temperature: { unit: 'degC', values: [42, 42] },
      pH: { unit: '1', values: [6.7, 6.7] },
      volume: { unit: 'm3', values: [12, 12] },
      conversion: { unit: '1', values: [0, 0.3822] },
    },
    check: { method: 'ode-explicit', relativeDifference: 1.3e-10 },
    hours: {
      total: { value: 9.412, unit: 'h' },
      sentence:
        'Of 9.41 h, 4.01 h (43 %) go to inhibition by the product, the largest part that a change of plan could avoid.',
    },
    killStep: { residualActivity: 0.0123, logReduction: 1.91 },
    precision: { amplification: 12.5, digits: 4 },
    work: { stepsAccepted: 75, stepsRejected: 1, rateEvaluations: 836, jacobians: 0 },
    massBalance: 1e-15,
    warnings: [
      {
        code: 'kill-step-incomplete',
        message: 'After the kill step 1.2 % of the enzyme charged is still active.',
      },
    ],
  })
})

test('the question is echoed as the file has it', () => {
  const source = { ...(asked.source as object), ask: { find: 'dose', conversion: 0.95, within: '600 min' } }
  expect(writeAnswer(fullAnswer, { ...asked, source }).ask).toEqual({
    find: 'dose',
    conversion: 0.95,
    within: '600 min',
  })
})

test('remedies carry their numbers and their sentence', () => {
  expect(writeAnswer(fullAnswer, asked).remedies).toEqual([
    {
      kind: 'more-dose',
      dose: { value: 4.2, unit: 'kg' },
      time: { value: 6.59, unit: 'h' },
      sentence: 'With a dose of 4.2 kg the target takes 6.59 h.',
    },
    {
      kind: 'cooler',
      temperature: { value: 39, unit: 'degC' },
      time: { value: 7.59, unit: 'h' },
      sentence: 'Cooler, at 39 °C, the target takes 7.59 h.',
    },
    {
      kind: 'staged',
      doses: 3,
      each: { value: 1.2, unit: 'kg' },
      every: { value: 2, unit: 'h' },
      time: { value: 8, unit: 'h' },
      sentence: 'With 3 doses of 1.2 kg, one every 2 h, the target takes 8 h.',
    },
  ])
})

test('a small answer holds only what there is, warnings always', () => {
  const { work, massBalance, check, ask } = fullAnswer
  const written = writeAnswer({ ask, reachable: false, check, work, massBalance, warnings: [] }, asked)
  expect(Object.keys(written)).toEqual([
    'format',
    'version',
    'ask',
    'reachable',
    'check',
    'work',
    'massBalance',
    'warnings',
  ])
  expect(written.warnings).toEqual([])
})

test('what is written is plain JSON', () => {
  const written = writeAnswer(fullAnswer, asked)
  expect(JSON.parse(JSON.stringify(written))).toEqual(written)
})

test('a number that is not finite is a bug of the engine and never written', () => {
  expect(() => writeAnswer({ ...fullAnswer, time: hours(Number.NaN) as Time }, asked)).toThrow('not finite')
  expect(() => writeAnswer({ ...fullAnswer, conversion: Number.POSITIVE_INFINITY }, asked)).toThrow(
    'not finite',
  )
})

test('a check that gave up is null', () => {
  const check = { method: 'ode-implicit', relativeDifference: null } as const
  expect(writeAnswer({ ...fullAnswer, check }, asked).check).toEqual(check)
})
