import fc from 'fast-check'
import { expect, test } from 'vitest'
import {
  type DimensionName,
  dimensionNames,
  dimensions,
  fittingUnits,
  unitOf,
} from '../../../engine/units/dimensions.ts'
import { inUnit } from '../../../engine/units/display.ts'
import { parseOneOf, parseQuantity, type QuantityFailure } from '../../../engine/units/parse.ts'

const si = (text: string, dimension: DimensionName): number => {
  const read = parseQuantity(text, dimension)
  if (!read.ok) throw new Error(`${text}: ${JSON.stringify(read.failure)}`)
  return read.value
}

const failure = (text: string, dimension: DimensionName): QuantityFailure | undefined => {
  const read = parseQuantity(text, dimension)
  return read.ok ? undefined : read.failure
}

// Worked by hand from the definitions of the units.
test.each<[string, DimensionName, number]>([
  ['90 s', 'time', 90],
  ['90 min', 'time', 5400],
  ['1.5 h', 'time', 5400],
  ['0.5 d', 'time', 43200],
  ['42 degC', 'temperature', 315.15],
  ['-20 degC', 'temperature', 253.14999999999998],
  ['310 K', 'temperature', 310],
  ['6 degC', 'temperature difference', 6],
  ['3400 g', 'mass', 3.4],
  ['3.4 kg', 'mass', 3.4],
  ['2500 mg', 'mass', 0.0025],
  ['1.2 t', 'mass', 1200],
  ['250 umol', 'amount', 0.00025],
  ['250 mmol', 'amount', 0.25],
  ['12000 L', 'volume', 12],
  ['700 mL', 'volume', 0.0007],
  ['45 g/L', 'concentration', 45],
  ['45 kg/m3', 'concentration', 45],
  ['250 mg/L', 'concentration', 0.25],
  ['0.3 g/mL', 'concentration', 300],
  ['7 mg/mL', 'concentration', 7],
  ['130 mmol/L', 'molar concentration', 130],
  ['0.13 mol/L', 'molar concentration', 130],
  ['130 mM', 'molar concentration', 130],
  ['1.15 kg/L', 'density', 1150],
  ['1.15 g/mL', 'density', 1150],
  ['1150 kg/m3', 'density', 1150],
  ['342.3 g/mol', 'molar mass', 0.3423],
  ['0.3423 kg/mol', 'molar mass', 0.3423],
  ['45 kJ/mol', 'molar energy', 45000],
  ['10 kcal/mol', 'molar energy', 41840],
  ['45000 J/mol', 'molar energy', 45000],
  ['0.08 1/h', 'first-order rate', 0.08 / 3600],
  ['3 1/min', 'first-order rate', 0.05],
  ['0.5 1/s', 'first-order rate', 0.5],
  ['2 1/d', 'first-order rate', 2 / 86400],
  ['36 g/g/h', 'specific rate', 0.01],
  ['36 kg/kg/h', 'specific rate', 0.01],
  ['36 mg/mg/h', 'specific rate', 0.01],
  ['3 g/g/min', 'specific rate', 0.05],
  ['3 g/mg/min', 'specific rate', 50],
  ['7.2 mg/g/h', 'specific rate', 2e-6],
  ['600 U/g', 'activity per mass', 0.01],
  ['0.6 kU/g', 'activity per mass', 0.01],
  ['0.6 U/mg', 'activity per mass', 0.01],
  ['600000 U/kg', 'activity per mass', 0.01],
  ['600 umol/min/g', 'activity per mass', 0.01],
  ['0.01 kat/kg', 'activity per mass', 0.01],
  ['10000 nkat/g', 'activity per mass', 0.01],
  ['10 ukat/g', 'activity per mass', 0.01],
  ['5 U/mL', 'activity per volume', 5 / 60],
  ['6 kU/mL', 'activity per volume', 100],
  ['6000 U/L', 'activity per volume', 0.1],
  ['500 L/h', 'flow', 0.5 / 3600],
  ['7.2 m3/h', 'flow', 0.002],
  ['60 mL/min', 'flow', 1e-6],
  ['720 kg/h', 'mass flow', 0.2],
  ['0.6 K/min', 'ramp', 0.01],
  ['0.6 degC/min', 'ramp', 0.01],
  ['36 K/h', 'ramp', 0.01],
  ['36 degC/h', 'ramp', 0.01],
  ['30 kW', 'power', 30000],
  ['2 kWh', 'energy', 7.2e6],
  ['3 MJ', 'energy', 3e6],
  ['76 umol/min', 'amount rate', 76e-6 / 60],
  ['1.2 g/L/min', 'concentration rate', 0.02],
  ['1.2 mmol/L/min', 'molar concentration rate', 0.02],
])('%s as %s is %d', (text, dimension, expected) => {
  const value = si(text, dimension)
  expect(Math.abs(value - expected)).toBeLessThanOrEqual(Number.EPSILON * Math.abs(expected))
})

test('1 U is 16.67 nkat', () => {
  // Source: 1 U = 1 umol/min = 1e-6/60 mol/s.
  expect(si('1 U', 'amount rate')).toBeCloseTo(1.6666666666666667e-8, 22)
  expect(si('250 U', 'amount rate') * 1e9).toBeCloseTo(4166.666666666667, 9)
})

test('a number may be written as in JSON, with a plus, and with or without spaces', () => {
  for (const text of ['3.5 kg', '+3.5 kg', '3.5kg', '3.5   kg', '35e-1 kg', '0.35E+1 kg', '3.50 kg']) {
    expect(si(text, 'mass')).toBe(3.5)
  }
  expect(Object.is(si('-0 g/L', 'concentration'), 0)).toBe(true)
})

test.each<[string, DimensionName, QuantityFailure]>([
  ['', 'mass', { kind: 'not-a-quantity' }],
  ['kg', 'mass', { kind: 'not-a-quantity' }],
  [' 3 kg', 'mass', { kind: 'not-a-quantity' }],
  ['3,5 kg', 'mass', { kind: 'decimal-comma', written: '3.5 kg' }],
  ['3', 'mass', { kind: 'no-unit', number: '3' }],
  ['3 ', 'mass', { kind: 'no-unit', number: '3' }],
  ['.5 kg', 'mass', { kind: 'number-form', number: '.5' }],
  ['5. kg', 'mass', { kind: 'number-form', number: '5.' }],
  ['007 kg', 'mass', { kind: 'number-form', number: '007' }],
  ["1'200 kg", 'mass', { kind: 'number-form', number: "1'200" }],
  ['1 200 kg', 'mass', { kind: 'number-form', number: '1 200' }],
  ['NaN kg', 'mass', { kind: 'not-finite' }],
  ['-Infinity kg', 'mass', { kind: 'not-finite' }],
  ['1e999 kg', 'mass', { kind: 'not-finite' }],
  ['1e306 t', 'mass', { kind: 'not-finite' }],
  ['1e-999 kg', 'mass', { kind: 'too-small' }],
  ['5e-324 g', 'mass', { kind: 'too-small' }],
  ['3 L', 'mass', { kind: 'wrong-dimension', unit: 'L', of: 'volume' }],
  ['3 kgs', 'mass', { kind: 'unknown-unit', unit: 'kgs', near: 'kg' }],
  ['3 KG', 'mass', { kind: 'unknown-unit', unit: 'KG', near: 'kg' }],
  ['3 1/hr', 'first-order rate', { kind: 'unknown-unit', unit: '1/hr', near: '1/h' }],
  ['3 h-1', 'first-order rate', { kind: 'unknown-unit', unit: 'h-1', near: '1/h' }],
  ['3 °C/min', 'ramp', { kind: 'unknown-unit', unit: '°C/min', near: 'degC/min' }],
  ['3 µmol/L', 'molar concentration', { kind: 'unknown-unit', unit: 'µmol/L', near: 'umol/L' }],
  ['3 barrels', 'volume', { kind: 'unknown-unit', unit: 'barrels' }],
])('%j as %s is refused', (text, dimension, expected) => {
  expect(failure(text, dimension)).toEqual(expected)
})

test('a quantity of either of two dimensions says which it is', () => {
  const due = ['concentration', 'molar concentration'] as const
  expect(parseOneOf('45 g/L', due)).toEqual({ ok: true, value: { dimension: 'concentration', value: 45 } })
  expect(parseOneOf('45 mmol/L', due)).toMatchObject({
    value: { dimension: 'molar concentration', value: 45 },
  })
})

test('every unit leads into SI and back', () => {
  for (const name of dimensionNames) {
    for (const { symbol } of dimensions[name].units) {
      const property = fc.property(fc.double({ min: 1e-3, max: 1e6, noNaN: true }), (value) => {
        const back = inUnit(si(`${value} ${symbol}`, name) as never, name, symbol) ?? Number.NaN
        // Four roundings at most; a temperature is as coarse as its kelvins.
        const slack = name === 'temperature' ? 3e-10 : 4 * Number.EPSILON * value
        return Math.abs(back - value) <= slack
      })
      fc.assert(property, { numRuns: 20 })
    }
  }
})

test('factors are whole numbers held exactly, so that decimal inputs round once', () => {
  const oddPart = (n: number): number => (n % 2 === 0 ? oddPart(n / 2) : n)
  for (const name of dimensionNames) {
    for (const { times, over } of dimensions[name].units) {
      expect(Number.isSafeInteger(oddPart(times)) && Number.isSafeInteger(oddPart(over))).toBe(true)
    }
  }
})

test('symbols are unique within a dimension, and those shown in messages exist', () => {
  for (const name of dimensionNames) {
    const symbols = dimensions[name].units.map((u) => u.symbol)
    expect(new Set(symbols).size).toBe(symbols.length)
    for (const symbol of fittingUnits(name)) expect(unitOf(name, symbol)).toBeDefined()
    expect(parseQuantity(dimensions[name].example, name).ok).toBe(true)
  }
})

test('anything at all gives an outcome', () => {
  const property = fc.property(
    fc.string({ unit: 'binary' }),
    fc.constantFrom(...dimensionNames),
    (text, name) => {
      expect(typeof parseQuantity(text, name).ok).toBe('boolean')
    },
  )
  fc.assert(property, { numRuns: 2000 })
})
