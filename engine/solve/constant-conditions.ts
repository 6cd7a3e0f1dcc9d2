/** Time to a conversion at constant conditions, prepared once for any number of doses and temperatures. */
import { logStretch } from '../kinetics/decay.ts'
import type { EnzymeModel } from './enzyme-model.ts'
import type { ReactionPath } from './reaction-path.ts'

/**
 * Time in which an enzyme that decays at a constant rate supplies an enzyme-time.
 *
 * Units    undecayed: the time it would take without decay, s; kd 1/s; returns s, Infinity where the enzyme is
 *          spent before.
 * Source   −ln(1 − x)/kd with x = kd·undecayed, written so that kd → 0 is smooth.
 */
export function decayingTime(undecayed: number, kd: number): number {
  const x = kd * undecayed
  return x < 1 ? undecayed * logStretch(x) : Number.POSITIVE_INFINITY
}

/**
 * The time to one conversion as a function of dose and temperature.
 *
 * Shapes   for first-order inactivation or none.
 * Units    E0 kg of preparation per m³, T in K; returns s, Infinity where the target is never reached.
 */
export function timeAtConstantConditions(
  model: EnzymeModel,
  path: ReactionPath,
  conversion: number,
  pH: number | undefined,
): (E0: number, T: number) => number {
  const u = path.coordinate(conversion)
  const demand = u === null ? Number.POSITIVE_INFINITY : path.demand(u)
  const k = model.k(pH)
  const kd = model.inactivation?.k1(pH)
  if (!kd) return (E0, T) => demand / (k(T) * E0)
  return (E0, T) => decayingTime(demand / (k(T) * E0), kd(T))
}
