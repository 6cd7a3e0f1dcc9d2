/** The hold temperature at which a batch is done soonest, or comes furthest within a time. */
import type { Warning } from '../answer.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import type { Ask, Scenario } from '../scenario.ts'
import { type Mass, quantity, type Temperature, type Time } from '../units/quantity.ts'
import { type AnswerBody, checkOfConversion, conditionWarnings, massBalanceOf, workOf } from './answers.ts'
import { bestTemperature, temperatureDifference } from './best-temperature.ts'
import { restingConversion } from './reach.ts'
import { reachabilityRemedies } from './remedies.ts'
import type { RouteFailure } from './route.ts'
import { solverOf } from './solver.ts'
import { atHoldTemperature, holdTemperature } from './variants.ts'

type TemperatureAsk = Extract<Ask, { find: 'temperature' }>

/** Two optima further apart than this, relative in K, are worth a warning: a hundredth of a kelvin. */
const agreement = 3e-5

/** Answers `find: temperature` of both kinds. */
export function findTemperature(scenario: Scenario, ask: TemperatureAsk): Outcome<AnswerBody, RouteFailure> {
  const [low, high] = ask.between
  const aim = ask.best === 'time' ? { conversion: ask.conversion } : { within: ask.within }
  const found = bestTemperature(scenario, aim, low, high)
  if (!found.ok) return failed(found.failure)
  const best = found.value
  if (!best) return never(scenario, ask.best === 'time' ? ask.conversion : 0, low, high)
  const temperature = quantity<Temperature>(best.at)
  const chosen = atHoldTemperature(scenario, temperature)
  const solver = solverOf(chosen)
  const run = solver.answers(
    ask.best === 'time'
      ? { doseScale: 1, target: ask.conversion, endless: false }
      : { doseScale: 1, until: solver.firstDoseAt + ask.within, endless: false },
  )
  if (!run.ok) return failed(run.failure)
  const check = {
    method: solver.checkMethod,
    relativeDifference: temperatureDifference(scenario, aim, best.at, low, high),
  }
  const warnings: Warning[] = [...conditionWarnings(chosen)]
  if (best.atBound) warnings.push({ code: 'optimum-at-bound', temperature })
  if (check.relativeDifference !== null && check.relativeDifference > agreement)
    warnings.push({ code: 'routes-disagree', relativeDifference: check.relativeDifference })
  const { reachedAt, firstDoseAt, end, dosed } = run.value
  return success({
    reachable: true,
    temperature,
    dose: quantity<Mass>(dosed),
    conversion: ask.best === 'time' ? ask.conversion : end.conversion,
    ...(reachedAt !== undefined && { time: quantity<Time>(reachedAt - firstDoseAt) }),
    check,
    work: workOf(run.value),
    massBalance: massBalanceOf([end]),
    warnings,
  })
}

/** No temperature between the bounds reaches the target: how far the best of them comes. */
function never(
  scenario: Scenario,
  conversion: number,
  low: number,
  high: number,
): Outcome<AnswerBody, RouteFailure> {
  let limit = 0
  for (let i = 0; i <= 32; i++) {
    const resting = restingConversion(solverOf(atHoldTemperature(scenario, low + ((high - low) * i) / 32)))
    if (resting.ok) limit = Math.max(limit, resting.value)
  }
  const kept = atHoldTemperature(scenario, Math.min(high, Math.max(low, holdTemperature(scenario.programme))))
  const solver = solverOf(kept)
  const ended = solver.answers({ doseScale: 1, endless: true })
  if (!ended.ok) return failed(ended.failure)
  const other = solver.checks({ doseScale: 1, endless: true })
  return success({
    reachable: false,
    limitingConversion: limit,
    check: checkOfConversion(
      solver,
      ended.value.end.conversion,
      other.ok ? other.value.end.conversion : null,
    ),
    remedies: reachabilityRemedies(kept, solver, conversion),
    work: other.ok ? workOf(ended.value, other.value) : ended.value.work,
    massBalance: massBalanceOf([ended.value.end]),
    warnings: conditionWarnings(scenario),
  })
}
