/** Numbers and quantities as a reader sees them. */
import { type DimensionName, unitOf } from './dimensions.ts'
import { fromSi } from './measure.ts'
import type { Quantity } from './quantity.ts'

/**
 * The number to write before a unit for a value in SI; undefined for a unit the dimension does not have.
 *
 * Units    SI in, the unit named out.
 */
export const inUnit = <D extends DimensionName>(
  value: Quantity<D>,
  dimension: D,
  symbol: string,
): number | undefined => {
  const found = unitOf(dimension, symbol)
  return found === undefined ? undefined : fromSi(value, found)
}

/**
 * A number with so many significant digits: no grouping, no exponent from 0.001 up to a million, no zeros at
 * the end, and digits before the point never rounded away below a million.
 */
export const formatNumber = (value: number, significant = 3): string => {
  if (value === 0 || !Number.isFinite(value)) return String(value + 0)
  const size = Math.abs(value)
  if (size >= 1e6 || size < 1e-3) return trimmed(value.toExponential(significant - 1))
  const whole = Math.floor(Math.log10(size)) + 1
  return trimmed(value.toFixed(Math.min(100, Math.max(0, significant - whole))))
}

/**
 * The same, rounded away from zero: for a dose or a hold that must be enough. What lies within a millionth of
 * the shorter number counts as that number.
 */
export const formatNumberUp = (value: number, significant = 3): string => {
  const near = formatNumber(value, significant)
  const size = Math.abs(value)
  if (Math.abs(Number(near)) >= size * (1 - 1e-6) || size >= 1e6 || size < 1e-3) return near
  const decimals = Math.max(0, significant - Math.floor(Math.log10(size)) - 1)
  return trimmed((Number(near) + Math.sign(value) * 10 ** -decimals).toFixed(decimals))
}

/** A quantity for reading: "9.41 h". An unknown unit shows the value in SI without one. */
export const formatQuantity = <D extends DimensionName>(
  value: Quantity<D>,
  dimension: D,
  symbol: string,
  significant = 3,
): string => {
  const number = inUnit(value, dimension, symbol)
  return number === undefined
    ? formatNumber(value, significant)
    : `${formatNumber(number, significant)} ${symbol}`
}

const trimmed = (text: string): string => {
  const [digits = '', exponent] = text.split('e')
  const short = digits.includes('.') ? digits.replace(/\.?0+$/, '') : digits
  return exponent === undefined ? short : `${short}e${exponent.replace('+', '')}`
}
