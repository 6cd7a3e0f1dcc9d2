/** The dose: for a time, and the least one with which a target is reached at all. */
import { bracketedRoot } from '../numeric/roots.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import { budget, overspent, stepsOf } from './budget.ts'
import { equilibriumBefore } from './equilibrium.ts'
import { leastScaleByQuadrature } from './protected-batch.ts'
import type { Route, RouteFailure } from './route.ts'
import { pathOf, supplyUntil } from './separation.ts'
import type { Solver } from './solver.ts'

/** A factor on the stated doses, or why there is none. */
export type DoseScale =
  | { readonly kind: 'scale'; readonly scale: number }
  /** No dose does it; the conversion that endless enzyme would come to, and what stands in the way. */
  | { readonly kind: 'none'; readonly limit: number }

/** Doses are sought within this factor of the stated one. */
const widest = 1e30

/**
 * The factor on all doses with which the conversion is just reached by a moment.
 *
 * Units    until in s from the programme's start (Infinity: ever).
 * Fails    as the routes do.
 * Source   separable batches without a conditional hold: demand over supply, exactly; others: a bracketed root.
 */
export function doseScaleFor(
  solver: Solver,
  conversion: number,
  until: number,
  endless = false,
): Outcome<DoseScale, RouteFailure> {
  const { batch } = solver
  const conditional = batch.timeline.steps.some((step) => step.kind === 'run' && step.until !== undefined)
  const equilibrium = equilibriumBefore(batch, conversion)
  if (equilibrium !== undefined) return success({ kind: 'none', limit: Math.max(0, equilibrium) })
  if (solver.separable && !conditional) {
    const path = pathOf(batch)
    const u = path.coordinate(conversion)
    const supply = supplyUntil(batch, until, endless)
    if (!supply.ok) return failed(supply.failure)
    const scale = u === null ? Number.NaN : path.demand(u) / supply.value
    return success(Number.isFinite(scale) ? { kind: 'scale', scale } : { kind: 'none', limit: 0 })
  }
  return searchScale(solver.answers, conversion, until, endless)
}

/**
 * The root over ln scale of how far the batch falls short: what is still unconverted at the moment against the
 * target, or, once the target is reached in time, the time it took against the time it had. (A hold that waits for
 * the very target makes the conversion at the end the same for every larger dose.)
 */
function searchScale(
  route: Route,
  conversion: number,
  until: number,
  endless: boolean,
  start = 1,
): Outcome<DoseScale, RouteFailure> {
  let failure: RouteFailure | undefined
  let highest = 0
  const steps = 500_000
  const spend = budget(steps)
  const short = (logScale: number): number => {
    if (failure) return Number.NaN
    const run = route({
      doseScale: Math.exp(logScale),
      until,
      endless,
      ...(until < Number.POSITIVE_INFINITY && { target: conversion }),
    })
    spend.left -= stepsOf(run)
    if (spend.left < 0) failure = overspent(steps)
    if (!run.ok) {
      failure ??= run.failure
      return Number.NaN
    }
    const { reachedAt, firstDoseAt, end } = run.value
    highest = Math.max(highest, end.conversion)
    if (reachedAt !== undefined)
      return Math.min(-1e-300, Math.log(Math.max(1e-300, (reachedAt - firstDoseAt) / (until - firstDoseAt))))
    return Math.log(Math.max(1e-300, 1 - end.conversion) / (1 - conversion))
  }
  let low = Math.log(start)
  let atLow = short(low)
  let high = low
  let atHigh = atLow
  for (let factor = 1; atLow <= 0 && low > -Math.log(widest); factor *= 2) {
    high = low
    atHigh = atLow
    low -= factor
    atLow = short(low)
  }
  for (let factor = 1; atHigh > 0 && high < Math.log(widest); factor *= 2) {
    low = high
    atLow = atHigh
    high += factor
    atHigh = short(high)
  }
  if (failure) return failed(failure)
  if (atHigh > 0) return success({ kind: 'none', limit: highest })
  if (atLow <= 0) return success({ kind: 'scale', scale: 0 })
  const root = bracketedRoot(short, low, high, atLow, atHigh, 1e-14)
  if (failure) return failed(failure)
  return success({ kind: 'scale', scale: Math.exp(root) })
}

/**
 * The same factor by the checking route, sought around the answer.
 *
 * Shapes   null where the checking route finds none near.
 */
export function checkedScale(
  solver: Solver,
  conversion: number,
  until: number,
  scale: number,
): number | null {
  const root = searchScale(solver.checks, conversion, until, false, scale)
  return root.ok && root.value.kind === 'scale' ? root.value.scale : null
}

/**
 * Below this factor on the doses the target is never reached, however long the last conditions go on.
 *
 * Shapes   null where any dose will do in the end, or none ever.
 */
export function leastDoseScale(solver: Solver, conversion: number): Outcome<number | null, RouteFailure> {
  if (!solver.batch.model.inactivation) return success(null)
  const integrated = leastScaleByQuadrature(solver.batch, conversion)
  if (integrated !== undefined) return success(integrated > 0 ? integrated : null)
  const least = doseScaleFor(solver, conversion, Number.POSITIVE_INFINITY, true)
  if (!least.ok) return failed(least.failure)
  return success(least.value.kind === 'scale' && least.value.scale > 0 ? least.value.scale : null)
}
