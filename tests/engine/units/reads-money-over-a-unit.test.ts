import { expect, test } from 'vitest'
import { currencyCodes } from '../../../engine/units/currencies.ts'
import { type MoneyFailure, type MoneyPer, parseMoney } from '../../../engine/units/money.ts'

test.each<[string, MoneyPer, number, string]>([
  ['14.5 EUR/kg', 'mass', 14.5, 'EUR'],
  ['0.03 EUR/g', 'mass', 30, 'EUR'],
  ['14500 EUR/t', 'mass', 14.5, 'EUR'],
  ['90 USD/h', 'time', 0.025, 'USD'],
  ['1.5 USD/min', 'time', 0.025, 'USD'],
  ['412 GBP/batch', 'batch', 412, 'GBP'],
  ['0.18 EUR/kWh', 'energy', 5e-8, 'EUR'],
  ['2.5 CHF/m3', 'volume', 2.5, 'CHF'],
  ['0 JPY/kg', 'mass', 0, 'JPY'],
])('%s per %s', (text, per, value, currency) => {
  const read = parseMoney(text, per)
  expect(read).toMatchObject({ ok: true, value: { currency } })
  if (read.ok) expect(read.value.value).toBeCloseTo(value, 14)
})

test.each<[string, MoneyPer, MoneyFailure]>([
  ['30 eur/kg', 'mass', { kind: 'unknown-currency', currency: 'eur', near: 'EUR' }],
  ['30 EUR', 'mass', { kind: 'no-per', unit: 'EUR' }],
  ['30 EUR/h', 'mass', { kind: 'wrong-per', unit: 'EUR/h' }],
  ['30,5 EUR/kg', 'mass', { kind: 'decimal-comma', written: '30.5 EUR/kg' }],
  ['1e999 EUR/kg', 'mass', { kind: 'not-finite' }],
  ['1e308 EUR/mg', 'mass', { kind: 'not-finite' }],
  ['EUR 30', 'mass', { kind: 'not-a-quantity' }],
])('%j per %s is refused', (text, per, failure) => {
  expect(parseMoney(text, per)).toEqual({ ok: false, failure })
})

test('currency codes are three capital letters', () => {
  for (const code of currencyCodes) expect(code).toMatch(/^[A-Z]{3}$/)
  expect(currencyCodes.size).toBeGreaterThan(160)
})
