/** The ways to solve a batch that the sourced values are held against, and how near each has to come. */
import { expect } from 'vitest'
import type { Work } from '../../engine/answer.ts'
import { batchOf } from '../../engine/solve/batch.ts'
import { odeRoute } from '../../engine/solve/ode-route.ts'
import { reach } from '../../engine/solve/reach.ts'
import type { BatchState, Route } from '../../engine/solve/route.ts'
import { solverOf } from '../../engine/solve/solver.ts'
import { celsius } from '../../engine/units/quantity.ts'
import { conditionOfS, type ReferenceBatch } from './batches.ts'
import type { Comparison } from './compare.ts'
import { scenarioOf } from './scenarios.ts'

export interface Way {
  readonly name: string
  readonly route: (batch: ReferenceBatch) => Route
  /** Relative difference allowed to a number of condition one. */
  readonly within: number
  /** What the condition number multiplies. */
  readonly carried: number
  /** Substrate is judged down to this share of the charge, enzyme to this share of the dose. */
  readonly leastS: number
  readonly leastE: number
  /** The most evaluations of the rate that such a batch may take. */
  readonly mostRates: number
}

const stepping = (name: string, method: 'automatic' | 'explicit' | 'implicit', tolerance: number): Way => ({
  name,
  route: (batch) => odeRoute(batchOf(scenarioOf(batch)), { method, tolerance, maxSteps: 200_000 }),
  within: 1e-7,
  // Each of the steps adds its tolerance; a handful of them falls where it counts.
  carried: 4 * tolerance,
  leastS: 1e-6,
  leastE: 1e-5,
  mostRates: 40_000,
})

/** By separation of variables. */
export const separation: Way = {
  name: 'separation',
  route: (batch) => {
    const solver = solverOf(scenarioOf(batch))
    expect(solver.separable).toBe(true)
    return solver.answers
  },
  within: 1e-9,
  carried: 1e-15,
  leastS: 0,
  leastE: 0,
  mostRates: 0,
}

/** By steps of the tolerance with which plans are answered, the method as the integrator finds right. */
export const automatic = stepping('automatic steps', 'automatic', 1e-10)
export const explicit = stepping('explicit steps', 'explicit', 1e-10)
export const implicit = stepping('implicit steps', 'implicit', 1e-10)
/** By the finest steps: the route keeps no tolerance below 1e-12. Work is no matter then. */
export const finest: Way = {
  ...stepping('finest steps', 'automatic', 1e-12),
  mostRates: 400_000,
}

/** What a number of this condition may be off. */
export const allowed = (way: Way, condition = 1): number => Math.max(way.within, condition * way.carried)

/** Minutes from the first dose to a conversion; undefined where it is never reached. */
export const minutesTo = (way: Way, batch: ReferenceBatch, conversion: number): number | undefined => {
  const solver = solverOf(scenarioOf(batch))
  const reached = reach(solver, conversion, 1, way.route(batch))
  if (!reached.ok) expect.unreachable(`${way.name}: ${JSON.stringify(reached.failure)}`)
  expectWorkCounted(way, reached.value.run.work)
  return reached.value.time === undefined ? undefined : reached.value.time / 60
}

/** The states at minutes from the programme's start, ascending. */
export const statesAt = (way: Way, batch: ReferenceBatch, times: readonly number[]): BatchState[] => {
  const outputs = times.map((t) => 60 * t)
  const run = way.route(batch)({ doseScale: 1, outputs, until: outputs.at(-1) ?? 0, endless: true })
  if (!run.ok) expect.unreachable(`${way.name}: ${JSON.stringify(run.failure)}`)
  expect(run.value.outputs.length).toBe(times.length)
  expectWorkCounted(way, run.value.work)
  return [...run.value.outputs]
}

/** Separation takes no step; integration counts each, and stays within what such batches need. */
function expectWorkCounted(way: Way, work: Work): void {
  for (const count of Object.values(work)) expect(Number.isInteger(count)).toBe(true)
  expect(work.rateEvaluations).toBeLessThanOrEqual(way.mostRates)
  if (way === separation) expect(work.stepsAccepted).toBe(0)
  else expect(work.stepsAccepted).toBeGreaterThan(0)
}

/** A sourced state; `enzymeTime` (g/L) tells its condition, and is left out where that is no matter. */
export interface SourcedState {
  readonly t: number
  readonly S: number
  readonly P?: number
  readonly X?: number
  readonly E?: number
  readonly T?: number
  readonly V?: number
  readonly enzymeTime?: number
  /** mg/L given in all, for the floor of E */
  readonly dose?: number
}

/** Every number of the sourced states against what a way gives. */
export function compareStates(
  way: Way,
  batch: ReferenceBatch,
  rows: readonly SourcedState[],
): readonly Comparison[] {
  const states = statesAt(
    way,
    batch,
    rows.map(({ t }) => t),
  )
  return rows.flatMap((row, i): Comparison[] => {
    const state = states[i]
    const { S, P, X, E, T, V, enzymeTime, dose = 0 } = row
    const condition = enzymeTime === undefined ? 1 : conditionOfS(batch, enzymeTime, S)
    const within = allowed(way, condition)
    // Steps know the substrate; what little of it is gone early is a difference of two.
    const least = way === separation ? 0 : 4e-15 / within
    const at = `at ${row.t}`
    return [
      { what: `S ${at}`, got: state?.substrate, due: S, within, floor: way.leastS * batch.charge.S0 },
      ...(X === undefined ? [] : [{ what: `X ${at}`, got: state?.conversion, due: X, within, floor: least }]),
      ...(P === undefined
        ? []
        : [
            {
              what: `P ${at}`,
              got: state?.product,
              due: P,
              within,
              floor: least * batch.charge.S0 * batch.charge.y,
            },
          ]),
      ...(E === undefined
        ? []
        : [
            {
              what: `E ${at}`,
              got: state && 1000 * state.enzyme,
              due: E,
              within: way.within,
              floor: way.leastE * dose,
            },
          ]),
      ...(T === undefined
        ? []
        : [{ what: `T ${at}`, got: state?.temperature, due: celsius(T), within: 1e-13 }]),
      ...(V === undefined
        ? []
        : [{ what: `V ${at}`, got: state && 1000 * state.volume, due: V, within: 1e-13 }]),
    ]
  })
}

/** Every time to a conversion; `null` where it is never reached. */
export const compareTimes = (
  way: Way,
  batch: ReferenceBatch,
  rows: readonly { readonly X: number; readonly t: number | null; readonly condition?: number }[],
): readonly Comparison[] =>
  rows.map(({ X, t, condition = 1 }): Comparison => {
    const got = minutesTo(way, batch, X)
    return {
      what: `time to ${X}`,
      got: got ?? Number.POSITIVE_INFINITY,
      due: t ?? Number.POSITIVE_INFINITY,
      within: allowed(way, condition),
    }
  })
