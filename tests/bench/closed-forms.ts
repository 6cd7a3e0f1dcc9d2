/** What needs no stepping: closed forms, programmes by separation, laws that are integrated by quadrature. */
import { type Charge, enzymeTime } from '../../engine/kinetics/integrated-rate-law.ts'
import { decayingTime, timeAtConstantConditions } from '../../engine/solve/constant-conditions.ts'
import { courseWorkspace } from '../../engine/solve/course-supply.ts'
import { enzymeModel } from '../../engine/solve/enzyme-model.ts'
import { odeRoute } from '../../engine/solve/ode-route.ts'
import {
  type ProtectedDecay,
  protectedLoss,
  protectedTime,
  protectedWorkspace,
} from '../../engine/solve/protected-time.ts'
import { type ReactionPath, reactionPath } from '../../engine/solve/reaction-path.ts'
import { separationRoute } from '../../engine/solve/separation.ts'
import { measure, report } from './measure.ts'
import {
  type Case,
  constantCases,
  conversion,
  enzyme,
  feed,
  Km,
  massYield,
  programmeCases,
  rampCases,
  S0,
} from './problems.ts'
import { constantTime } from './yardstick.ts'

const count = 2000
/** So few that their scenarios stay in the processor's cache, as the one of a plan does. */
const programmesCount = 500
/** Where each reference costs milliseconds. */
const fewer = 200

/** What separates, each part to be measured in a process of its own. */
export const closedForms = {
  'closed-form': closedForm,
  ramp: () => programmes('ramp of 0.3 K/h', rampCases(programmesCount)),
  programme: () => programmes('six-phase programme', programmeCases(programmesCount)),
  'no-closed-form': withoutClosedForm,
}

function closedForm(): void {
  const cases = constantCases(count)
  const exact = Float64Array.from(cases, ({ dose, T }) => constantTime(dose, T, Km, 1e-12))
  const model = enzymeModel(enzyme(), feed)
  const charge: Charge = { S0, P0: 0, massYield }
  const law = model.law(undefined)
  const k = model.k(undefined)
  const kd = model.inactivation?.k1(undefined) ?? (() => 0)
  const out = new Float64Array(count)
  const [measured] = measure(
    [
      {
        name: 'closed form',
        run: () => {
          for (let i = 0; i < count; i++) {
            const { dose, T } = cases[i] as Case
            // The demand is computed anew for every scenario, as for scenarios that have nothing in common.
            const demand = enzymeTime(law, charge, -Math.log1p(-conversion))
            out[i] = decayingTime(demand / (k(T) * dose), kd(T))
          }
          return out
        },
      },
    ],
    exact,
  )
  if (measured)
    report('closed form with both Arrhenius laws', measured, {
      text: 'goal ≤ 100 ns',
      met: measured.nanoseconds <= 100,
    })
  const time = timeAtConstantConditions(model, reactionPath(law, charge), conversion, undefined)
  const [prepared] = measure(
    [
      {
        name: 'prepared',
        run: () => {
          for (let i = 0; i < count; i++) {
            const { dose, T } = cases[i] as Case
            out[i] = time(dose, T)
          }
          return out
        },
      },
    ],
    exact,
  )
  if (prepared)
    report('the same, one conversion prepared', prepared, {
      text: 'goal ≤ 100 ns',
      met: prepared.nanoseconds <= 100,
    })
}

function programmes(label: string, cases: readonly Case[]): void {
  const room = courseWorkspace()
  const routes = cases.map(({ batch }) => separationRoute(batch, room))
  const out = new Float64Array(cases.length)
  const exact = Float64Array.from(cases, ({ batch }) => {
    const run = odeRoute(batch, { tolerance: 1e-13, method: 'explicit', maxSteps: 1e6 })({
      doseScale: 1,
      target: conversion,
      endless: false,
    })
    return run.ok ? (run.value.reachedAt ?? Number.NaN) : Number.NaN
  })
  const request = { doseScale: 1, target: conversion, endless: false }
  const [measured] = measure(
    [
      {
        name: label,
        run: () => {
          for (let i = 0; i < routes.length; i++) {
            const run = (routes[i] as (typeof routes)[number])(request)
            out[i] = run.ok ? (run.value.reachedAt ?? Number.NaN) : Number.NaN
          }
          return out
        },
      },
    ],
    exact,
  )
  if (measured)
    report(`${label} by separation`, measured, { text: 'goal ≤ 3 µs', met: measured.nanoseconds <= 3000 })
}

function withoutClosedForm(): void {
  const model = enzymeModel(enzyme(), feed)
  const law = { ...model.law(undefined), Kiu: 40, Ksi: 300 }
  const path = reactionPath(law, { S0, P0: 0, massYield })
  const u = path.coordinate(conversion) ?? 0
  const room = protectedWorkspace()
  const cases = constantCases(2 * fewer)
    .map(({ dose, T }, i) => ({
      dose,
      decay: {
        k: model.k(undefined)(T),
        kd: model.inactivation?.k1(undefined)(T) ?? 0,
        Kp: 2 + (100 * i) / fewer,
      },
    }))
    .filter(({ dose, decay }) => protectedLoss(path, decay, u) < 0.9 * dose)
    .slice(0, fewer)
  const out = new Float64Array(cases.length)
  // Trapezoids with Richardson extrapolation, nested: nothing in common with Gauss–Legendre.
  const exact = Float64Array.from(cases, ({ dose, decay }) => protectedByRomberg(path, decay, dose, u))
  const [measured] = measure(
    [
      {
        name: 'substrate protection',
        run: () => {
          for (let i = 0; i < cases.length; i++) {
            const { decay, dose } = cases[i] as (typeof cases)[number]
            out[i] = protectedTime(path, decay, dose, u, room)
          }
          return out
        },
      },
    ],
    exact,
  )
  if (measured)
    report('law without closed form (protection, Kic, Kiu, Ksi)', measured, {
      text: 'goal ≤ 0.7 µs',
      met: measured.nanoseconds <= 700,
    })
}

/** Halvings at which two levels of the nested rule agree to 1e-13. */
const levels = 9

function protectedByRomberg(
  path: ReactionPath,
  { k, kd, Kp }: ProtectedDecay,
  E0: number,
  u: number,
): number {
  const loss = (at: number): number => ((kd / k) * path.demandSlope(at)) / (1 + path.substrate(at) / Kp)
  const left = (at: number): number => (at === 0 ? E0 : E0 - romberg(loss, at, levels))
  return romberg((at) => path.demandSlope(at) / (k * left(at)), u, levels)
}

function romberg(f: (u: number) => number, end: number, levels: number): number {
  let rows: number[] = []
  for (let level = 0; level <= levels; level++) {
    const n = 2 ** level
    let sum = 0.5 * (f(0) + f(end))
    for (let i = 1; i < n; i++) sum += f((end * i) / n)
    const row = [(sum * end) / n]
    for (let j = 1; j <= level; j++) {
      const coarse = rows[j - 1] as number
      const fine = row[j - 1] as number
      row.push(fine + (fine - coarse) / (4 ** j - 1))
    }
    rows = row
  }
  return rows[levels] as number
}
