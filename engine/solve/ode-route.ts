/**
 * The route by integration: the balances stepped in logarithms, or in cheaper coordinates as far as they carry, for
 * every batch, those that separate included; restarted at every kink of the programme.
 */
import { createIntegrator, type Integrator } from '../integrate/integrator.ts'
import type { MethodChoice } from '../integrate/problem.ts'
import { stateSize } from './log-rates.ts'
import { march } from './march.ts'
import { OdeMover } from './ode-mover.ts'
import type { Batch, Route } from './route.ts'

export interface Exactness {
  /** Relative error of substrate and enzyme that a step may add. */
  readonly tolerance: number
  readonly method: MethodChoice
  readonly maxSteps: number
}

/** What the program integrates with unless asked otherwise. */
export const standardExactness: Exactness = { tolerance: 1e-8, method: 'automatic', maxSteps: 200_000 }

/**
 * The route of any batch by integration.
 *
 * Shapes   an integrator of the right size may be handed in and is then reused, run after run.
 */
export function odeRoute(
  batch: Batch,
  exactness: Exactness = standardExactness,
  workspace?: Integrator,
): Route {
  let integrator = workspace
  return (request) => {
    integrator ??= createIntegrator(stateSize(batch))
    return march(batch, new OdeMover(batch, integrator, exactness), request)
  }
}
