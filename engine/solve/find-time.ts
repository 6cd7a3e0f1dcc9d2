/** How long a stated plan takes to its conversion, and what stands in its way if it never gets there. */

import type { Check, Warning } from '../answer.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import type { Scenario } from '../scenario.ts'
import { type Mass, quantity, type Temperature, type Time } from '../units/quantity.ts'
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
import { leastDoseScale } from './dose.ts'
import { equilibriumBefore } from './equilibrium.ts'
import { hoursLedger } from './hours.ts'
import { killStepOf } from './kill-step.ts'
import { timeByQuadrature } from './protected-batch.ts'
import { amplification, honestDigits, reach, restingConversion } from './reach.ts'
import { reachabilityRemedies, shorteningRemedies } from './remedies.ts'
import type { RouteFailure } from './route.ts'
import type { Solver } from './solver.ts'

/** A time above this is warned about, s: a year. */
const year = 365.25 * 86400
/** Active enzyme above this share of the charge after a kill step is worth a warning; common practice. */
const killed = 0.01

/** Answers `find: time`. */
export function findTime(
  scenario: Scenario,
  solver: Solver,
  conversion: number,
): Outcome<AnswerBody, RouteFailure> {
  const reached = reach(solver, conversion)
  if (!reached.ok) return failed(reached.failure)
  const { run, time } = reached.value
  const least = solver.batch.timeline.endless ? leastDoseScale(solver, conversion) : success(null)
  if (!least.ok) return failed(least.failure)
  const leastDose = least.value === null ? {} : { leastDose: quantity<Mass>(least.value * solver.fullDose) }
  const whole = solver.batch.timeline.endless ? undefined : solver.answers({ doseScale: 1, endless: false })
  const killStep = whole?.ok ? killStepOf(scenario, solver, whole.value) : undefined
  const warnings: Warning[] = [...conditionWarnings(scenario)]
  if (killStep && killStep.residualActivity > killed)
    warnings.push({ code: 'kill-step-incomplete', residualActivity: killStep.residualActivity })
  const shared = { ...leastDose, ...(killStep && { killStep }) }
  if (time === undefined) return unreachable(scenario, solver, conversion, warnings, shared)

  const checked = reach(solver, conversion, 1, solver.checks)
  const integrated = timeByQuadrature(solver.batch, conversion)
  const check: Check =
    integrated === undefined
      ? checkOf(solver, time, checked.ok ? (checked.value.time ?? null) : null)
      : { ...checkOf(solver, time, integrated), method: 'quadrature' }
  const factor = amplification(solver, reached.value, conversion)
  warnings.push(...(integrated === undefined ? gaveUp(checked) : []), ...checkWarnings(check, factor))
  const digits = factor === undefined ? undefined : honestDigits(factor)
  warnings.push(
    ...edgeWarnings(factor),
    ...feedWarnings(solver, run.end.time, whole?.ok ? whole.value : undefined),
  )
  const { programme } = scenario
  if (programme.kind === 'constant' && programme.hold !== undefined && programme.hold < time)
    warnings.push({ code: 'hold-shorter-than-time', hold: programme.hold, time: quantity<Time>(time) })
  if (time > year) warnings.push({ code: 'very-long', time: quantity<Time>(time) })
  const hours = hoursLedger(scenario, solver, conversion, run, time)
  warnings.push(...hoursWarnings(hours, scenario))
  return success({
    reachable: true,
    time: quantity<Time>(time),
    conversion,
    dose: quantity<Mass>(solver.fullDose),
    temperature: quantity<Temperature>(run.end.temperature),
    ...shared,
    check,
    ...(factor !== undefined && digits !== undefined && { precision: { amplification: factor, digits } }),
    ...(hours && { hours }),
    remedies: shorteningRemedies(scenario, solver, conversion, time),
    work: checked.ok ? workOf(run, checked.value.run) : run.work,
    massBalance: massBalanceOf([run.end, ...(checked.ok ? [checked.value.run.end] : [])]),
    warnings,
  })
}

function unreachable(
  scenario: Scenario,
  solver: Solver,
  conversion: number,
  warnings: Warning[],
  shared: Partial<AnswerBody>,
): Outcome<AnswerBody, RouteFailure> {
  const resting = restingConversion(solver)
  if (!resting.ok) return failed(resting.failure)
  const ended = solver.answers({ doseScale: 1, endless: false })
  if (!ended.ok) return failed(ended.failure)
  const ending = solver.checks({ doseScale: 1, endless: false })
  const atEnd = ended.value.end.conversion
  const check = checkOfConversion(solver, atEnd, ending.ok ? ending.value.end.conversion : null)
  warnings.push(...gaveUp(ending), ...checkWarnings(check))
  const equilibriumConversion = equilibriumBefore(solver.batch, conversion)
  if (equilibriumConversion !== undefined)
    warnings.push({ code: 'beyond-equilibrium', equilibriumConversion })
  return success({
    reachable: false,
    conversion: atEnd,
    limitingConversion: resting.value,
    ...shared,
    check,
    remedies: reachabilityRemedies(scenario, solver, conversion),
    work: ending.ok ? workOf(ended.value, ending.value) : ended.value.work,
    massBalance: massBalanceOf([ended.value.end, ...(ending.ok ? [ending.value.end] : [])]),
    warnings,
  })
}
