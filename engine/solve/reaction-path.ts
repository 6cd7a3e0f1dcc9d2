/**
 * The way a batch of constant volume takes through its concentrations, along one coordinate u ≥ 0 that grows
 * with the enzyme-time: everything about the rate law that does not depend on when or how warm.
 */
import { type Charge, enzymeTime, equilibriumSubstrate } from '../kinetics/integrated-rate-law.ts'
import { type RateConstants, resistance } from '../kinetics/rate-law.ts'
import { increasingRoot, type ValueAndSlope } from '../numeric/roots.ts'
import { fractionPath } from './fraction-path.ts'

export interface ReactionPath {
  /** Enzyme-time from the start to u, kg/m³. */
  readonly demand: (u: number) => number
  /** Its slope. */
  readonly demandSlope: (u: number) => number
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
  return {
    demand: (u) => enzymeTime(law, charge, u),
    demandSlope: (u) => resistance(law, substrate(u), P0 + massYield * consumed(u)) / reverse,
    substrate,
    consumed,
    coordinate: (conversion) => {
      const share = (conversion * S0) / span
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
