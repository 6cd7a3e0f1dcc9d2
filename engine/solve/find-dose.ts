/** The dose with which a batch reaches its conversion within a time, all doses scaled by one factor. */
import type { Warning } from '../answer.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import type { Scenario } from '../scenario.ts'
import { type Mass, quantity, type Time } from '../units/quantity.ts'
import {
  type AnswerBody,
  checkOf,
  checkWarnings,
  conditionWarnings,
  killStepOf,
  massBalanceOf,
  workOf,
} from './answers.ts'
import { checkedScale, doseScaleFor, leastDoseScale } from './dose.ts'
import { equilibriumBefore } from './equilibrium.ts'
import { hoursLedger } from './hours.ts'
import { amplification, honestDigits, reach } from './reach.ts'
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
  const warnings: Warning[] = [...conditionWarnings(scenario)]
  if (found.value.kind === 'none') {
    const { limit } = found.value
    const equilibriumConversion = equilibriumBefore(solver.batch, conversion)
    if (equilibriumConversion !== undefined)
      warnings.push({ code: 'beyond-equilibrium', equilibriumConversion })
    // A stable enzyme comes to the same equilibrium, by steps as by the closed form.
    const ended = solverOf(withoutInactivation(scenario)).checks({ doseScale: 1, endless: true })
    return success({
      reachable: false,
      limitingConversion: limit,
      ...leastDose,
      check: checkOf(solver, limit, ended.ok ? ended.value.end.conversion : null),
      remedies: reachabilityRemedies(scenario, solver, conversion),
      work: ended.ok
        ? ended.value.work
        : { stepsAccepted: 0, stepsRejected: 0, rateEvaluations: 0, jacobians: 0 },
      massBalance: ended.ok ? massBalanceOf([ended.value.end]) : 0,
      warnings,
    })
  }
  const { scale } = found.value
  const check = checkOf(solver, scale, checkedScale(solver, conversion, until, scale))
  warnings.push(...checkWarnings(check))
  const dosed = solverOf(withDoses(scenario, scale))
  const reached = reach(dosed, conversion)
  if (!reached.ok) return failed(reached.failure)
  // Round-off may leave the target a hair beyond the moment it was sized for.
  const ended = dosed.answers({ doseScale: 1, until, endless: false })
  if (!ended.ok) return failed(ended.failure)
  const soon = reached.value.time !== undefined && reached.value.time < within
  const run = soon ? reached.value.run : ended.value
  const time = soon ? (reached.value.time ?? within) : ended.value.end.time - ended.value.firstDoseAt
  const factor = amplification(dosed, { run, time }, conversion)
  const whole = dosed.answers({ doseScale: 1, endless: false })
  const killStep = !solver.batch.timeline.endless && whole.ok ? killStepOf(scenario, whole.value) : undefined
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
    warnings,
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
