/** A batch with the route that answers and the independent one that checks. */
import type { CheckMethod } from '../answer.ts'
import type { Scenario } from '../scenario.ts'
import { batchOf } from './batch.ts'
import { odeRoute } from './ode-route.ts'
import type { Batch, Route } from './route.ts'
import { separates } from './separates.ts'
import { separationRoute } from './separation.ts'

export interface Solver {
  readonly batch: Batch
  readonly answers: Route
  readonly checks: Route
  readonly checkMethod: CheckMethod
  readonly separable: boolean
  /** kg of preparation that the programme gives in all. */
  readonly fullDose: number
  /** s from the programme's start to the first dose. */
  readonly firstDoseAt: number
}

/** A step may add this relative error where integration answers: two digits below what is promised. */
const answering = { tolerance: 1e-11, method: 'automatic', maxSteps: 60_000 } as const
/** Where it checks. */
const checking = { tolerance: 1e-9, method: 'automatic', maxSteps: 60_000 } as const
const checkingImplicitly = { tolerance: 1e-8, method: 'implicit', maxSteps: 60_000 } as const

/** The routes of a scenario: separation where it holds, checked by integration; else integration by two methods. */
export function solverOf(scenario: Scenario): Solver {
  const batch = batchOf(scenario)
  const separable = separates(batch)
  const { steps } = batch.timeline
  const firstDose = steps.findIndex((step) => step.kind === 'dose')
  return {
    batch,
    separable,
    answers: separable ? separationRoute(batch) : odeRoute(batch, answering),
    checks: odeRoute(batch, separable ? checking : checkingImplicitly),
    checkMethod: separable ? 'ode-explicit' : 'ode-implicit',
    fullDose: steps.reduce((sum, step) => sum + (step.kind === 'dose' ? step.mass : 0), 0),
    firstDoseAt: steps
      .slice(0, Math.max(0, firstDose))
      .reduce((sum, step) => sum + (step.kind === 'run' ? step.duration : 0), 0),
  }
}
