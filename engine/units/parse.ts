/**
 * Reads "<number> <unit>" into SI.
 *
 * Shapes   text and the dimension due; a branded number, or a failure with what a sentence needs.
 * Units    any of the dimension's in the table; the value is in coherent SI.
 * Fails    not-a-quantity, number-form, decimal-comma, no-unit, unknown-unit, wrong-dimension, not-finite,
 *          too-small (a number that a double can only hold as 0).
 * Grammar  the number as in JSON, with a leading + allowed; then any number of spaces; then the unit.
 */
import { failed, type Outcome, success } from '../outcome.ts'
import { type DimensionName, dimensionNames, dimensions, unitOf } from './dimensions.ts'
import { toSi, type UnitOfMeasure } from './measure.ts'
import { nearest } from './nearest.ts'
import { type Quantity, quantity } from './quantity.ts'

export type QuantityFailure =
  | { readonly kind: 'not-a-quantity' }
  | { readonly kind: 'number-form'; readonly number: string }
  | { readonly kind: 'decimal-comma'; readonly written: string }
  | { readonly kind: 'no-unit'; readonly number: string }
  | { readonly kind: 'unknown-unit'; readonly unit: string; readonly near?: string }
  | { readonly kind: 'wrong-dimension'; readonly unit: string; readonly of: DimensionName }
  | { readonly kind: 'not-finite' }
  | { readonly kind: 'too-small' }

/** A value with the unit it was given in. */
export interface ReadNumber {
  readonly value: number
  readonly unit: string
}

const pattern = /^([+-]?(?:0|[1-9][0-9]*)(?:\.[0-9]+)?(?:[eE][+-]?[0-9]+)?) *(.*)$/s
const commaPattern = /^[+-]?[0-9]+(?:\.[0-9]{3})*,[0-9]/
const wordPattern = /^[+-]?(?:nan|inf(?:inity)?)(?![a-z])/i
const loosePattern = /^[+-]?[0-9.][0-9._' ]*(?:[eE][+-]?[0-9]*)?/

/** Splits a text into its number and its unit, neither yet looked up. */
export const readNumber = (text: string): Outcome<ReadNumber, QuantityFailure> => {
  const parts = pattern.exec(text)
  if (parts === null) return failed(strangeNumber(text))
  const [, digits = '', symbol = ''] = parts
  if (/^[.0-9_',]/.test(symbol) && !symbol.startsWith('1/')) return failed(strangeNumber(text))
  const value = Number(digits)
  if (!Number.isFinite(value)) return failed({ kind: 'not-finite' })
  if (value === 0 && /[1-9]/.test(digits.split(/[eE]/)[0] ?? '')) return failed({ kind: 'too-small' })
  if (symbol === '') return failed({ kind: 'no-unit', number: digits })
  return success({ value, unit: symbol })
}

/** Reads a quantity of one dimension. */
export const parseQuantity = <D extends DimensionName>(
  text: string,
  dimension: D,
): Outcome<Quantity<D>, QuantityFailure> => {
  const read = parseOneOf(text, [dimension])
  return read.ok ? success(quantity<Quantity<D>>(read.value.value)) : read
}

/** Reads a quantity of any of several dimensions, and says which it was. */
export const parseOneOf = <D extends DimensionName>(
  text: string,
  due: readonly D[],
): Outcome<{ readonly dimension: D; readonly value: number }, QuantityFailure> => {
  const read = readNumber(text)
  if (!read.ok) return read
  for (const dimension of due) {
    const found = unitOf(dimension, read.value.unit)
    if (found === undefined) continue
    const si = convert(read.value.value, found)
    return si.ok ? success({ dimension, value: si.value }) : si
  }
  return failed(strangeUnit(read.value.unit, due))
}

/** Into SI, refusing what leaves the range of doubles on the way. */
export const convert = (value: number, u: UnitOfMeasure): Outcome<number, QuantityFailure> => {
  const si = toSi(value, u)
  if (!Number.isFinite(si)) return failed({ kind: 'not-finite' })
  if (si === 0 && value !== 0 && u.offset === 0) return failed({ kind: 'too-small' })
  return success(si + 0)
}

/** Which failure a unit outside the dimensions due is. */
export const strangeUnit = (symbol: string, due: readonly DimensionName[]): QuantityFailure => {
  const of = dimensionNames.find((name) => unitOf(name, symbol) !== undefined)
  if (of !== undefined) return { kind: 'wrong-dimension', unit: symbol, of }
  const plain = symbol
    .trim()
    .split('/')
    .map((word) => otherSpellings[word] ?? word)
    .join('/')
  const spelled = due.find((name) => unitOf(name, plain) !== undefined)
  const symbols = due.flatMap((name) => [
    ...dimensions[name].usual,
    ...dimensions[name].units.map((u) => u.symbol),
  ])
  const near = spelled !== undefined ? plain : nearest(symbol, symbols)
  return near === undefined
    ? { kind: 'unknown-unit', unit: symbol }
    : { kind: 'unknown-unit', unit: symbol, near }
}

const strangeNumber = (text: string): QuantityFailure => {
  if (commaPattern.test(text)) return { kind: 'decimal-comma', written: text.replace(',', '.') }
  if (wordPattern.test(text)) return { kind: 'not-finite' }
  const number = loosePattern.exec(text)?.[0].trim() ?? ''
  return /[0-9]/.test(number) ? { kind: 'number-form', number } : { kind: 'not-a-quantity' }
}

/** Spellings people use for units that have another symbol here. */
const otherSpellings: Readonly<Record<string, string>> = {
  '°C': 'degC',
  C: 'degC',
  '℃': 'degC',
  degc: 'degC',
  celsius: 'degC',
  Celsius: 'degC',
  kelvin: 'K',
  sec: 's',
  second: 's',
  seconds: 's',
  minute: 'min',
  minutes: 'min',
  mins: 'min',
  m: 'min',
  hr: 'h',
  hrs: 'h',
  hour: 'h',
  hours: 'h',
  H: 'h',
  day: 'd',
  days: 'd',
  l: 'L',
  litre: 'L',
  litres: 'L',
  liter: 'L',
  ml: 'mL',
  'm³': 'm3',
  'm^3': 'm3',
  dm3: 'L',
  µmol: 'umol',
  μmol: 'umol',
  µkat: 'ukat',
  μkat: 'ukat',
  µg: 'ug',
  μg: 'ug',
  kgs: 'kg',
  Kg: 'kg',
  KG: 'kg',
  gram: 'g',
  grams: 'g',
  tonne: 't',
  tonnes: 't',
  kJoule: 'kJ',
  IU: 'U',
  'h-1': '1/h',
  's-1': '1/s',
  'min-1': '1/min',
  'd-1': '1/d',
  'h^-1': '1/h',
  'min^-1': '1/min',
  's^-1': '1/s',
}
