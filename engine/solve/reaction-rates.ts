/**
 * The balances of a batch divided by that of its substrate: time and enzyme as functions of u = ln(m0/m), the
 * logarithm of how far the substrate has come down. On the way to a conversion this is the smooth view of a batch:
 * neither the sharp turn where S falls to Km nor the slow end is steep in u, and the substrate can neither be
 * overshot nor turn negative.
 *
 * Shapes   y = [elapsed time / timeScale, enzyme / enzyme at the start]; u counts from the run's start.
 * Source   dt/du = 1/r, dE/du = −kd·E/r with r = −d(ln m)/dt, the balances of a well-mixed batch; kg and s.
 */
import type { RateInto } from '../integrate/problem.ts'
import type { EnzymeModel } from './enzyme-model.ts'
import { temperatureAt } from './temperature-course.ts'
import type { Run } from './timeline.ts'

/** Where a run starts: m³, kg of substrate, of enzyme, and of product if all substrate were converted. */
export interface ReactionStart {
  readonly volume: number
  readonly substrate: number
  readonly enzyme: number
  readonly productPool: number
}

/** The rates, and the time that a unit of y[0] stands for. */
export interface ReactionRates {
  readonly rate: RateInto
  readonly timeScale: number
}

/**
 * The rates of one run without feed, with a uniform substrate and one step of inactivation at most; undefined where
 * the reaction does not go forward from the start.
 */
export function reactionRates(model: EnzymeModel, run: Run, start: ReactionStart): ReactionRates | undefined {
  const { volume, substrate: m0, enzyme: E0, productPool } = start
  const { Km, Kic, Kiu, Ksi, Keq } = model.law(run.pH)
  const y = model.massYield
  const pool = productPool / volume
  // The denominator times volume as a polynomial in the substrate's mass, the product written by balance.
  const a = Km * (Kic === undefined ? 1 : 1 + pool / Kic) * volume
  const b = 1 + (Kiu === undefined ? 0 : pool / Kiu) - (Kic === undefined ? 0 : (y * Km) / Kic)
  const c = ((Ksi === undefined ? 0 : 1 / Ksi) - (Kiu === undefined ? 0 : y / Kiu)) / volume
  const reverse = Keq === undefined ? 1 : 1 + y / Keq
  const backward = Keq === undefined ? 0 : productPool / Keq
  const { inactivation } = model
  const perKp = inactivation?.Kp === undefined ? 0 : 1 / (inactivation.Kp * volume)
  const { course } = run
  const kOf = model.k(run.pH)
  const kdOf = inactivation?.k1(run.pH)
  const forward = reverse - backward / m0
  const steady = course.kind === 'steady'
  const kSteady = kOf(course.from)
  const kdSteady = kdOf ? kdOf(course.from) : 0
  const endless = run.duration === Number.POSITIVE_INFINITY
  const k0 = steady || endless ? kSteady : Math.max(kSteady, kOf(temperatureAt(course, run.duration)))
  const scale = (a + m0 * (b + c * m0)) / (k0 * E0 * forward)
  const timeScale = Math.min(scale, run.duration)
  if (!(forward > 0 && timeScale > 0 && timeScale < Number.POSITIVE_INFINITY)) return undefined
  const simple = Keq === undefined && perKp === 0
  if (steady && simple) {
    const perTime = 1 / (kSteady * E0 * timeScale)
    const perLoss = kdSteady / (kSteady * E0)
    const rate: RateInto = (out, state, u) => {
      const m = m0 * Math.exp(-u)
      const D = a + m * (b + c * m)
      out[0] = (perTime * D) / (state[1] as number)
      out[1] = -perLoss * D
    }
    return { rate, timeScale }
  }
  const linear = course.kind === 'linear'
  const from = course.from
  const slope = linear ? course.slope * timeScale : 0
  const rate: RateInto = (out, state, u) => {
    const m = m0 * Math.exp(-u)
    const t = state[0] as number
    const T = steady ? from : linear ? from + slope * t : temperatureAt(course, t * timeScale)
    const kE0 = (steady ? kSteady : kOf(T)) * E0
    let kd = steady ? kdSteady : kdOf ? kdOf(T) : 0
    if (perKp > 0) kd /= 1 + m * perKp
    const D = (a + m * (b + c * m)) / (reverse - backward / m)
    out[0] = D / (kE0 * timeScale * (state[1] as number))
    out[1] = (-kd * D) / kE0
  }
  return { rate, timeScale }
}
