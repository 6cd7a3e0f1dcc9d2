/** The hold temperature at which a batch is done soonest, or comes furthest in a given time. */
import { type Minimum, minimum } from '../numeric/minimum.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import type { Scenario } from '../scenario.ts'
import { type Budget, budget, overspent, stepsOf } from './budget.ts'
import { odeRoute } from './ode-route.ts'
import type { Route, RouteFailure } from './route.ts'
import { supplyUntil } from './separation.ts'
import { type Solver, solverOf } from './solver.ts'
import { atHoldTemperature } from './variants.ts'

/** What is sought: the shortest time to a conversion, or the highest conversion within a time. */
export type Aim = { readonly conversion: number } | { readonly within: number }

/**
 * The best hold temperature between two bounds, K.
 *
 * Shapes   null where the aim is met at no temperature between them. `value` is ln of the time, or a measure that
 *          falls as the conversion rises.
 * Fails    too-many-steps where the search would take too long.
 */
export function bestTemperature(
  scenario: Scenario,
  aim: Aim,
  low: number,
  high: number,
): Outcome<Minimum | null, RouteFailure> {
  const steps = 300_000
  const spend = budget(steps)
  const best = minimum((T) => badness(solverOf(atHoldTemperature(scenario, T)), aim, spend), low, high)
  return spend.left > 0 ? success(best) : failed(overspent(steps))
}

/** What a remedy is searched with where only steps tell: many runs, each good to a hundredth of a per cent. */
const searching = { tolerance: 1e-5, method: 'automatic', maxSteps: 20_000 } as const

/**
 * A hold temperature between two bounds, K, at which a conversion is reached soon: the best one as a remedy needs
 * it, to a tenth of a kelvin or so.
 */
export function goodTemperature(
  scenario: Scenario,
  conversion: number,
  low: number,
  high: number,
): number | null {
  const spend = budget(100_000)
  const found = minimum(
    (T) => {
      const solver = solverOf(atHoldTemperature(scenario, T))
      const aim = { conversion }
      return solver.separable
        ? badness(solver, aim, spend)
        : byRoute(odeRoute(solver.batch, searching), solver, aim, spend)
    },
    low,
    high,
    48,
    1e-3,
  )
  return found ? found.at : null
}

/** Temperatures this near to one another, relative in K, are one. */
const agreed = 1e-6

/**
 * How far the checking route's optimum, sought in a narrow window, lies from the answer: relative in K, or, where the
 * optimum is so flat that every temperature of the window does as well, in what is reached.
 *
 * Shapes   null where the checking route finds none.
 */
export function temperatureDifference(
  scenario: Scenario,
  aim: Aim,
  near: number,
  low: number,
  high: number,
): number | null {
  const half = Math.min(2, Math.max(0.05, 0.25 * (high - low)))
  const from = Math.max(low, near - half)
  const to = Math.min(high, near + half)
  const spend = budget(300_000)
  const found = minimum(
    (T) => {
      const solver = solverOf(atHoldTemperature(scenario, T))
      return byRoute(solver.checks, solver, aim, spend)
    },
    from,
    to,
    8,
    1e-6,
  )
  if (!found) return null
  const answered = solverOf(atHoldTemperature(scenario, near))
  const there = byRoute(answered.checks, answered, aim, spend)
  const apart = Math.abs(found.at - near) / near
  const flat = Math.abs(there - found.value)
  return apart <= agreed || !Number.isFinite(flat) ? apart : Math.min(apart, flat)
}

function badness(solver: Solver, aim: Aim, spend: Budget): number {
  const conditional = solver.batch.timeline.steps.some(
    (step) => step.kind === 'run' && step.until !== undefined,
  )
  if ('within' in aim && solver.separable && !conditional) {
    // The supply has its optimum where the conversion has, and keeps its digits when nearly all is converted.
    const supply = supplyUntil(solver.batch, solver.firstDoseAt + aim.within, false)
    return supply.ok ? -finiteLog(supply.value) : Number.POSITIVE_INFINITY
  }
  return byRoute(solver.answers, solver, aim, spend)
}

function byRoute(route: Route, solver: Solver, aim: Aim, spend: Budget): number {
  if (spend.left <= 0) return Number.POSITIVE_INFINITY
  const run = route({
    doseScale: 1,
    endless: false,
    ...('conversion' in aim ? { target: aim.conversion } : { until: solver.firstDoseAt + aim.within }),
  })
  spend.left -= stepsOf(run)
  if (!run.ok) return Number.POSITIVE_INFINITY
  const { reachedAt, firstDoseAt, end } = run.value
  if ('within' in aim) return finiteLog(end.substrate * end.volume)
  return reachedAt === undefined ? Number.POSITIVE_INFINITY : finiteLog(reachedAt - firstDoseAt)
}

const finiteLog = (x: number): number =>
  x > 0 && x < Number.POSITIVE_INFINITY ? Math.log(x) : x === 0 ? -745 : Number.POSITIVE_INFINITY
