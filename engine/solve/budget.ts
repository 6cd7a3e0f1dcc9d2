/** A search may run many batches; what it spends on steps in all is bounded, so that no scenario hangs. */
import type { Outcome } from '../outcome.ts'
import type { BatchRun, RouteFailure } from './route.ts'

/** Steps that a search may still take, counted down in place. */
export interface Budget {
  left: number
}

/** So many steps: half a million take about a second. */
export const budget = (steps: number): Budget => ({ left: steps })

/** A run that failed without having counted its steps is taken to have cost this many. */
const unknown = 10_000

/** Steps that a run has taken, rejected ones included. */
export const stepsOf = (run: Outcome<BatchRun, RouteFailure>): number =>
  run.ok
    ? run.value.work.stepsAccepted + run.value.work.stepsRejected
    : run.failure.kind === 'too-many-steps'
      ? run.failure.taken
      : unknown

/** The failure of a search that has spent its steps. */
export const overspent = (taken: number): RouteFailure => ({
  kind: 'too-many-steps',
  time: 0,
  taken,
  reached: { time: 0, state: new Float64Array(0) },
})
