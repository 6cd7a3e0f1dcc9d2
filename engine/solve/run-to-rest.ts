/** Integrates one run of a programme in legs: after each, what has come to rest is not stepped on with. */
import type { Work } from '../answer.ts'
import type { Integrator } from '../integrate/integrator.ts'
import type { Control, RateInto } from '../integrate/problem.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import { patientRun, sumOfWork } from './patient-run.ts'
import { levelOf, type Rest, stillOf } from './rest.ts'
import type { RouteFailure } from './route.ts'

export interface Legs {
  readonly rate: RateInto
  /** s from the run's start */
  readonly from: number
  readonly end: number
  /** Above 0 until the target is reached; undefined without one. */
  readonly due: ((τ: number, y: ArrayLike<number>) => number) | undefined
  readonly moving: readonly Rest[]
  readonly outputs: readonly number[]
}

export interface Passage {
  readonly time: number
  readonly stopped: boolean
  readonly nextStep: number
  /** The states at those outputs that were reached. */
  readonly states: readonly Float64Array[]
  readonly work: Work
}

/** An event this near, in logarithms, has been met. */
const located = 1e-9
const none: Work = { stepsAccepted: 0, stepsRejected: 0, rateEvaluations: 0, jacobians: 0 }
const never = (): number => Number.POSITIVE_INFINITY

/**
 * Takes `state` along to the end or to the target.
 *
 * Fails    as integration does; rate-not-finite where the state is not a number.
 */
export function runToRest(
  integrator: Integrator,
  state: Float64Array,
  { rate, from, end, due: target = never, moving: parts, outputs }: Legs,
  firstControl: Control,
): Outcome<Passage, RouteFailure> {
  const resting: Rest[] = []
  const states: Float64Array[] = []
  let due = target
  let moving = parts
  let control = firstControl
  let time = from
  let work = none
  let near = located
  for (;;) {
    if (Number.isNaN(Math.min(due(time, state), levelOf(moving, state))))
      return failed({ kind: 'rate-not-finite', time, component: 0, reached: { time, state } })
    const start = time
    const wanted = outputs.slice(states.length)
    const arrival = patientRun(
      integrator,
      {
        rate: stillOf(rate, resting),
        start,
        end,
        initial: state,
        event: (τ, y) => Math.min(due(τ, y), levelOf(moving, y)),
        ...(wanted.length > 0 && {
          outputs: Float64Array.from(wanted, (τ) => Math.min(end, Math.max(start, τ))),
        }),
      },
      control,
    )
    if (!arrival.ok) return failed(arrival.failure)
    const { event, nextStep, outputs: rows, outputsReached } = arrival.value
    work = sumOfWork(work, arrival.value.work)
    for (let i = 0; i < outputsReached; i++)
      states.push(rows.subarray(i * state.length, (i + 1) * state.length))
    state.set(arrival.value.state)
    time = arrival.value.time
    const passage = { time, nextStep, states, work }
    if (!event) return success({ ...passage, stopped: false })
    const level = levelOf(moving, state)
    if (due(time, state) <= Math.min(near, level)) return success({ ...passage, stopped: true })
    // An event inside a step of many ages is met only nearly: step on to it from there.
    const rest = level <= near ? moving.find((one) => one.level(state) === level) : undefined
    control = { ...control, firstStep: 0 }
    if (rest === undefined) {
      near *= 10
      if (!(near < 1e30)) return failed({ kind: 'step-too-small', time, reached: { time, state } })
      continue
    }
    rest.settle(state)
    resting.push(rest)
    moving = moving.filter(({ components }) => components[0] !== rest.components[0])
    if (rest.components[0] === 0) due = never
  }
}
