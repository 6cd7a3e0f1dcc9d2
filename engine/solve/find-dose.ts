/** The dose with which a batch reaches its conversion within a time, all doses scaled by one factor. */
import { failed, type Outcome, success } from '../outcome.ts'
import type { Scenario } from '../scenario.ts'
import { type Mass, quantity, type Time } from '../units/quantity.ts'
import {
  type AnswerBody,
  checkOf,
  checkOfConversion,
  checkWarnings,
  conditionWarnings,
  edgeWarnings,
  feedWarnings,
  gaveUp,
  hoursWarnings,
  massBalanceOf,
  workOf,
} from './answers.ts'
import { checkedScale, doseScaleFor, leastDoseScale } from './dose.ts'
import { equilibriumBefore } from './equilibrium.ts'
import { hoursLedger } from './hours.ts'
import { killStepOf } from './kill-step.ts'
import { amplification, honestDigits, reach, restingConversion } from './reach.ts'
import { reachabilityRemedies, shorteningRemedies } from './remedies.ts'
import type { RouteFailure } from './route.ts'
import { type Solver, solverOf } from './solver.ts'
import { withoutInactivation } from './variants.ts'

/** Answers `find: dose`; the time counts from the first dose and ends with the programme at the latest. */
export function findDose(
  scenario: Scenario,
  solver: Solver,
  conversion: number,
  within: number,
): Outcome<AnswerBody, RouteFailure> {
  const until = solver.firstDoseAt + within
  const found = doseScaleFor(solver, conversion, until)
  if (!found.ok) return failed(found.failure)
  const least = solver.batch.timeline.endless ? leastDoseScale(solver, conversion) : success(null)
  if (!least.ok) return failed(least.failure)
  const leastDose = least.value === null ? {} : { leastDose: quantity<Mass>(least.value * solver.fullDose) }
  if (found.value.kind === 'none')
    return none(scenario, solver, conversion, until, found.value.limit, leastDose)
  const { scale, solver: dosed, reached } = justEnough(scenario, conversion, found.value.scale)
  if (!reached.ok) return failed(reached.failure)
  const { run } = reached.value
  // Under constant conditions the dose was sized for just this time, however ill-conditioned the way back is.
  const time = solver.batch.timeline.endless ? within : Math.min(within, reached.value.time ?? within)
  const check = checkOf(solver, scale, checkedScale(solver, conversion, until, scale))
  const factor = amplification(dosed, { run, time }, conversion)
  const whole = dosed.batch.timeline.endless ? undefined : dosed.answers({ doseScale: 1, endless: false })
  const killStep = whole?.ok ? killStepOf(scenario, dosed, whole.value) : undefined
  const hours = hoursLedger(withDoses(scenario, scale), dosed, conversion, run, time)
  return success({
    reachable: true,
    dose: quantity<Mass>(scale * solver.fullDose),
    time: quantity<Time>(time),
    conversion,
    ...leastDose,
    ...(killStep && { killStep }),
    check,
    ...(factor !== undefined && { precision: { amplification: factor, digits: honestDigits(factor) } }),
    ...(hours && { hours }),
    remedies: shorteningRemedies(withDoses(scenario, scale), dosed, conversion, time),
    work: workOf(run),
    massBalance: massBalanceOf([run.end]),
    warnings: [
      ...conditionWarnings(scenario),
      ...checkWarnings(check),
      ...edgeWarnings(factor),
      ...hoursWarnings(hours, scenario),
      ...feedWarnings(dosed, run.end.time, whole?.ok ? whole.value : undefined),
    ],
  })
}

/** Round-off may leave the target a hair beyond the dose sized for it: the dose is then raised by as little. */
function justEnough(scenario: Scenario, conversion: number, exact: number) {
  for (let excess = 0; ; excess = excess === 0 ? 1e-15 : 10 * excess) {
    const scale = exact * (1 + excess)
    const solver = solverOf(withDoses(scenario, scale))
    const reached = reach(solver, conversion)
    if (excess > 1e-8 || !reached.ok || reached.value.time !== undefined) return { scale, solver, reached }
  }
}

/** No dose does it: the equilibrium stands before the target, or the programme ends too soon for any dose. */
function none(
  scenario: Scenario,
  solver: Solver,
  conversion: number,
  until: number,
  limit: number,
  leastDose: Partial<AnswerBody>,
): Outcome<AnswerBody, RouteFailure> {
  const equilibriumConversion = equilibriumBefore(solver.batch, conversion)
  const beyond = equilibriumConversion !== undefined
  // A stable enzyme comes to the same equilibrium by steps; where the programme ends, both routes are asked.
  const stated = beyond ? solverOf(withoutInactivation(scenario)) : solver
  const request = beyond ? { doseScale: 1, endless: true } : { doseScale: 1, endless: false, until }
  const ended = stated.answers(request)
  if (!ended.ok) return failed(ended.failure)
  const other = stated.checks(request)
  const resting = beyond ? success(limit) : restingConversion(solver)
  if (!resting.ok) return failed(resting.failure)
  const answer = beyond ? limit : ended.value.end.conversion
  const check = checkOfConversion(solver, answer, other.ok ? other.value.end.conversion : null)
  return success({
    reachable: false,
    conversion: limit,
    limitingConversion: resting.value,
    ...leastDose,
    check,
    remedies: reachabilityRemedies(scenario, solver, conversion),
    work: other.ok ? workOf(ended.value, other.value) : ended.value.work,
    massBalance: massBalanceOf([ended.value.end]),
    warnings: [
      ...conditionWarnings(scenario),
      ...gaveUp(other),
      ...checkWarnings(check),
      ...(beyond ? [{ code: 'beyond-equilibrium', equilibriumConversion } as const] : []),
    ],
  })
}

/** The scenario with every dose times a factor. */
export function withDoses(scenario: Scenario, scale: number): Scenario {
  const { programme } = scenario
  if (programme.kind === 'constant')
    return { ...scenario, programme: { ...programme, dose: quantity<Mass>((programme.dose ?? 1) * scale) } }
  return {
    ...scenario,
    programme: {
      ...programme,
      phases: programme.phases.map((phase) =>
        phase.phase === 'dose' ? { ...phase, amount: quantity<Mass>(phase.amount * scale) } : phase,
      ),
    },
  }
}
