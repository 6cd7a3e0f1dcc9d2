/** What every answer is built from: the check, the work, the balance, the warnings that any ask may raise. */
import type { Answer, Check, HoursLedger, Warning, Work } from '../answer.ts'
import type { Outcome } from '../outcome.ts'
import type { Scenario } from '../scenario.ts'
import { quantity, type Temperature, type Time } from '../units/quantity.ts'
import { measuredAt } from './enzyme-model.ts'
import { honestDigits } from './reach.ts'
import type { BatchRun, BatchState, RouteFailure } from './route.ts'
import type { Solver } from './solver.ts'
import { holdTemperature } from './variants.ts'

/** An answer without the ask it belongs to. */
export type AnswerBody = Omit<Answer, 'ask'>

/** Two routes further apart than this, relative, are worth a warning. */
const agreement = 1e-6
/** Further than this from the temperature of measurement an Arrhenius law is a guess; common practice. */
const farFromMeasured = 25

/** Compares two numbers that should be one. */
export function checkOf(solver: Solver, answer: number, other: number | null): Check {
  const scale = Math.max(Math.abs(answer), 1e-300)
  return {
    method: solver.checkMethod,
    relativeDifference: other === null ? null : Math.abs(other - answer) / scale,
  }
}

/** Stepping knows the substrate, not what little of it was converted; below this the difference is of this. */
const leastConversion = 0.1

/** Compares two conversions that should be one. */
export function checkOfConversion(solver: Solver, answer: number, other: number | null): Check {
  const scale = Math.max(Math.abs(answer), leastConversion)
  return {
    method: solver.checkMethod,
    relativeDifference: other === null ? null : Math.abs(other - answer) / scale,
  }
}

/** Warnings about the check. */
export function checkWarnings(check: Check, factor = 1): Warning[] {
  const { relativeDifference } = check
  if (relativeDifference === null) return []
  return relativeDifference > agreement * Math.max(1, factor)
    ? [{ code: 'routes-disagree', relativeDifference }]
    : []
}

/** Magnification of errors above which an answer hangs on the edge of reachability. */
const edge = 1e3

/** The warning that few digits are left, if so. */
export const edgeWarnings = (amplification: number | undefined): Warning[] =>
  amplification !== undefined && amplification > edge
    ? [{ code: 'near-the-edge', amplification, digits: honestDigits(amplification) }]
    : []

/** Warns where the target is met before all of the feed is in, and feeding takes the conversion down again. */
export function feedWarnings({ batch }: Solver, reachedAt: number, whole: BatchRun | undefined): Warning[] {
  const { steps } = batch.timeline
  const fed = new Set(steps.flatMap((step) => (step.kind === 'run' && step.feed ? [step.phase] : [])))
  const end =
    whole?.marks.reduce((last, mark) => (fed.has(mark.phase) ? Math.max(last, mark.to) : last), 0) ?? 0
  return end > reachedAt ? [{ code: 'fed-after-target', until: quantity<Time>(end - reachedAt) }] : []
}

/** The warning that the hours could not be split, if so. */
export const hoursWarnings = (hours: HoursLedger | undefined, { programme }: Scenario): Warning[] =>
  hours ? [] : [{ code: 'hours-not-split', temperature: holdTemperature(programme) }]

/** The warning that the checking route gave up, if it did. */
export const gaveUp = (route: Outcome<unknown, RouteFailure>): Warning[] =>
  route.ok ? [] : [{ code: 'check-failed', failure: route.failure.kind }]

/** Warnings about the conditions. */
export function conditionWarnings(scenario: Scenario): Warning[] {
  const measured = measuredAt(scenario.enzyme.rate).temperature
  const used = holdTemperature(scenario.programme)
  return Math.abs(used - measured) > farFromMeasured
    ? [{ code: 'far-from-measured', measured, used: quantity<Temperature>(used) }]
    : []
}

/** Largest relative drift of substrate + product/yield over the states of a batch. */
export const massBalanceOf = (states: readonly BatchState[]): number =>
  states.reduce((worst, { imbalance }) => Math.max(worst, Math.abs(imbalance)), 0)

/** Work of several runs together. */
export const workOf = (...runs: readonly { readonly work: Work }[]): Work =>
  runs.reduce<Work>(
    (sum, { work }) => ({
      stepsAccepted: sum.stepsAccepted + work.stepsAccepted,
      stepsRejected: sum.stepsRejected + work.stepsRejected,
      rateEvaluations: sum.rateEvaluations + work.rateEvaluations,
      jacobians: sum.jacobians + work.jacobians,
    }),
    { stepsAccepted: 0, stepsRejected: 0, rateEvaluations: 0, jacobians: 0 },
  )
