/**
 * A route answers one question, what the batch does under a programme; two independent routes answer it, so
 * that each checks the other.
 */

import type { Work } from '../answer.ts'
import type { IntegrationFailure } from '../integrate/problem.ts'
import type { Outcome } from '../outcome.ts'
import type { Feed } from '../scenario.ts'
import type { EnzymeModel } from './enzyme-model.ts'
import type { Timeline } from './timeline.ts'

/** What a route works on: the charge, the enzyme, the programme. */
export interface Batch {
  readonly feed: Feed
  readonly model: EnzymeModel
  readonly timeline: Timeline
  /** kg/m³, for a dose that counts its volume */
  readonly preparationDensity?: number
}

export interface RunRequest {
  /** Factor on every dose. */
  readonly doseScale: number
  /** Stop where this conversion is reached. */
  readonly target?: number
  /** Stop at this time, s from the programme's start. */
  readonly until?: number
  /** Ascending times, s from the programme's start, at which the state is wanted. */
  readonly outputs?: readonly number[]
  /** The last conditions go on after the programme's end. */
  readonly endless: boolean
}

/** State of a batch, SI. */
export interface BatchState {
  readonly time: number
  readonly substrate: number
  readonly product: number
  /** Active preparation. */
  readonly enzyme: number
  readonly temperature: number
  readonly pH: number | undefined
  readonly volume: number
  readonly conversion: number
  /** Relative drift of substrate + product/yield from what had been supplied. */
  readonly imbalance: number
}

export interface BatchRun {
  /** s from the programme's start; absent when the target was not reached. */
  readonly reachedAt?: number
  /** s from the programme's start. */
  readonly firstDoseAt: number
  /** kg of preparation given until the run stopped. */
  readonly dosed: number
  /** The state where the run stopped; its time may be Infinity, and it then is the state of rest. */
  readonly end: BatchState
  readonly outputs: readonly BatchState[]
  /** One for each run passed. */
  readonly marks: readonly PhaseMark[]
  readonly work: Work
}

/** When a step of the programme began, and the active enzyme then, kg. */
export interface PhaseMark {
  readonly phase: number
  readonly from: number
  readonly to: number
  readonly enzymeFrom: number
  readonly enzymeTo: number
}

export type RouteFailure = IntegrationFailure | { readonly kind: 'beyond-doubles'; readonly what: string }

export type Route = (request: RunRequest) => Outcome<BatchRun, RouteFailure>
