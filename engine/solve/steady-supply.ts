/** Enzyme-time supplied, and enzyme left, at a steady temperature: closed forms. */
import { decayMean } from '../kinetics/decay.ts'
import { type EnzymeForms, formIntegrals, formsAfter } from '../kinetics/series-inactivation.ts'
import { increasingRoot } from '../numeric/roots.ts'
import { decayingTime } from './constant-conditions.ts'

/** Rate constants of a steady run, 1/s; k2 of the second step of a series. */
export interface SteadyConstants {
  readonly k: number
  readonly k1: number
  readonly k2: number | undefined
  readonly residual: { readonly first: number; readonly second: number }
}

/** What acts of three forms. */
export const activeOf = (
  { first, second }: SteadyConstants['residual'],
  { native, intermediate, final }: EnzymeForms,
): number => native + first * intermediate + second * final

/** Enzyme-time after τ, kg/m³; τ may be Infinity. */
export function steadySupply(constants: SteadyConstants, from: EnzymeForms, τ: number): number {
  const { k, k1, k2, residual } = constants
  if (τ === Number.POSITIVE_INFINITY) return endlessSupply(constants, from)
  if (k2 === undefined) return k * from.native * τ * decayMean(k1 * τ)
  return k * activeOf(residual, formIntegrals(from, k1, k2, τ))
}

function endlessSupply({ k, k1, k2, residual }: SteadyConstants, from: EnzymeForms): number {
  const { native, intermediate, final } = from
  if (k2 === undefined) return k1 > 0 ? (k * native) / k1 : unlessNone(k * native)
  const lasting =
    k1 === 0
      ? activeOf(residual, from)
      : k2 === 0
        ? residual.first * (native + intermediate) + residual.second * final
        : residual.second * (native + intermediate + final)
  if (k * lasting > 0) return Number.POSITIVE_INFINITY
  const first = native > 0 ? (k * native) / k1 : 0
  return first + (residual.first > 0 ? (residual.first * k * (native + intermediate)) / k2 : 0)
}

/** Endless supply of an enzyme that does not decay: without bound if there is any. */
const unlessNone = (rate: number): number => (rate > 0 ? Number.POSITIVE_INFINITY : 0)

/** Forms left after τ; τ may be Infinity. */
export function steadyForms({ k1, k2 }: SteadyConstants, from: EnzymeForms, τ: number): EnzymeForms {
  if (k2 !== undefined) return formsAfter(from, k1, k2, Math.min(τ, Number.MAX_VALUE))
  if (k1 === 0) return from
  return { native: from.native * Math.exp(-k1 * τ), intermediate: 0, final: 0 }
}

/** Time in which an amount of enzyme-time is supplied, s; null where it never is. */
export function steadyTimeFor(constants: SteadyConstants, from: EnzymeForms, amount: number): number | null {
  const { k, k1, k2, residual } = constants
  if (k2 === undefined) {
    const time = decayingTime(amount / (k * from.native), k1)
    return Number.isFinite(time) ? time : null
  }
  if (!(endlessSupply(constants, from) > amount)) return null
  let high = amount / (k * activeOf(residual, from)) || 1
  while (steadySupply(constants, from, high) < amount) {
    if (high > 1e300) return null
    high *= 2
  }
  return increasingRoot(
    (τ, at) => {
      at.value = steadySupply(constants, from, τ) - amount
      at.slope = k * activeOf(residual, formsAfter(from, k1, k2, τ))
    },
    0,
    high,
    0.5 * high,
  )
}
