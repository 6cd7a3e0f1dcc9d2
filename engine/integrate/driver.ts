import { failed, type Outcome, success } from '../outcome.ts'
import { firstStep } from './first-step.ts'
import { locate } from './locate.ts'
import type { Method } from './method.ts'
import type { Arrival, Control, IntegrationFailure, Problem, RateInto } from './problem.ts'
import { growth, LEAST_LOG_ERROR, shrinkage } from './step-size.ts'
import { createStiffnessWatch } from './stiffness.ts'

/** A step that leaves the domain of the rate is cut to this part of itself… */
const RETREAT = 0.1
/** …and this many cuts without getting past the place name the rate as not finite. */
const MOST_RETREATS = 12

/** A step that would leave less than this part of itself to the end goes to the end. */
const STRETCH = 1 + 1e-10

const SMALLEST_STEP = 4 * Number.EPSILON

const NO_OUTPUTS = new Float64Array(0)

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
  const fNext = new Float64Array(size)
  const scratch = new Float64Array(size)
  const stiffness = createStiffnessWatch()

  return (problem, control, explicit, implicit) => {
    const { rate, start, end, event } = problem
    const { relative, absolute, maxSteps } = control
    const times = problem.outputs ?? NO_OUTPUTS
    const rows = times.length === 0 ? NO_OUTPUTS : new Float64Array(times.length * size)
    const automatic = control.method === undefined || control.method === 'automatic'
    let method = control.method === 'implicit' ? implicit() : explicit
    method.adopt(rate, relative, absolute)
    stiffness.reset()
    y.set(problem.initial)
    let t = start
    let row = 0
    let accepted = 0
    let rejected = 0
    // What the driver evaluates itself, and what methods no longer in use have evaluated.
    let evaluations = 0
    let step = 0

    const arrive = (time: number, state: Float64Array, atEvent: boolean): Outcome<Arrival, never> =>
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
          jacobians: method.jacobians,
        },
      })
    const reached = () => ({ time: t, state: y.slice() })

    let level = 1
    if (event !== undefined) {
      level = event(t, y)
      if (Number.isNaN(level)) throw new RangeError('the event is not a number at the start')
    }
    while (row < times.length && (times[row] as number) <= t) rows.set(y, size * row++)
    if (start === end || level <= 0) return arrive(t, y, level <= 0)

    rate(f, y, t)
    evaluations++
    if (!allFinite(f)) {
      return failed({ kind: 'rate-not-finite', time: t, component: firstBad(f), reached: reached() })
    }
    step = control.firstStep ?? 0
    if (!(step > 0)) {
      step = firstStep(rate, t, end - start, y, f, relative, absolute, method.exponent, scratch, fNext)
      evaluations++
    }

    let logBefore = LEAST_LOG_ERROR
    let retreats = 0
    let retreatedFrom = 0
    let rejectedLast = false
    for (;;) {
      if (accepted + rejected >= maxSteps) {
        return failed({ kind: 'too-many-steps', time: t, taken: accepted + rejected, reached: reached() })
      }
      const final = t + step * STRETCH >= end
      const h = final ? end - t : step
      const tNext = final ? end : t + h
      if (h <= SMALLEST_STEP * Math.abs(t) || tNext === t) {
        if (retreats === 0) return failed({ kind: 'step-too-small', time: t, reached: reached() })
        return failed({
          kind: 'rate-not-finite',
          time: tNext,
          component: blame(rate, method, t, h, y, f, fNext),
          reached: reached(),
        })
      }

      const error = method.attempt(t, h, y, f)
      const next = method.next
      let good = error <= 1
      let finite = error < Number.POSITIVE_INFINITY
      let levelNext = 1
      let stops = false
      if (good) {
        if (event !== undefined) {
          levelNext = event(tNext, next)
          stops = !(levelNext > 0)
        }
        const due = row < times.length && (times[row] as number) <= tNext
        if (!final || stops || due) {
          rate(fNext, next, tNext)
          evaluations++
          finite = allFinite(fNext)
          good = finite
        }
        if (good) {
          accepted++
          let arrival = tNext
          let state = next
          if (stops || (due && !(final && times[row] === tNext))) method.settle(fNext)
          if (stops) {
            const theta = locate(event as NonNullable<typeof event>, method, t, h, level, levelNext, scratch)
            arrival = theta === 1 ? tNext : t + theta * h
            f.set(scratch)
            state = f
          }
          while (row < times.length && (times[row] as number) <= arrival) {
            const theta = ((times[row] as number) - t) / h
            if ((times[row] as number) === arrival) rows.set(state, size * row)
            else {
              method.at(theta, scratch)
              rows.set(scratch, size * row)
            }
            row++
          }
          const logError = error > 1e-4 ? Math.log(error) : LEAST_LOG_ERROR
          let proposal = h * growth(logError, logBefore, method.exponent, method.memory)
          logBefore = logError
          if (rejectedLast && proposal > h) proposal = h
          if (final && proposal < step) proposal = step
          step = proposal
          if (stops || final) return arrive(arrival, state, stops)
          if (h >= retreatedFrom) {
            retreats = 0
            retreatedFrom = 0
          }
          rejectedLast = false
          if (automatic && method === explicit && stiffness.due(accepted)) {
            if (stiffness.confirms(method.strain(fNext))) {
              evaluations += method.rateEvaluations
              method = implicit()
              method.adopt(rate, relative, absolute)
            }
          }
          t = tNext
          level = levelNext
          for (let i = 0; i < size; i++) {
            y[i] = next[i] as number
            f[i] = fNext[i] as number
          }
          continue
        }
      }
      rejected++
      rejectedLast = true
      if (finite) step = h * shrinkage(error, method.exponent)
      else {
        if (retreats === 0) retreatedFrom = h
        retreats++
        if (retreats > MOST_RETREATS) {
          return failed({
            kind: 'rate-not-finite',
            time: tNext,
            component: blame(rate, method, t, h, y, f, fNext),
            reached: reached(),
          })
        }
        step = h * RETREAT
      }
    }
  }
}

const allFinite = (values: Float64Array): boolean => {
  // The sum of finite numbers may overflow, but never the sum of their zeroes.
  let sum = 0
  for (let i = 0; i < values.length; i++) sum += 0 * (values[i] as number)
  return sum === 0
}

const firstBad = (values: Float64Array): number => values.findIndex((value) => !Number.isFinite(value))

/** The component that stopped being finite a step ahead. */
const blame = (
  rate: RateInto,
  method: Method,
  t: number,
  h: number,
  y: Float64Array,
  f: Float64Array,
  ahead: Float64Array,
): number => {
  const moved = y.map((value, i) => value + h * (f[i] as number))
  rate(ahead, moved, t + h)
  const named = firstBad(ahead)
  return named >= 0 ? named : Math.max(0, firstBad(method.next))
}
