/**
 * The path of a substrate with a fast and a slow fraction that compete for the enzyme: v_fast = k·E·F/D,
 * v_slow = ρ·k·E·L/D with one denominator D over both, so that L = L0·(F/F0)^ρ and u = ln(F0/F).
 *
 * Source   competition of two substrates for one enzyme (Cornish-Bowden, Fundamentals of Enzyme Kinetics), equal
 *          Km; the enzyme-time is a sum of exponentials in u, integrated term by term.
 */
import { excess } from '../kinetics/decay.ts'
import type { Charge } from '../kinetics/integrated-rate-law.ts'
import { type RateConstants, resistance } from '../kinetics/rate-law.ts'
import { increasingRoot } from '../numeric/roots.ts'
import type { ReactionPath, SlowFraction } from './reaction-path.ts'

/** ∫_0^u e^(−a·u) du */
const decayed = (a: number, u: number): number => -Math.expm1(-a * u) / a

/** The path of a charge with a slow fraction. */
export function fractionPath(law: RateConstants, charge: Charge, slow: SlowFraction): ReactionPath {
  const { S0, P0, massYield } = charge
  const { Km, Kic, Kiu, Ksi } = law
  const slow0 = slow.share * S0
  const fast0 = S0 - slow0
  const { relativeRate } = slow
  const substrate = (u: number): number => fast0 * Math.exp(-u) + slow0 * Math.exp(-relativeRate * u)
  // The two shares may round to more than their whole.
  const consumed = (u: number): number =>
    Math.min(S0, -fast0 * Math.expm1(-u) - slow0 * Math.expm1(-relativeRate * u))
  const demandSlopeAt = (S: number): number => resistance(law, S, P0 + massYield * (S0 - S))
  const demandSlope = (u: number): number => demandSlopeAt(substrate(u))
  const demand = (u: number): number => {
    const first = fast0 * decayed(1, u) + slow0 * decayed(relativeRate, u)
    let sum = Km * u + first
    if (Kic !== undefined) {
      const consumedTime = fast0 * excess(u) + (slow0 * excess(relativeRate * u)) / relativeRate
      sum += (Km / Kic) * (P0 * u + massYield * consumedTime)
    }
    if (Kiu === undefined && Ksi === undefined) return sum
    const second =
      fast0 * fast0 * decayed(2, u) +
      2 * fast0 * slow0 * decayed(1 + relativeRate, u) +
      slow0 * slow0 * decayed(2 * relativeRate, u)
    if (Kiu !== undefined) sum += (P0 * first + massYield * (S0 * first - second)) / Kiu
    if (Ksi !== undefined) sum += second / Ksi
    return sum
  }
  const coordinate = (conversion: number): number | null => {
    const high = -Math.log1p(-conversion) / relativeRate
    // Early the consumed substrate has the digits, late what is left of it.
    const early = conversion < 0.5
    return increasingRoot(
      (u, at) => {
        at.value = early ? consumed(u) - S0 * conversion : S0 * (1 - conversion) - substrate(u)
        at.slope = fast0 * Math.exp(-u) + relativeRate * slow0 * Math.exp(-relativeRate * u)
      },
      0,
      high,
      -Math.log1p(-conversion),
    )
  }
  return { demand, demandSlope, demandSlopeAt, substrate, consumed, coordinate, restingConversion: 1 }
}
