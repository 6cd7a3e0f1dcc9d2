/** One plan from one scenario: solved, checked and costed. */
import type { Answer, PlanFailure } from './answer.ts'
import { batchCost } from './cost/batch-cost.ts'
import { failed, type Outcome, success } from './outcome.ts'
import type { Scenario } from './scenario.ts'
import type { AnswerBody } from './solve/answers.ts'
import { findDose } from './solve/find-dose.ts'
import { findTemperature } from './solve/find-temperature.ts'
import { findTime } from './solve/find-time.ts'
import { findTrace } from './solve/find-trace.ts'
import { solverOf } from './solve/solver.ts'

/**
 * Answers what a scenario asks.
 *
 * Shapes   a scenario that passed validation; "cannot be reached" is an answer, not a failure.
 * Units    SI throughout.
 * Fails    an integration that gave up, by its name; `beyond-doubles` where the numbers leave what a double holds.
 */
export function plan(scenario: Scenario): Outcome<Answer, PlanFailure> {
  const { ask } = scenario
  const body = answerTo(scenario)
  if (!body.ok) return failed(named(body.failure))
  const answer = costed(scenario, { ask, ...body.value })
  const lost = notFinite(answer)
  return lost === undefined ? success(answer) : failed({ kind: 'beyond-doubles', what: lost })
}

function answerTo(scenario: Scenario): Outcome<AnswerBody, PlanFailure> {
  const { ask } = scenario
  switch (ask.find) {
    case 'time':
      return findTime(scenario, solverOf(scenario), ask.conversion)
    case 'dose':
      return findDose(scenario, solverOf(scenario), ask.conversion, ask.within)
    case 'temperature':
      return findTemperature(scenario, ask)
    case 'trace':
      return findTrace(scenario, solverOf(scenario), ask.at)
  }
}

/** A failure whose moment is not a number is one of the numbers, not of the stepping. */
const named = (failure: PlanFailure): PlanFailure =>
  'time' in failure && !Number.isFinite(failure.time)
    ? { kind: 'beyond-doubles', what: 'the course of the batch' }
    : failure

function costed({ costs }: Scenario, answer: Answer): Answer {
  const { dose, time } = answer
  if (!costs || dose === undefined || time === undefined || !answer.reachable) return answer
  return { ...answer, cost: { value: batchCost(costs, dose, time), currency: costs.currency } }
}

/** The path of the first number in an answer that is not finite. */
function notFinite(value: unknown, path = ''): string | undefined {
  if (typeof value === 'number') return Number.isFinite(value) ? undefined : path
  if (value instanceof Float64Array) return value.every(Number.isFinite) ? undefined : path
  if (typeof value !== 'object' || value === null) return undefined
  for (const [key, part] of Object.entries(value)) {
    const lost = notFinite(part, path === '' ? key : `${path}.${key}`)
    if (lost !== undefined) return lost
  }
  return undefined
}
