/** When a batch reaches a conversion, and how well conditioned that moment is. */
import { failed, type Outcome, success } from '../outcome.ts'
import type { BatchRun, RouteFailure } from './route.ts'
import { pathOf } from './separation.ts'
import type { Solver } from './solver.ts'

export interface Reach {
  readonly run: BatchRun
  /** s from the first dose; absent when the programme never gets there. */
  readonly time?: number
}

/** Runs the stated programme until the conversion is reached, or to its end. */
export function reach(
  solver: Solver,
  conversion: number,
  doseScale = 1,
  route = solver.answers,
): Outcome<Reach, RouteFailure> {
  const run = route({ doseScale, target: conversion, endless: false })
  if (!run.ok) return failed(run.failure)
  const { reachedAt, firstDoseAt } = run.value
  // An endless hold integrated to the end of time reaches nothing there that anybody would wait for.
  const reached = reachedAt !== undefined && Number.isFinite(reachedAt)
  return success({ run: run.value, ...(reached && { time: reachedAt - firstDoseAt }) })
}

/** Time to a conversion, Infinity where it is never reached or cannot be computed: for searches. */
export function timeTo(solver: Solver, conversion: number, doseScale = 1): number {
  const reached = reach(solver, conversion, doseScale)
  return reached.ok && reached.value.time !== undefined ? reached.value.time : Number.POSITIVE_INFINITY
}

/** A relative change of the time this small is in proportion to that of the dose. */
const proportional = 1e-3

/**
 * By how much a relative error of the enzyme-time is magnified in the time: mean over final rate of supply. At
 * constant conditions x/((1 − x)(−ln(1 − x))) with x = kd·I/(k·E0), which grows without bound at the edge of
 * reachability.
 */
export function amplification(solver: Solver, { run, time }: Reach, conversion: number): number | undefined {
  if (time === undefined || !(time > 0)) return undefined
  const { model } = solver.batch
  if (solver.separable) {
    const path = pathOf(solver.batch)
    const u = path.coordinate(conversion)
    if (u === null) return undefined
    const { temperature, pH, enzyme } = run.end
    const value = path.demand(u) / (time * model.k(pH)(temperature) * enzyme)
    return Number.isFinite(value) ? value : undefined
  }
  // The nearer the edge, the smaller the change of dose over which the time still answers in proportion.
  let found: number | undefined
  for (let change = 1e-4; change > 1e-11; change *= 0.01) {
    const value = -Math.log(timeTo(solver, conversion, 1 + change) / time) / Math.log1p(change)
    if (!(Number.isFinite(value) && value > 0)) return found
    found = value
    if (value * change < proportional) return found
  }
  return found
}

/** Significant digits that a double leaves to a result so conditioned. */
export const honestDigits = (factor: number): number =>
  Math.max(0, Math.floor(15.35 - Math.log10(Math.max(1, factor))))

/** Where the conversion comes to rest if the last conditions go on without end. */
export function restingConversion(
  solver: Solver,
  route = solver.answers,
  doseScale = 1,
): Outcome<number, RouteFailure> {
  const run = route({ doseScale, endless: true })
  return run.ok ? success(run.value.end.conversion) : failed(run.failure)
}
