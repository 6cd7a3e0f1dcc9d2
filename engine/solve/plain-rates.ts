/**
 * The balances of a batch in amounts as they are, relative to those at the run's start: the cheapest view where the
 * temperature moves or substrate is fed in and neither substrate nor enzyme comes near its end.
 *
 * Shapes   y = [substrate, enzyme], both 1 at the start; a negative amount gives a rate that is not a number, so
 *          that no step into it is ever accepted.
 * Source   balances of a well-mixed batch; kg and s.
 */
import type { RateInto } from '../integrate/problem.ts'
import type { EnzymeModel } from './enzyme-model.ts'
import type { ReactionStart } from './reaction-rates.ts'
import { temperatureAt } from './temperature-course.ts'
import type { Run } from './timeline.ts'

/** The rates of one run over a variable x that starts at 0, and the time that x stands for. */
export interface PlainRates {
  readonly rate: RateInto
  /** x at the run's end. */
  readonly end: number
  /** s from the run's start */
  readonly timeAt: (x: number) => number
}

/** The rates of one run of `length` s, with a uniform substrate and one step of inactivation at most. */
export function plainRates(model: EnzymeModel, run: Run, start: ReactionStart, length: number): PlainRates {
  return run.feed
    ? { rate: fedRates(model, run, start), end: length, timeAt: (t) => t }
    : movingRates(model, run, start, length)
}

/** Beyond this ratio of k at a run's ends the variable would leave the cold end no digits. */
const greatestRatio = 1e9

/**
 * A batch that warms up or cools down, over x in t = L·x·(1 + b)/(1 + b·x), which passes the warm part of the run
 * slowly: with 1 + b the fourth root of k at the end over k at the start, k·dt and kd·dt are mild functions of x where
 * over time both are steep exponentials. Other powers, or none, take up to a fifth more rates.
 */
function movingRates(model: EnzymeModel, run: Run, start: ReactionStart, length: number): PlainRates {
  const { volume, substrate: m0, enzyme: E0, productPool } = start
  const { Km, Kic, Kiu, Ksi, Keq } = model.law(run.pH)
  const y = model.massYield
  const pool = productPool / volume
  const a = (Km * (Kic === undefined ? 1 : 1 + pool / Kic) * volume) / E0
  const b = ((1 + (Kiu === undefined ? 0 : pool / Kiu) - (Kic === undefined ? 0 : (y * Km) / Kic)) * m0) / E0
  const c =
    (((Ksi === undefined ? 0 : 1 / Ksi) - (Kiu === undefined ? 0 : y / Kiu)) * m0 * m0) / (volume * E0)
  const reverse = Keq === undefined ? 1 : 1 + y / Keq
  const backward = Keq === undefined ? 0 : productPool / (Keq * m0)
  const k = model.k(run.pH)
  const kd = model.inactivation?.k1(run.pH)
  const { course } = run
  const linear = course.kind === 'linear'
  const from = course.from
  const slope = linear ? course.slope : 0
  const ratio = k(temperatureAt(course, length)) / k(from)
  const bend = ratio > 1 / greatestRatio && ratio < greatestRatio ? Math.sqrt(Math.sqrt(ratio)) - 1 : 0
  const reach = length * (1 + bend)
  const timeAt = (x: number): number => (reach * x) / (1 + bend * x)
  // Stages of a step come in twos and threes at the same place; the exponentials are kept for them.
  const kept = new Float64Array(3)
  kept[0] = Number.NaN
  const rate: RateInto = (out, state, x) => {
    if (x !== kept[0]) {
      const perBend = 1 / (1 + bend * x)
      const t = reach * x * perBend
      const T = linear ? from + slope * t : temperatureAt(course, t)
      const dt = reach * perBend * perBend
      kept[0] = x
      kept[1] = k(T) * dt
      if (kd) kept[2] = kd(T) * dt
    }
    const m = state[0] as number
    const E = state[1] as number
    const drive = ((kept[1] as number) * E) / (a + m * (b + c * m))
    out[0] = m > 0 ? drive * (backward - reverse * m) : Number.NaN
    out[1] = -(kept[2] as number) * E
  }
  return { rate, end: 1, timeAt }
}
function fedRates(model: EnzymeModel, run: Run, start: ReactionStart): RateInto {
  const { volume: V0, substrate: m0, enzyme: E0, productPool } = start
  const { Km, Kic, Kiu, Ksi, Keq } = model.law(run.pH)
  const y = model.massYield
  const perKic = Kic === undefined ? 0 : 1 / Kic
  const perKiu = Kiu === undefined ? 0 : 1 / Kiu
  const perKsi = Ksi === undefined ? 0 : 1 / Ksi
  const perKeq = Keq === undefined ? 0 : 1 / Keq
  const { feed } = run
  const { flow, flowSlope, substrate, product, enzyme } = feed ?? noFeed
  const k = model.k(run.pH)(run.course.from) * E0
  const kd = model.inactivation ? model.inactivation.k1(run.pH)(run.course.from) : 0
  const poolIn = product + y * substrate
  const substrateIn = substrate / m0
  const enzymeIn = enzyme / E0
  const perM0 = 1 / m0
  return (out, state, t) => {
    const m = (state[0] as number) * m0
    const E = state[1] as number
    const fed = t * (flow + 0.5 * flowSlope * t)
    const perV = 1 / (V0 + fed)
    const rate = flow + flowSlope * t
    const S = m * perV
    const P = (productPool + fed * poolIn) * perV - y * S
    const D = Km * (1 + P * perKic) + S * (1 + P * perKiu) + S * S * perKsi
    out[0] = m > 0 ? rate * substrateIn - (k * E * (S - P * perKeq) * perM0) / D : Number.NaN
    out[1] = rate * enzymeIn - kd * E
  }
}

const noFeed = { flow: 0, flowSlope: 0, substrate: 0, product: 0, enzyme: 0 }
