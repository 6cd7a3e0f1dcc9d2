/**
 * Money over a unit: "30 EUR/kg", "85 EUR/h", "412 GBP/batch".
 *
 * Shapes   text and what the money is per; the value per SI unit (or per batch) and the currency.
 * Fails    as quantities do, and unknown-currency.
 * Source   ISO 4217 alphabetic codes.
 */
import { failed, type Outcome, success } from '../outcome.ts'
import { currencyCodes } from './currencies.ts'
import { dimensions, unitOf } from './dimensions.ts'
import { fromSi, type UnitOfMeasure, unit } from './measure.ts'
import { nearest } from './nearest.ts'
import { type QuantityFailure, readNumber } from './parse.ts'

export type MoneyPer = 'mass' | 'time' | 'volume' | 'amount' | 'energy' | 'batch'

export interface Money {
  /** Per SI unit of what it is per. */
  readonly value: number
  readonly currency: string
}

export type MoneyFailure =
  | QuantityFailure
  | { readonly kind: 'no-per'; readonly unit: string }
  | { readonly kind: 'unknown-currency'; readonly currency: string; readonly near?: string }
  | { readonly kind: 'wrong-per'; readonly unit: string }

/** Reads money per mass, time, volume, amount, energy or batch. */
export const parseMoney = (text: string, per: MoneyPer): Outcome<Money, MoneyFailure> => {
  const read = readNumber(text)
  if (!read.ok) return read
  const [currency = '', ...rest] = read.value.unit.split('/')
  if (!currencyCodes.has(currency)) {
    const near = nearest(currency, [...currencyCodes])
    return failed({ kind: 'unknown-currency', currency, ...(near === undefined ? {} : { near }) })
  }
  if (rest.length === 0) return failed({ kind: 'no-per', unit: read.value.unit })
  const below = perUnit(per, rest.join('/'))
  if (below === undefined) return failed({ kind: 'wrong-per', unit: read.value.unit })
  const value = fromSi(read.value.value, below) + 0
  if (!Number.isFinite(value)) return failed({ kind: 'not-finite' })
  if (value === 0 && read.value.value !== 0) return failed({ kind: 'too-small' })
  return success({ value, currency })
}

/** Units that fit below a currency, for messages. */
export const fittingPer = (per: MoneyPer): readonly string[] =>
  per === 'batch' ? ['batch'] : dimensions[per].usual

/** All symbols that may stand below a currency. */
export const perSymbols = (per: MoneyPer): readonly string[] =>
  per === 'batch' ? ['batch'] : dimensions[per].units.map((u) => u.symbol)

const batch = unit('batch')

const perUnit = (per: MoneyPer, symbol: string): UnitOfMeasure | undefined =>
  per === 'batch' ? (symbol === 'batch' ? batch : undefined) : unitOf(per, symbol)
