import { failed, type Outcome, success } from '../outcome.ts'
import { allFinite, firstNotFinite } from './finite.ts'
import { firstStep } from './first-step.ts'
import { locate } from './locate.ts'
import type { Method } from './method.ts'
import type { Arrival, Control, IntegrationFailure, Problem, RateInto } from './problem.ts'
import { growth, rootOf, shrinkage } from './step-size.ts'
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

  /** What the driver evaluated itself, and what a method no longer in use had evaluated. */
  const spent = { evaluations: 0, jacobians: 0 }

  // The loop below keeps its numbers to itself: those that a function inside it could see would live on the heap.
  const arrival = (
    time: number,
    state: Float64Array,
    event: boolean,
    outputs: Float64Array,
    outputsReached: number,
    nextStep: number,
    stepsAccepted: number,
    stepsRejected: number,
    method: Method,
  ) => {
    const rateEvaluations = spent.evaluations + method.rateEvaluations
    const jacobians = spent.jacobians + method.jacobians
    const work = { stepsAccepted, stepsRejected, rateEvaluations, jacobians }
    return success({ time, state: state.slice(), event, outputs, outputsReached, nextStep, work })
  }
  const retire = (method: Method): void => {
    spent.evaluations += method.rateEvaluations
    spent.jacobians += method.jacobians
  }
  const notFinite = (rate: RateInto, method: Method, t: number, h: number, retreatedFrom: number) => {
    // The component that stops being finite where the step was to lead, or a longer one before it.
    let ahead = -1
    for (let cuts = MOST_RETREATS; ahead < 0 && cuts >= 0; cuts--) {
      const reach = retreatedFrom * RETREAT ** cuts
      for (let i = 0; i < size; i++) scratch[i] = (y[i] as number) + reach * (f[i] as number)
      rate(trialRate, scratch, t + reach)
      ahead = firstNotFinite(trialRate)
    }
    const component = ahead >= 0 ? ahead : Math.max(firstNotFinite(method.next), 0)
    const reached = { time: t, state: y.slice() }
    return failed({ kind: 'rate-not-finite', time: t + h, component, reached } as const)
  }

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
    spent.evaluations = 0
    spent.jacobians = 0
    let t = start
    let row = 0
    let step = 0
    let accepted = 0
    let rejected = 0

    let level = event(t, y)
    if (Number.isNaN(level)) throw new RangeError('the event is not a number at the start')
    while (row < times.length && (times[row] as number) <= t) rows.set(y, size * row++)
    if (start === end || level <= 0)
      return arrival(t, y, level <= 0, rows, row, step, accepted, rejected, method)

    rate(f, y, t)
    spent.evaluations++
    if (!allFinite(f)) {
      const reached = { time: t, state: y.slice() }
      return failed({ kind: 'rate-not-finite', time: t, component: firstNotFinite(f), reached })
    }
    step = control.firstStep ?? 0
    if (!(step > 0)) {
      step = firstStep(rate, t, end - t, y, f, relative, absolute, method.exponent, scratch, trialRate)
      spent.evaluations++
    }

    let rootBefore = 1
    let hBefore = 0
    let retreats = 0
    let retreatedFrom = 0
    let rejectedLast = false
    let stepBefore = 0
    let tried = 0
    for (;;) {
      if (accepted + rejected >= maxSteps) {
        const reached = { time: t, state: y.slice() }
        return failed({ kind: 'too-many-steps', time: t, taken: accepted + rejected, reached })
      }
      const final = t + step * STRETCH >= end
      const h = final ? end - t : step
      const tNext = final ? end : t + h
      if (h <= SMALLEST_STEP * Math.abs(t)) {
        if (retreats > 0) return notFinite(rate, method, t, h, retreatedFrom)
        return failed({ kind: 'step-too-small', time: t, reached: { time: t, state: y.slice() } })
      }

      const attempted = method.attempt(t, h, y, f)
      const levelNext = attempted <= 1 ? event(tNext, method.next) : level
      // An event without bottom there, or none, says as little of where it was passed as such a rate would.
      const error = levelNext > Number.NEGATIVE_INFINITY ? attempted : Number.POSITIVE_INFINITY
      if (!(error <= 1)) {
        rejected++
        rejectedLast = true
        if (error < Number.POSITIVE_INFINITY) step = h * shrinkage(error, method.exponent)
        else {
          if (retreats === 0) retreatedFrom = h
          if (++retreats > MOST_RETREATS) return notFinite(rate, method, t, h, retreatedFrom)
          step = h * RETREAT
        }
        continue
      }

      accepted++
      const next = method.next
      const root = rootOf(error, method.exponent)
      let proposal = h * growth(root, rootBefore, hBefore > 0 ? h / hBefore : 0)
      if (rejectedLast && proposal > h) proposal = h
      // A step cut short by the end says nothing against the one that was to be taken.
      step = final && proposal < step ? step : proposal
      rootBefore = root
      hBefore = h
      rejectedLast = false

      const stops = levelNext <= 0
      if (stops || (row < times.length && (times[row] as number) <= tNext)) {
        method.settle()
        let reachedAt = tNext
        if (stops) {
          const theta = locate(event, method, t, h, level, levelNext, scratch)
          if (theta < 1) reachedAt = t + theta * h
        }
        while (row < times.length && (times[row] as number) <= reachedAt) {
          const due = times[row] as number
          method.at(due === tNext ? 1 : (due - t) / h, trialRate)
          rows.set(trialRate, size * row++)
        }
        if (stops) return arrival(reachedAt, scratch, true, rows, row, step, accepted, rejected, method)
      }
      if (final) return arrival(end, next, false, rows, row, step, accepted, rejected, method)

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
          retire(method)
          method = implicit()
          method.adopt(rate, relative, absolute)
        }
      } else if (automatic && ++tried === TRIAL) {
        automatic = false
        if (step < stepBefore) {
          retire(method)
          method = explicit
          method.adopt(rate, relative, absolute)
        }
      }
    }
  }
}
