/** The four kinds of batch as the yardstick sees them. */
import { dormandPrince, type Stop } from './dormand-prince.ts'
import {
  conversion,
  Ea,
  EaLoss,
  feeding,
  gas,
  Kic,
  k50,
  kd50,
  massYield,
  S0,
  sixPhases,
  T50,
} from './problems.ts'

const steady = dormandPrince({
  constants: ['k', 'kd', 'a', 'b', 'target'],
  ds: '-k * e * s / (a + b * s)',
  de: '-kd * e',
  event: 's - target',
})

const ramping = dormandPrince({
  constants: ['a', 'b', 'target', 'from', 'slope', 'k50', 'ea', 'kd50', 'ed', 'T50'],
  stage:
    'const T = from + slope * t, x = (T - T50) / (T * T50), k = k50 * Math.exp(ea * x), kd = kd50 * Math.exp(ed * x);',
  ds: '-k * e * s / (a + b * s)',
  de: '-kd * e',
  event: 's - target',
})

const fed = dormandPrince({
  constants: ['k', 'kd', 'Km', 'Kic', 'y', 'flow', 'Sf', 'S0', 'X', 'supplied'],
  stage: 'const V = 1 + flow * t, P = y * ((supplied + flow * t * Sf) / V - s);',
  ds: 'flow / V * (Sf - s) - k * e * s / (Km * (1 + P / Kic) + s)',
  de: '-kd * e - flow / V * e',
  event: 's * (1 + flow * t) - (1 - X) * (supplied + flow * t * Sf)',
})

/** k at a temperature, 1/s. */
export const kAt = (T: number): number => (k50 / 3600) * Math.exp((Ea * 1000 * (T - T50)) / (gas * T * T50))
/** kd at a temperature, 1/s. */
export const kdAt = (T: number): number =>
  (kd50 / 3600) * Math.exp((EaLoss * 1000 * (T - T50)) / (gas * T * T50))

/** Denominator a + b·S with the product written by balance, in a batch of S0 and no other substrate. */
const denominator = (Km: number, pool: number): readonly [number, number] => [
  Km * (1 + pool / Kic),
  1 - (Km * massYield) / Kic,
]

export const stop: Stop = { t: 0, s: 0, e: 0, reached: false, steps: 0 }

/** Time to the target at constant conditions, s. */
export function constantTime(dose: number, T: number, Km: number, tolerance: number, X = conversion): number {
  const [a, b] = denominator(Km, massYield * S0)
  steady([kAt(T), kdAt(T), a, b, (1 - X) * S0], S0, dose, 1e12, tolerance, S0, dose, stop)
  return stop.t
}

/** Time to the target while the temperature falls at 0.3 K/h, s. */
export function rampTime(dose: number, T: number, Km: number, tolerance: number): number {
  const [a, b] = denominator(Km, massYield * S0)
  const constants = rampConstants(a, b, T, -0.3 / 3600)
  ramping(constants, S0, dose, 100 * 3600, tolerance, S0, dose, stop)
  return stop.t
}

const rampConstants = (a: number, b: number, from: number, slope: number): number[] => [
  a,
  b,
  (1 - conversion) * S0,
  from,
  slope,
  k50 / 3600,
  (Ea * 1000) / gas,
  kd50 / 3600,
  (EaLoss * 1000) / gas,
  T50,
]

/** Time to the target under the six-phase programme, s. */
export function programmeTime(dose: number, T: number, Km: number, tolerance: number): number {
  const [a, b] = denominator(Km, massYield * S0)
  const target = (1 - conversion) * S0
  let from = 293.15
  let t = 0
  let s = S0
  let e = 0
  for (const phase of sixPhases(dose, T)) {
    if (phase.phase === 'dose') {
      e += phase.amount
      continue
    }
    if (phase.phase === 'hold' && 'for' in phase)
      steady([kAt(from), kdAt(from), a, b, target], s, e, phase.for, tolerance, S0, dose, stop)
    if (phase.phase === 'heat' || phase.phase === 'cool') {
      const ramp = phase.ramp ?? 1
      const slope = phase.to > from ? ramp : -ramp
      ramping(rampConstants(a, b, from, slope), s, e, (phase.to - from) / slope, tolerance, S0, dose, stop)
      from = phase.to
    }
    t += stop.t
    s = stop.s
    e = stop.e
    if (stop.reached) return t
  }
  return Number.POSITIVE_INFINITY
}

/** Time to the target with feeding in between, s. */
export function feedTime(dose: number, T: number, Km: number, tolerance: number): number {
  const k = kAt(T)
  const kd = kdAt(T)
  const [a, b] = denominator(Km, massYield * S0)
  const target = (1 - conversion) * S0
  steady([k, kd, a, b, target], S0, dose, feeding.before, tolerance, S0, dose, stop)
  let t = stop.t
  if (stop.reached) return t
  const constants = [k, kd, Km, Kic, massYield, feeding.flow, feeding.concentration, S0, conversion, S0]
  fed(constants, stop.s, stop.e, feeding.duration, tolerance, S0, dose, stop)
  t += stop.t
  if (stop.reached) return t
  const volume = 1 + feeding.flow * feeding.duration
  const supplied = (S0 + feeding.flow * feeding.duration * feeding.concentration) / volume
  const [a2, b2] = denominator(Km, massYield * supplied)
  steady([k, kd, a2, b2, (1 - conversion) * supplied], stop.s, stop.e, 1e12, tolerance, S0, dose, stop)
  return t + stop.t
}
