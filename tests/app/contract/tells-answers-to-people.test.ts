import { expect, test } from 'vitest'
import { readableAnswer } from '../../../app/contract/index.ts'
import { type Answer, celsius, hours, type Mass, quantity } from '../../../engine/index.ts'
import { asked, askedInPhases, fullAnswer, sound } from './answers.ts'
import { type Json, shortForm } from './scenarios.ts'

const { trace: _, ...timeAnswer } = fullAnswer

test('a whole answer reads from the sentence down to the cautions', () => {
  expect(readableAnswer(timeAnswer, asked)).toBe(`Lactose in permeate

Dose 3.5 kg, hold 9.42 h at 42 °C: 95 % conversion, 1012 EUR a batch.
Below a dose of 2.53 kg the target is never reached.

Where the hours go:
  the reaction itself, saturated and uninhibited  1.40 h
  inhibition by the product                       4.01 h
  loss of enzyme                                  4.00 h
  in all                                          9.41 h
Of 9.41 h, 4.01 h (43 %) go to inhibition by the product, the largest part that a change of plan could avoid.

What would help:
  With a dose of 4.2 kg the target takes 6.59 h.
  Cooler, at 39 °C, the target takes 7.59 h.
  With 3 doses of 1.2 kg, one every 2 h, the target takes 8 h.

After the kill step 1.2 % of the enzyme charged is active; the step takes it down by 1.9 powers of ten.

Check by step-by-step integration, explicit: the two agree to 1e-10 of the value. About 4 digits are good.

Warning: After the kill step 1.2 % of the enzyme charged is still active.

Cautions:
  Enzyme dust and aerosol can sensitise the airways; handle the preparation as its safety data sheet says.
  Hot liquid and jackets scald; mind them in the kill step.
  Predictions support, and never replace, the site's validated procedures, assays on the batch itself, food and pharmaceutical law, local codes and licensed practice.`)
})

const firstLine = (ask: Json, change: Partial<Answer>): string => {
  const read = sound(shortForm(), ['ask', ask], ['title', undefined])
  const { work, massBalance, check } = fullAnswer
  const small = { reachable: true, check, work, massBalance, warnings: [] }
  return readableAnswer({ ...small, ...change, ask: read.scenario.ask }, read).split('\n')[0] ?? ''
}

const dose = quantity<Mass>(3.361)
const between = ['25 degC', '60 degC']

test.each<[string, Json, Partial<Answer>, string]>([
  [
    'a dose is rounded up, so that it is enough',
    { find: 'dose', conversion: 0.95, within: '10 h' },
    { dose, time: hours(10) },
    'Dose 3.37 kg, hold 10 h at 42 °C: 95 % conversion.',
  ],
  [
    'no dose is enough',
    { find: 'dose', conversion: 0.95, within: '10 h' },
    { reachable: false },
    'No dose reaches 95 % conversion within 10 h.',
  ],
  [
    'a target out of reach',
    { find: 'time', conversion: 0.95 },
    { reachable: false, dose: quantity<Mass>(3.5) },
    'Dose 3.5 kg at 42 °C: 95 % conversion is not reached.',
  ],
  [
    'the best temperature for time',
    { find: 'temperature', best: 'time', conversion: 0.9, between },
    { temperature: celsius(39.74), time: hours(5.66), cost: { value: 71.366, currency: 'EUR' } },
    '90 % conversion is reached soonest at 39.7 °C: in 5.66 h, 71.37 EUR a batch.',
  ],
  [
    'no temperature is good enough',
    { find: 'temperature', best: 'time', conversion: 0.9, between },
    { reachable: false },
    '90 % conversion is not reached at any temperature of the range.',
  ],
  [
    'the best temperature for conversion',
    { find: 'temperature', best: 'conversion', within: '5 h', between },
    { temperature: celsius(40.18), conversion: 0.87257 },
    'Within 5 h conversion is highest at 40.2 °C: 87.26 %.',
  ],
])('%s', (_name, ask, change, line) => {
  expect(firstLine(ask, change)).toBe(line)
})

test('under phases the doses are told as a sum', () => {
  const answer = { ...timeAnswer, dose: quantity<Mass>(4.3) }
  expect(readableAnswer(answer, askedInPhases).split('\n')[2]).toBe(
    '95 % conversion is reached 9.42 h after the first dose, with 4.3 kg of enzyme in all, 1012 EUR a batch.',
  )
})

test('a trace is a table that aligns, thinned when it is long', () => {
  const read = sound(shortForm(), ['ask', { find: 'trace', at: ['0 h', '1 h'] }])
  const lines = readableAnswer({ ...fullAnswer, ask: read.scenario.ask }, read).split('\n')
  expect(lines.slice(5, 8)).toEqual([
    'time h  substrate g/L  product g/L  enzyme g/L  degC    pH  volume m3  conversion',
    ' 0.000         45.000        0.000      0.2917  42.0  6.70      12.00      0.0000',
    ' 1.000         27.800        9.050      0.2535  42.0  6.70      12.00      0.3822',
  ])
  const many = new Float64Array(1000)
  const { pH: _pH, ...rest } = fullAnswer.trace ?? { time: many }
  const trace = Object.fromEntries(Object.keys(rest).map((key) => [key, many])) as unknown as NonNullable<
    Answer['trace']
  >
  const long = readableAnswer({ ...fullAnswer, ask: read.scenario.ask, trace }, read)
  expect(long).toContain('(60 of 1000 times; --json has them all)')
})

test('a title from the file cannot steer the terminal', () => {
  const read = sound(shortForm(), ['title', 'red \u001b[31m\nsecond line'])
  expect(readableAnswer(timeAnswer, read).split('\n')[0]).toBe('red \\u001b[31m\\u000asecond line')
})

test('nothing shouts', () => {
  expect(readableAnswer(fullAnswer, asked)).not.toContain('!')
})
