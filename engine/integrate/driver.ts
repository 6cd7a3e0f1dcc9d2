import { failed, type Outcome, success } from '../outcome.ts'
import { allFinite, firstNotFinite } from './finite.ts'
import { firstStep } from './first-step.ts'
import { locate } from './locate.ts'
import type { Method } from './method.ts'
import type { Arrival, Control, IntegrationFailure, Problem } from './problem.ts'
import { growth, LEAST_LOG_ERROR, shrinkage } from './step-size.ts'
import { createStiffnessWatch } from './stiffness.ts'

/** A step that leaves the domain of the rate is cut to this part of itself… */
const RETREAT = 0.1
/** …and this many cuts without getting past the place name the rate as not finite. */
const MOST_RETREATS = 40

/** A step that would stop this little of itself short of the end goes to the end. */
const STRETCH = 1 + 1e-10

/** Of the time reached: shorter steps are lost in its round-off. */
const SMALLEST_STEP = 4 * Number.EPSILON

/** After so many implicit steps, the explicit method is taken back if its steps were longer. */
const TRIAL = 20

const NO_OUTPUTS = new Float64Array(0)
const NEVER = (): number => 1

type Drive = (
  problem: Problem,
  control: Control,
  explicit: Method,
  implicit: () => Method,
) => Outcome<Arrival, IntegrationFailure>

/**
 * Makes the one loop that owns time, events and outputs, whatever the method.
 *
 * Shapes   workspace for problems of `size` components, reused by every run.
 */
export const createDriver = (size: number): Drive => {
  const y = new Float64Array(size)
  const f = new Float64Array(size)
  const scratch = new Float64Array(size)
  const trialRate = new Float64Array(size)
  const stiffness = createStiffnessWatch()

  return (problem, control, explicit, implicit) => {
    const { rate, start, end, event = NEVER } = problem
    const { relative, absolute, maxSteps } = control
    const times = problem.outputs ?? NO_OUTPUTS
    const rows = times.length === 0 ? NO_OUTPUTS : new Float64Array(times.length * size)
    let automatic = control.method === undefined || control.method === 'automatic'
    let method = control.method === 'implicit' ? implicit() : explicit
    method.adopt(rate, relative, absolute)
    stiffness.reset()
    for (let i = 0; i < size; i++) y[i] = problem.initial[i] as number
    let t = start
    let row = 0
    let step = 0
    let accepted = 0
    let rejected = 0
    // What the driver evaluates itself, and what a method no longer in use has evaluated.
    let evaluations = 0
    let jacobians = 0

    const arrive = (time: number, state: Float64Array, atEvent: boolean) =>
      success({
        time,
        state: state.slice(),
        event: atEvent,
        outputs: rows,
        outputsReached: row,
        nextStep: step,
        work: {
          stepsAccepted: accepted,
          stepsRejected: rejected,
          rateEvaluations: evaluations + method.rateEvaluations,
          jacobians: jacobians + method.jacobians,
        },
      })
    const change = (to: Method) => {
      evaluations += method.rateEvaluations
      jacobians += method.jacobians
      method = to
      method.adopt(rate, relative, absolute)
    }
    const reached = () => ({ time: t, state: y.slice() })
    const notFinite = (h: number) => {
      // The component that stops being finite where the step was to lead.
      for (let i = 0; i < size; i++) scratch[i] = (y[i] as number) + h * (f[i] as number)
      rate(trialRate, scratch, t + h)
      const ahead = firstNotFinite(trialRate)
      const component = ahead >= 0 ? ahead : Math.max(firstNotFinite(method.next), 0)
      return failed({ kind: 'rate-not-finite', time: t + h, component, reached: reached() } as const)
    }

    let level = event(t, y)
    if (Number.isNaN(level)) throw new RangeError('the event is not a number at the start')
    while (row < times.length && (times[row] as number) <= t) rows.set(y, size * row++)
    if (start === end || level <= 0) return arrive(t, y, level <= 0)

    rate(f, y, t)
    evaluations++
    if (!allFinite(f)) {
      return failed({ kind: 'rate-not-finite', time: t, component: firstNotFinite(f), reached: reached() })
    }
    step = control.firstStep ?? 0
    if (!(step > 0)) {
      step = firstStep(rate, t, end - t, y, f, relative, absolute, method.exponent, scratch, trialRate)
      evaluations++
    }

    let logBefore = 0
    let retreats = 0
    let retreatedFrom = 0
    let rejectedLast = false
    let stepBefore = 0
    let tried = 0
    for (;;) {
      if (accepted + rejected >= maxSteps) {
        return failed({ kind: 'too-many-steps', time: t, taken: accepted + rejected, reached: reached() })
      }
      const final = t + step * STRETCH >= end
      const h = final ? end - t : step
      const tNext = final ? end : t + h
      if (h <= SMALLEST_STEP * Math.abs(t)) {
        if (retreats > 0) return notFinite(h)
        return failed({ kind: 'step-too-small', time: t, reached: reached() })
      }

      const error = method.attempt(t, h, y, f)
      if (!(error <= 1)) {
        rejected++
        rejectedLast = true
        if (error < Number.POSITIVE_INFINITY) step = h * shrinkage(error, method.exponent)
        else {
          if (retreats === 0) retreatedFrom = h
          if (++retreats > MOST_RETREATS) return notFinite(h)
          step = h * RETREAT
        }
        continue
      }

      accepted++
      const next = method.next
      const logError = error > 1e-4 ? Math.log(error) : LEAST_LOG_ERROR
      let proposal = h * growth(logError, logBefore, method.exponent, method.memory)
      if (rejectedLast && proposal > h) proposal = h
      // A step cut short by the end says nothing against the one that was to be taken.
      step = final && proposal < step ? step : proposal
      logBefore = logError
      rejectedLast = false

      const levelNext = event(tNext, next)
      const stops = !(levelNext > 0)
      if (stops || (row < times.length && (times[row] as number) <= tNext)) {
        method.settle()
        let arrival = tNext
        if (stops) {
          const theta = locate(event, method, t, h, level, levelNext, scratch)
          if (theta < 1) arrival = t + theta * h
        }
        while (row < times.length && (times[row] as number) <= arrival) {
          const due = times[row] as number
          method.at(due === tNext ? 1 : (due - t) / h, trialRate)
          rows.set(trialRate, size * row++)
        }
        if (stops) return arrive(arrival, scratch, true)
      }
      if (final) return arrive(end, next, false)

      if (h >= retreatedFrom) {
        retreats = 0
        retreatedFrom = 0
      }
      t = tNext
      level = levelNext
      const nextRate = method.nextRate
      for (let i = 0; i < size; i++) {
        y[i] = next[i] as number
        f[i] = nextRate[i] as number
      }
      if (automatic && method === explicit) {
        if (stiffness.due(accepted) && stiffness.confirms(method.strain())) {
          stepBefore = step
          change(implicit())
        }
      } else if (automatic && ++tried === TRIAL) {
        automatic = false
        if (step < stepBefore) change(explicit)
      }
    }
  }
}
