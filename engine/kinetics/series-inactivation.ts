/**
 * Inactivation in two steps, native → intermediate → final form, each with an activity of its own.
 *
 * Source   Henley & Sadana 1985 (series-type mechanism); written with divided differences so that k1 = k2,
 *          k2 = 0 and very short times keep their digits.
 */
import { decayMean, seriesMean } from './decay.ts'

/** Amounts of the three forms, in one unit. */
export interface EnzymeForms {
  readonly native: number
  readonly intermediate: number
  readonly final: number
}

/**
 * Forms after a time at constant k1, k2.
 *
 * Units    k1, k2 in 1/t; amounts in any one unit, conserved.
 */
export function formsAfter(from: EnzymeForms, k1: number, k2: number, t: number): EnzymeForms {
  const a = k1 * t
  const b = k2 * t
  const native = from.native * Math.exp(-a)
  const passing = a * Math.exp(-Math.min(a, b)) * decayMean(Math.abs(b - a))
  const intermediate = from.intermediate * Math.exp(-b) + from.native * passing
  const final = from.final - from.intermediate * Math.expm1(-b) + from.native * a * b * seriesMean(a, b)
  return { native, intermediate, final }
}

/**
 * Time integrals of the three forms from 0 to t.
 *
 * Units    amount × t.
 */
export function formIntegrals(from: EnzymeForms, k1: number, k2: number, t: number): EnzymeForms {
  const a = k1 * t
  const b = k2 * t
  const native = from.native * t * decayMean(a)
  const intermediate = from.intermediate * t * decayMean(b) + from.native * a * t * seriesMean(a, b)
  const total = (from.native + from.intermediate + from.final) * t
  return { native, intermediate, final: Math.max(0, total - native - intermediate) }
}
