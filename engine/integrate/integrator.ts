import type { Outcome } from '../outcome.ts'
import { createDoubling } from './doubling.ts'
import { createDriver } from './driver.ts'
import type { Method } from './method.ts'
import type { Arrival, Control, IntegrationFailure, Problem } from './problem.ts'
import { createRosenbrock } from './rosenbrock.ts'

/** A workspace for problems of one size, to be used for any number of them one after another. */
export interface Integrator {
  readonly size: number
  run(problem: Problem, control: Control): Outcome<Arrival, IntegrationFailure>
}

/**
 * Makes an integrator for problems of `size` components.
 *
 * Shapes   every run is independent of the ones before; steps allocate nothing. One run at a
 *          time: a rate or an event must not run its own integrator again.
 * Fails    runs fail as `IntegrationFailure` says, with the last accepted point inside; a problem
 *          or control that makes no sense (a bug of the caller) throws a RangeError.
 */
export const createIntegrator = (size: number): Integrator => {
  const drive = createDriver(size)
  const explicit = createDoubling(size)
  let implicit: Method | undefined
  return {
    size,
    run(problem, control) {
      check(size, problem, control)
      return drive(problem, control, explicit, () => {
        implicit ??= createRosenbrock(size)
        return implicit
      })
    },
  }
}

/** Integrates one problem once; see `createIntegrator` for many. */
export const integrate = (problem: Problem, control: Control): Outcome<Arrival, IntegrationFailure> =>
  createIntegrator(problem.initial.length).run(problem, control)

const check = (size: number, problem: Problem, control: Control): void => {
  if (problem.initial.length !== size) throw new RangeError(`expected ${size} components`)
  if (!(problem.start <= problem.end && problem.end - problem.start < Number.POSITIVE_INFINITY)) {
    throw new RangeError('a problem starts before it ends, both finite')
  }
  if (!(control.absolute > 0 && control.relative >= 0)) {
    throw new RangeError('an absolute tolerance above zero and a relative one of at least zero are needed')
  }
  if (!(control.maxSteps >= 1)) throw new RangeError('at least one step must be allowed')
}
