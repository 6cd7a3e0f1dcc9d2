/**
 * The way a batch of constant volume takes through its concentrations, along one coordinate u ≥ 0 that grows
 * with the enzyme-time: everything about the rate law that does not depend on when or how warm.
 */
import { type Charge, enzymeTime, equilibriumSubstrate } from '../kinetics/integrated-rate-law.ts'
import type { RateConstants } from '../kinetics/rate-law.ts'
import { increasingRoot, type ValueAndSlope } from '../numeric/roots.ts'
import { fractionPath } from './fraction-path.ts'

export interface ReactionPath {
  /** Enzyme-time from the start to u, kg/m³. */
  readonly demand: (u: number) => number
  /** Its slope. */
  readonly demandSlope: (u: number) => number
  /** Its slope where the substrate has come down to S kg/m³: the same without another exponential. */
  readonly demandSlopeAt: (S: number) => number
  /** Substrate at u, kg/m³. */
  readonly substrate: (u: number) => number
  /** Substrate consumed up to u, kg/m³, with full relative precision from u = 0 on. */
  readonly consumed: (u: number) => number
  /** u of a conversion; null where the equilibrium lies before it. */
  readonly coordinate: (conversion: number) => number | null
  /** The conversion that endless enzyme-time comes to. */
  readonly restingConversion: number
}

/** Two fractions of substrate that react at different rates; absent for a uniform one. */
export interface SlowFraction {
  readonly share: number
  readonly relativeRate: number
}

/** The path of a charge under a law. */
export function reactionPath(law: RateConstants, charge: Charge, slow?: SlowFraction): ReactionPath {
  return slow ? fractionPath(law, charge, slow) : uniformPath(law, charge)
}

function uniformPath(law: RateConstants, charge: Charge): ReactionPath {
  const { S0, P0, massYield } = charge
  const equilibrium = equilibriumSubstrate(charge, law.Keq)
  const span = S0 - equilibrium
  const reverse = law.Keq === undefined ? 1 : 1 + massYield / law.Keq
  const substrate = (u: number): number => equilibrium + span * Math.exp(-u)
  const consumed = (u: number): number => -span * Math.expm1(-u)
  // The resistance with its reciprocals taken beforehand: quadrature asks for it 16 times a panel.
  const { Km } = law
  const perKic = law.Kic === undefined ? 0 : 1 / law.Kic
  const perKiu = law.Kiu === undefined ? 0 : 1 / law.Kiu
  const perKsi = law.Ksi === undefined ? 0 : 1 / law.Ksi
  const perReverse = 1 / reverse
  const demandSlopeAt = (S: number): number => {
    const P = P0 + massYield * (S0 - S)
    return (Km * (1 + P * perKic) + S * (1 + P * perKiu + S * perKsi)) * perReverse
  }
  return {
    demand: (u) => enzymeTime(law, charge, u),
    demandSlope: (u) => demandSlopeAt(substrate(u)),
    demandSlopeAt,
    substrate,
    consumed,
    coordinate: (conversion) => {
      // Near 1 a single rounding of the share would be seen in the time.
      const share = equilibrium === 0 ? conversion : (conversion * S0) / span
      return share >= 0 && share < 1 ? -Math.log1p(-share) : null
    },
    restingConversion: span / S0,
  }
}

/** u after an enzyme-time, by Newton's method in ln S kept inside a bracket. */
export function coordinateAfter(path: ReactionPath, enzymeTimeSpent: number, from = 0): number {
  if (!(enzymeTimeSpent > 0)) return 0
  if (enzymeTimeSpent === Number.POSITIVE_INFINITY) return enzymeTimeSpent
  let high = Math.max(1, 2 * from)
  while (path.demand(high) < enzymeTimeSpent) {
    if (high > 1e300) return Number.POSITIVE_INFINITY
    high *= 2
  }
  const evaluate = (u: number, at: ValueAndSlope): void => {
    at.value = path.demand(u) - enzymeTimeSpent
    at.slope = path.demandSlope(u)
  }
  const first = enzymeTimeSpent / path.demandSlope(0)
  return increasingRoot(evaluate, 0, high, from > 0 ? from : Math.min(first, high))
}
