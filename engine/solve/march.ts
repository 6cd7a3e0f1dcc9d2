/**
 * Takes a batch through the steps of a programme: doses, pieces, conditional holds, wanted times. How a piece is
 * passed is the mover's business.
 */
import type { Work } from '../answer.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import type { Batch, BatchRun, BatchState, PhaseMark, RouteFailure, RunRequest } from './route.ts'
import type { Run } from './timeline.ts'

/** A batch in motion; `advance` mutates it. */
export interface Mover {
  readonly dose: (mass: number) => void
  /**
   * Passes `length` s of a run, or less if the conversion `stopAt` is reached within; `outputs` are times from the
   * run's start. Ends at Infinity in the state of rest.
   */
  readonly advance: (
    run: Run,
    length: number,
    stopAt: number | undefined,
    outputs: readonly number[],
  ) => Outcome<Advance, RouteFailure>
  /** Whether a conversion has been reached. */
  readonly reached: (conversion: number) => boolean
  /** kg of active preparation */
  readonly activeEnzyme: () => number
  readonly state: (time: number, run: Run, elapsed: number) => BatchState
  readonly work: () => Work
}

export interface Advance {
  /** s */
  readonly elapsed: number
  readonly stopped: boolean
  /** States at those `outputs` that are not later than `elapsed`; times from the run's start. */
  readonly outputs: readonly BatchState[]
}

/** Two moments nearer than this are the same one, s. */
export const sameMoment = 1e-6

/** Runs a programme; the target, the time limit or the end of the steps stops it. */
export function march(batch: Batch, mover: Mover, request: RunRequest): Outcome<BatchRun, RouteFailure> {
  const { timeline } = batch
  const { target, until = Number.POSITIVE_INFINITY } = request
  const wanted = request.outputs ?? []
  const outputs: BatchState[] = []
  const marks: PhaseMark[] = []
  const endless = request.endless || timeline.endless
  let time = 0
  let firstDoseAt = Number.NaN
  let dosed = 0
  let last: Run = timeline.after
  let elapsedInLast = 0
  const finish = (reachedAt?: number): Outcome<BatchRun, RouteFailure> =>
    success({
      ...(reachedAt === undefined ? notReached : { reachedAt }),
      firstDoseAt,
      dosed,
      end: mover.state(time, last, elapsedInLast),
      outputs,
      marks,
      work: mover.work(),
    })
  const { steps } = timeline
  const count = endless ? steps.length + 1 : steps.length
  for (let i = 0; i < count; i++) {
    const step = steps[i] ?? timeline.after
    if (step.kind === 'dose') {
      if (Number.isNaN(firstDoseAt)) firstDoseAt = time
      const mass = step.mass * request.doseScale
      mover.dose(mass)
      dosed += mass
      continue
    }
    if (target !== undefined && !Number.isNaN(firstDoseAt) && mover.reached(target)) return finish(time)
    if (time >= until) break
    const length = Math.min(step.duration, until - time)
    const stopAt =
      target === undefined || (step.until !== undefined && step.until < target) ? step.until : target
    const from = time
    const enzymeFrom = mover.activeEnzyme()
    const due = outputs.length < wanted.length ? dueWithin(step, from, length) : none
    const passed = mover.advance(step, length, stopAt, due)
    if (!passed.ok) {
      const { failure } = passed
      // A run counts its time from its own start.
      return failed('time' in failure ? { ...failure, time: from + failure.time } : failure)
    }
    const { elapsed, stopped } = passed.value
    for (const state of passed.value.outputs) {
      if (stopped && state.time > elapsed - sameMoment) break
      outputs.push({ ...state, time: wanted[outputs.length] ?? state.time })
    }
    time = from + elapsed
    last = step
    elapsedInLast = elapsed
    marks.push({ phase: step.phase, from, to: time, enzymeFrom, enzymeTo: mover.activeEnzyme() })
    if (stopped && target !== undefined && stopAt === target) return finish(time)
  }
  if (target !== undefined && mover.reached(target)) return finish(time)
  while (outputs.length < wanted.length && (wanted[outputs.length] as number) <= time + sameMoment)
    outputs.push(mover.state(wanted[outputs.length] as number, last, elapsedInLast))
  return finish()

  /** Times wanted within a run, from its start; those at its very end belong to the next one. */
  function dueWithin(run: Run, from: number, length: number): readonly number[] {
    const due: number[] = []
    const open = run !== timeline.after && length === run.duration
    for (let i = outputs.length; i < wanted.length; i++) {
      const at = (wanted[i] as number) - from
      if (open ? at > length - sameMoment : at > length + sameMoment) break
      due.push(Math.min(length, Math.max(0, at)))
    }
    return due
  }
}

const none: readonly number[] = []
const notReached = {}
