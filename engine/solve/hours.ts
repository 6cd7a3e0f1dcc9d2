/**
 * Where the hours go: the hold time as an exact sum over causes, in one fixed order, so that two people get the same
 * ledger. Saturation, substrate running short, inhibition and reversibility are terms of the enzyme-time at the
 * hold temperature and the best pH; then pH off its best, enzyme loss, heating, staging and feeding, each as the
 * time with it less the time without. A line may be negative; the lines sum to the time within round-off.
 */
import type { HoursCause, HoursLedger } from '../answer.ts'
import { type Charge, enzymeTime, enzymeTimeTerms } from '../kinetics/integrated-rate-law.ts'
import type { RateConstants } from '../kinetics/rate-law.ts'
import { minimum } from '../numeric/minimum.ts'
import type { Scenario } from '../scenario.ts'
import { type Concentration, quantity, type Time, type Volume } from '../units/quantity.ts'
import { timeTo } from './reach.ts'
import { reactionPath } from './reaction-path.ts'
import type { BatchRun } from './route.ts'
import { type Solver, solverOf } from './solver.ts'
import { constantly, holdTemperature, steadyAt } from './variants.ts'

/** Causes that a change of plan could do something about without asking for less. */
const avoidable: ReadonlySet<HoursCause> = new Set([
  'product-inhibition',
  'substrate-inhibition',
  'pH',
  'enzyme-loss',
  'heating',
  'staging',
])

/**
 * The ledger of a batch that reached its target.
 *
 * Shapes   undefined where a comparison batch never gets there (the real programme is saved by what the ledger
 *          would take away), or takes longer than a double holds.
 */
export function hoursLedger(
  scenario: Scenario,
  solver: Solver,
  conversion: number,
  run: BatchRun,
  time: number,
): HoursLedger | undefined {
  const { model } = solver.batch
  const T = holdTemperature(scenario.programme)
  const { pH } = run.end
  const charge = chargeOf(solver, run)
  const { slow } = scenario.feed.substrate
  const E0 = run.dosed / run.end.volume
  const total = (at: number | undefined): number | undefined => {
    const path = reactionPath(model.law(at), charge, slow)
    const u = path.coordinate(conversion)
    return u === null ? undefined : path.demand(u) / (model.k(at)(T) * E0)
  }
  const best = bestPh(solver, total) ?? pH
  const perTerm = 1 / (model.k(best)(T) * E0)
  const { Keq: _, ...irreversible } = model.law(best) as RateConstants
  const terms = enzymeTimeTerms(irreversible, charge, -Math.log1p(-conversion))
  const uniform = reactionPath(model.law(best), charge)
  const uniformAt = uniform.coordinate(conversion)
  const atBest = total(best)
  const atSet = total(pH)
  if (uniformAt === null || atBest === undefined || atSet === undefined) return undefined
  const sum = enzymeTime(irreversible, charge, -Math.log1p(-conversion)) * perTerm
  const reversible = uniform.demand(uniformAt) * perTerm
  const atOnce = timeTo(solverOf(atOnceScenario(scenario, charge, run, T, pH)), conversion)
  const steady =
    scenario.programme.kind === 'constant'
      ? time
      : endlessTimeTo(solverOf(steadyAt(scenario, T, phaseDurations(run))), conversion)
  if (!Number.isFinite(atOnce) || !Number.isFinite(steady)) return undefined
  const { rate } = scenario.enzyme
  const lines: { cause: HoursCause; time: Time }[] = []
  const line = (cause: HoursCause, value: number, present = true): void => {
    if (present) lines.push({ cause, time: quantity<Time>(value) })
  }
  line('saturated', terms.saturated * perTerm)
  line('substrate-short', terms.substrateShort * perTerm)
  line('product-inhibition', terms.productInhibition * perTerm)
  line('substrate-inhibition', terms.substrateInhibition * perTerm, rate.Ksi !== undefined)
  line('reversibility', reversible - sum, rate.Keq !== undefined)
  line('slow-fraction', atBest - reversible, slow !== undefined)
  line('pH', atSet - atBest)
  line('enzyme-loss', atOnce - atSet)
  line('heating', time - steady)
  line('staging', steady - atOnce)
  if (lines.some(({ time: t }) => !Number.isFinite(t))) return undefined
  const largest = lines
    .filter(({ cause, time: t }) => avoidable.has(cause) && t > 0.01 * time)
    .sort((a, b) => b.time - a.time)[0]
  return { total: quantity<Time>(time), lines, ...(largest && { largestAvoidable: largest.cause }) }
}

/** All substrate and product that had been supplied when the target was reached, as if charged at the start. */
function chargeOf({ batch: { feed, model } }: Solver, { end }: BatchRun): Charge {
  const { massYield } = model
  if (end.volume === feed.volume)
    return { S0: feed.substrate.concentration, P0: feed.product.concentration, massYield }
  const S0 = end.substrate / (1 - end.conversion)
  return { S0, P0: Math.max(0, end.product - massYield * end.conversion * S0), massYield }
}

/** The whole batch at the hold temperature from the first dose, everything given at once. */
function atOnceScenario(
  scenario: Scenario,
  charge: Charge,
  run: BatchRun,
  T: ReturnType<typeof holdTemperature>,
  pH: number | undefined,
): Scenario {
  const { feed } = scenario
  return constantly(
    {
      ...scenario,
      feed: {
        volume: quantity<Volume>(run.end.volume),
        substrate: { ...feed.substrate, concentration: quantity<Concentration>(charge.S0) },
        product: { ...feed.product, concentration: quantity<Concentration>(charge.P0) },
      },
    },
    { temperature: T, pH, dose: run.dosed },
  )
}

/** Time to a conversion when the last conditions go on: a comparison batch is not cut short by its programme. */
function endlessTimeTo(solver: Solver, conversion: number): number {
  const run = solver.answers({ doseScale: 1, target: conversion, endless: true })
  if (!run.ok || run.value.reachedAt === undefined) return Number.POSITIVE_INFINITY
  return run.value.reachedAt - run.value.firstDoseAt
}

/** How long each phase took in a run, s, the passed pieces of one phase together. */
function phaseDurations(run: BatchRun): ReadonlyMap<number, number> {
  const durations = new Map<number, number>()
  for (const { phase, from, to } of run.marks) durations.set(phase, (durations.get(phase) ?? 0) + to - from)
  return durations
}

/** The pH at which the undisturbed batch would be quickest; undefined without a pH effect. */
function bestPh(
  { batch: { model } }: Solver,

  total: (pH: number | undefined) => number | undefined,
): number | undefined {
  if (model.bestPh === undefined || !model.lawMovesWithPh) return model.bestPh
  return minimum((pH) => Math.log(total(pH) ?? Number.POSITIVE_INFINITY), 0, 14)?.at ?? model.bestPh
}
