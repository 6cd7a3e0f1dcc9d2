/** The course of a batch at asked times. */
import type { Trace } from '../answer.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import type { Scenario } from '../scenario.ts'
import {
  type AnswerBody,
  checkWarnings,
  conditionWarnings,
  gaveUp,
  massBalanceOf,
  workOf,
} from './answers.ts'
import { killStepOf } from './kill-step.ts'
import { sameMoment } from './march.ts'
import type { BatchRun, BatchState, RouteFailure } from './route.ts'
import type { Solver } from './solver.ts'

/** Answers `find: trace`; times count from the programme's start, in the order asked. */
export function findTrace(
  scenario: Scenario,
  solver: Solver,
  at: readonly number[],
): Outcome<AnswerBody, RouteFailure> {
  const order = at.map((_, i) => i).sort((a, b) => (at[a] as number) - (at[b] as number))
  const outputs = order.map((i) => at[i] as number)
  const request = { doseScale: 1, outputs, endless: true, until: outputs[outputs.length - 1] ?? 0 }
  const run = solver.answers(request)
  if (!run.ok) return failed(run.failure)
  const checked = solver.checks(request)
  const states = run.value.outputs
  const check = {
    method: solver.checkMethod,
    relativeDifference: checked.ok ? difference(scenario, solver, run.value, checked.value) : null,
  }
  const whole = solver.batch.timeline.endless ? undefined : solver.answers({ doseScale: 1, endless: false })
  const killStep = whole?.ok ? killStepOf(scenario, solver, whole.value) : undefined
  return success({
    reachable: true,
    trace: columns(states, order, at),
    ...(killStep && { killStep }),
    check,
    work: checked.ok ? workOf(run.value, checked.value) : run.value.work,
    massBalance: massBalanceOf([...states, ...(checked.ok ? checked.value.outputs : [])]),
    warnings: [...conditionWarnings(scenario), ...gaveUp(checked), ...checkWarnings(check, 10)],
  })
}

/** Largest difference of two courses: substrate to a millionth of the charge, enzyme to 1e-5 of the dose. */
function difference({ feed }: Scenario, solver: Solver, answer: BatchRun, check: BatchRun): number {
  const leastS = 1e-6 * feed.substrate.concentration
  const leastE = (1e-5 * solver.fullDose) / feed.volume
  const waits = solver.batch.timeline.steps.some((step) => step.kind === 'run' && step.until !== undefined)
  let worst = 0
  answer.outputs.forEach((x, i) => {
    const y = check.outputs[i]
    // Where a hold waits for a conversion, the two routes put what follows a hair apart.
    const jumping = check.marks.some(({ to }) => Math.abs(to - x.time) <= sameMoment + 1e-7 * x.time)
    if (!y || (jumping && waits)) return
    worst = Math.max(
      worst,
      Math.abs(x.substrate - y.substrate) / Math.max(x.substrate, leastS),
      Math.abs(x.enzyme - y.enzyme) / Math.max(x.enzyme, leastE),
    )
  })
  return worst
}

/** Sorted states back in the order asked, as columns. */
function columns(states: readonly BatchState[], order: readonly number[], at: readonly number[]): Trace {
  const n = at.length
  const column = (): Float64Array => new Float64Array(n)
  const trace = {
    time: column(),
    substrate: column(),
    product: column(),
    enzyme: column(),
    temperature: column(),
    volume: column(),
    conversion: column(),
  }
  const pH = column()
  let knowsPh = true
  states.forEach((state, rank) => {
    const i = order[rank] as number
    trace.time[i] = at[i] as number
    trace.substrate[i] = state.substrate
    trace.product[i] = state.product
    trace.enzyme[i] = state.enzyme
    trace.temperature[i] = state.temperature
    trace.volume[i] = state.volume
    trace.conversion[i] = state.conversion
    if (state.pH === undefined) knowsPh = false
    else pH[i] = state.pH
  })
  return knowsPh ? { ...trace, pH } : trace
}
