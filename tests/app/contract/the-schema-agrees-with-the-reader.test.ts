import { Ajv2020 } from 'ajv/dist/2020.js'
import fc from 'fast-check'
import { expect, test, vi } from 'vitest'
import { readScenario, scenarioSchema } from '../../../app/contract/index.ts'
import { badInputs } from './bad-inputs.ts'
import { edited, type Json, phased, shortForm } from './scenarios.ts'

vi.setConfig({ testTimeout: 60_000 })

const fits = new Ajv2020({
  strict: true,
  strictRequired: false,
  strictTypes: false,
  allErrors: false,
}).compile(scenarioSchema())

const activity: Json = {
  declared: '5000 U/g',
  assay: { temperature: '37 degC', pH: 6.5, substrate: '50 g/L' },
}

const sound: readonly { [key: string]: Json }[] = [
  shortForm(),
  phased(),
  edited(shortForm(), ['enzyme.rate.specificRate', undefined], ['enzyme.rate.activity', activity]),
  edited(shortForm(), ['enzyme.temperature', { Q10: 2, from: '30 degC' }]),
  edited(shortForm(), ['enzyme.inactivation', { halfLife: '8.7 h', at: '40 degC', z: '6 K' }]),
  edited(shortForm(), [
    'enzyme.inactivation',
    {
      series: [
        { kd: '0 1/h', at: '40 degC', Ea: '0 J/mol', residual: 0.5 },
        { D: '1 h', at: '40 degC', z: '6 K', residual: 0 },
      ],
    },
  ]),
  edited(shortForm(), ['ask', { find: 'trace', at: ['0 h', '90 min'] }]),
  edited(shortForm(), ['ask', { find: 'dose', conversion: 0.95, within: '10 h' }]),
  edited(shortForm(), [
    'ask',
    { find: 'temperature', best: 'time', conversion: 0.9, between: ['25 degC', '60 degC'] },
  ]),
]

test('the schema takes every form of a sound file', () => {
  for (const file of sound) {
    expect(readScenario(JSON.stringify(file)).ok).toBe(true)
    expect([fits(file), fits.errors]).toEqual([true, null])
  }
})

// What a schema cannot know: what parts of a file mean together, and what text becomes as a double.
const beyondSchema = [
  /needs it|leaves the range|needs the molar mass|needs the dose/,
  /in force|never brings|before any dose|before the first dose|kill step|no phase gives a dose|empty list/,
  /finite number|double|not answered together|one currency|currency code|lower to the higher|keep one of them|absolute zero/,
]

test('the schema refuses what is wrong in one place', () => {
  const taken = badInputs.filter(([, text, faults]) => {
    if (faults.some((fault) => fault.startsWith('(file): line'))) return false
    if (faults.every((fault) => beyondSchema.some((words) => words.test(fault)))) return false
    return text.startsWith('{') && fits(JSON.parse(text))
  })
  expect(taken.map(([name]) => name)).toEqual([])
})

const paths = (value: Json, path = ''): string[] => {
  if (typeof value !== 'object' || value === null) return [path]
  const below = Array.isArray(value)
    ? value.flatMap((entry, n) => paths(entry, `${path}[${n}]`))
    : Object.entries(value).flatMap(([key, entry]) => paths(entry, path === '' ? key : `${path}.${key}`))
  return path === '' ? below : [path, ...below]
}

test('whatever the reader takes, the schema takes', () => {
  const quantity = fc
    .tuple(
      fc.constantFrom('0', '-0', '0.0', '+3', '5e-3', '42', '1.5E+2', '-1', '0e4', '007'),
      fc.constantFrom('', ' ', '   '),
      fc.constantFrom(
        'kg',
        'g/L',
        'mmol/L',
        'degC',
        'K',
        'h',
        '1/h',
        'K/min',
        'L/h',
        'kg/h',
        'kJ/mol',
        'EUR/kg',
        'USD/h',
        'U/mL',
        'mg/mg/h',
      ),
    )
    .map((parts) => parts.join(''))
  const anything = fc.oneof(quantity, fc.constantFrom<Json>(null, 0, 0.5, 1, 14, -1, [], {}, true))
  const property = fc.property(
    fc.constantFrom(...sound.flatMap((file) => paths(file).map((path) => [file, path] as const))),
    fc.option(anything, { nil: undefined }),
    ([file, path], value) => {
      const text = JSON.stringify(edited(file, [path, value]))
      return !readScenario(text).ok || fits(JSON.parse(text))
    },
  )
  fc.assert(property, { numRuns: 1500 })
})

test('the schema describes itself to an editor', () => {
  const schema = scenarioSchema() as { properties: { feed: { properties: { volume: object } } } }
  expect(schema.properties.feed.properties.volume).toMatchObject({
    type: 'string',
    description: 'the volume charged',
    examples: ['12 m3'],
  })
  expect(scenarioSchema()).toMatchObject({
    $schema: 'https://json-schema.org/draft/2020-12/schema',
    title: 'Dosewright scenario, version 1',
  })
})
