/**
 * The path of a substrate with a fast and a slow fraction that compete for the enzyme: v_fast = k·E·F/D,
 * v_slow = ρ·k·E·L/D with one denominator D over both, so that L = L0·(F/F0)^ρ and u = ln(F0/F).
 *
 * Source   competition of two substrates for one enzyme (Cornish-Bowden, Fundamentals of Enzyme Kinetics), equal
 *          Km; no closed form of the enzyme-time: Gauss–Legendre in u.
 */
import type { Charge } from '../kinetics/integrated-rate-law.ts'
import { type RateConstants, resistance } from '../kinetics/rate-law.ts'
import { gauss16, integral } from '../numeric/gauss-legendre.ts'
import { increasingRoot } from '../numeric/roots.ts'
import type { ReactionPath, SlowFraction } from './reaction-path.ts'

/** Panels this wide in the fast exponential keep 16 nodes at round-off. */
const panel = 4

/** The path of a charge with a slow fraction. */
export function fractionPath(law: RateConstants, charge: Charge, slow: SlowFraction): ReactionPath {
  const { S0, P0, massYield } = charge
  const slow0 = slow.share * S0
  const fast0 = S0 - slow0
  const { relativeRate } = slow
  const substrate = (u: number): number => fast0 * Math.exp(-u) + slow0 * Math.exp(-relativeRate * u)
  const consumed = (u: number): number => -fast0 * Math.expm1(-u) - slow0 * Math.expm1(-relativeRate * u)
  const demandSlope = (u: number): number => resistance(law, substrate(u), P0 + massYield * consumed(u))
  const demand = (u: number): number => {
    let sum = 0
    let low = 0
    while (low < u) {
      const width = low < 10 * panel ? panel : panel / relativeRate
      const high = Math.min(u, low + width)
      sum += integral(demandSlope, low, high, gauss16)
      // Past forty time constants of the slow fraction nothing but Km and the product is left.
      if (relativeRate * high > 40 && high > 40) return sum + (u - high) * demandSlope(high)
      low = high
    }
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
  return { demand, demandSlope, substrate, consumed, coordinate, restingConversion: 1 }
}
