/**
 * The balances of a batch as rates of logarithms: ln of the substrate's mass (one or two fractions) and ln of the
 * enzyme's. Nothing can turn negative, the end of a batch with Km far below S stays smooth, and an absolute error
 * is a relative one of the amount. Product follows from the mass balance, volume and temperature from the clock.
 *
 * Shapes   y = [ln substrate] or [ln fast, ln slow], then [ln enzyme] or, for a series, [ln(native +
 *          intermediate), ln(native share of these)].
 * Source   balances of a well-mixed batch; kg and s.
 */
import type { RateInto } from '../integrate/problem.ts'
import type { RateConstants } from '../kinetics/rate-law.ts'
import { protectedShare } from '../kinetics/substrate-protection.ts'
import type { EnzymeModel } from './enzyme-model.ts'
import type { SlowFraction } from './reaction-path.ts'
import type { Batch } from './route.ts'
import { temperatureAt } from './temperature-course.ts'
import type { Run } from './timeline.ts'

/** What stands outside the state vector while a run is passed. */
export interface Surroundings {
  readonly volume: number
  /** kg of product if all substrate present at the run's start were converted */
  readonly productPool: number
  /** kg of enzyme in all its forms at the run's start */
  readonly totalEnzyme: number
  /** kg of substrate fed in before */
  readonly fed: number
}

/** Size of the state that a batch is integrated with. */
export const stateSize = ({ feed, model }: Batch): number =>
  (feed.substrate.slow ? 2 : 1) + (model.inactivation?.k2 ? 2 : 1)

/** The same levels with so much substrate added, kg, of which a share is slow. */
export function levelsAfterFeeding(levels: Float64Array, fed: number, slowShare: number): Float64Array {
  const y = levels.slice()
  if (fed === 0) return y
  y[0] = Math.log(Math.exp(levels[0] as number) + fed * (1 - slowShare))
  if (slowShare > 0) y[1] = Math.log(Math.exp(levels[1] as number) + fed * slowShare)
  return y
}

/** The rates of one run; time counts from the run's start. */
export function logRates(
  model: EnzymeModel,
  slow: SlowFraction | undefined,
  run: Run,
  at: Surroundings,
): RateInto {
  const { inactivation } = model
  if (
    run.course.kind === 'steady' &&
    !run.feed &&
    !slow &&
    !inactivation?.k2 &&
    inactivation?.Kp === undefined
  )
    return steadyRates(model, run, at)
  return generalRates(model, slow, run, at)
}

/** The commonest case with everything constant lifted out: steady temperature, no feed, one loss at most. */
function steadyRates(model: EnzymeModel, run: Run, { volume, productPool }: Surroundings): RateInto {
  const { Km, Kic, Kiu, Ksi, Keq } = model.law(run.pH)
  const T = run.course.from
  const y = model.massYield
  // The denominator times V²/V as a polynomial in the substrate's mass, the product written by balance.
  const pool = productPool / volume
  const a = Km * (Kic === undefined ? 1 : 1 + pool / Kic) * volume
  const b = 1 + (Kiu === undefined ? 0 : pool / Kiu) - (Kic === undefined ? 0 : (y * Km) / Kic)
  const c = ((Ksi === undefined ? 0 : 1 / Ksi) - (Kiu === undefined ? 0 : y / Kiu)) / volume
  const k = model.k(run.pH)(T)
  const kd = model.inactivation ? model.inactivation.k1(run.pH)(T) : 0
  if (Keq === undefined)
    return (out, state) => {
      const m = Math.exp(state[0] as number)
      out[0] = (-k * Math.exp(state[1] as number)) / (a + m * (b + c * m))
      out[1] = -kd
    }
  const reverse = 1 + y / Keq
  return (out, state) => {
    const m = Math.exp(state[0] as number)
    const drive = (k * Math.exp(state[1] as number)) / (a + m * (b + c * m))
    out[0] = drive * (productPool / (Keq * m) - reverse)
    out[1] = -kd
  }
}

function generalRates(
  model: EnzymeModel,
  slow: SlowFraction | undefined,
  run: Run,
  at: Surroundings,
): RateInto {
  const { massYield, inactivation } = model
  const law: RateConstants = model.law(run.pH)
  const { Km } = law
  const inverseKic = law.Kic === undefined ? 0 : 1 / law.Kic
  const inverseKiu = law.Kiu === undefined ? 0 : 1 / law.Kiu
  const inverseKsi = law.Ksi === undefined ? 0 : 1 / law.Ksi
  const inverseKeq = law.Keq === undefined ? 0 : 1 / law.Keq
  const { course, feed } = run
  const steady = course.kind === 'steady'
  const kOf = model.k(run.pH)
  const k1Of = inactivation?.k1(run.pH)
  const k2Of = inactivation?.k2?.(run.pH)
  const kSteady = kOf(course.from)
  const k1Steady = k1Of ? k1Of(course.from) : 0
  const k2Steady = k2Of ? k2Of(course.from) : 0
  const Kp = inactivation?.Kp
  const residual = inactivation?.residual ?? { first: 0, second: 0 }
  const enzymeAt = slow ? 2 : 1
  return (out, state, t) => {
    const T = steady ? course.from : temperatureAt(course, t)
    const k = steady ? kSteady : kOf(T)
    const fed = feed ? t * (feed.flow + 0.5 * feed.flowSlope * t) : 0
    const flow = feed ? feed.flow + feed.flowSlope * t : 0
    const volume = at.volume + fed
    const fast = Math.exp(state[0] as number)
    const late = slow ? Math.exp(state[1] as number) : 0
    const S = (fast + late) / volume
    const pool = feed ? at.productPool + fed * (feed.product + massYield * feed.substrate) : at.productPool
    const P = pool / volume - massYield * S
    const D = Km * (1 + P * inverseKic) + S * (1 + P * inverseKiu) + S * S * inverseKsi
    const living = Math.exp(state[enzymeAt] as number)
    let active = living
    let k1 = steady ? k1Steady : k1Of ? k1Of(T) : 0
    if (Kp !== undefined) k1 *= protectedShare(Kp, S)
    if (k2Of) {
      let k2 = steady ? k2Steady : k2Of(T)
      if (Kp !== undefined) k2 *= protectedShare(Kp, S)
      const native = Math.exp(state[enzymeAt + 1] as number)
      active =
        living * (native + residual.first * (1 - native)) +
        residual.second * (at.totalEnzyme + fed * (feed?.enzyme ?? 0) - living)
      out[enzymeAt] = -k2 * (1 - native)
      out[enzymeAt + 1] = -k1 + k2 * (1 - native)
      if (feed && feed.enzyme > 0) {
        const inflow = (flow * feed.enzyme) / living
        out[enzymeAt] = (out[enzymeAt] as number) + inflow
        out[enzymeAt + 1] = (out[enzymeAt + 1] as number) + inflow * (1 / native - 1)
      }
    } else {
      out[enzymeAt] = feed && feed.enzyme > 0 ? (flow * feed.enzyme) / living - k1 : -k1
    }
    const drive = (k * active) / (volume * D)
    const share = slow ? slow.share : 0
    const inflow = feed ? flow * feed.substrate : 0
    // Spent substrate underflows to 0 while its logarithm falls on: without an inflow 0/0 must not arise.
    out[0] =
      -drive * (1 - (inverseKeq === 0 ? 0 : (P * inverseKeq) / S)) +
      (inflow === 0 ? 0 : (inflow * (1 - share)) / fast)
    if (slow) out[1] = -drive * slow.relativeRate + (inflow === 0 ? 0 : (inflow * share) / late)
  }
}

/**
 * Conversion of a state, from the logarithm of a uniform substrate: a little keeps its digits.
 *
 * Shapes   never below 0 unless the reaction may run backwards.
 */
export function convertedOf(
  { feed, model }: Batch,
  y: ArrayLike<number>,
  substrate: number,
  supplied: number,
): number {
  if (feed.substrate.slow) return Math.max(0, 1 - substrate / supplied)
  const converted = -Math.expm1((y[0] as number) - Math.log(supplied)) + 0
  return model.law(undefined).Keq === undefined ? Math.max(0, converted) : converted
}
