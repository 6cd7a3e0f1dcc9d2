/** Writes dy/dt at (t, y) into `out`; keeps neither array and changes only `out`. */
export type RateInto = (out: Float64Array, y: Float64Array, t: number) => void

/**
 * An initial value problem, stated as data.
 *
 * Shapes   initial (n), never changed; outputs ascending times inside [start, end].
 *          `event` is terminal: the run stops where it first passes from > 0 to ≤ 0, and at once
 *          if it is ≤ 0 already at the start. It is looked at once a step, so a dip below zero
 *          and back inside a single step goes unseen.
 * Units    the caller's; start ≤ end.
 */
export interface Problem {
  readonly rate: RateInto
  readonly start: number
  readonly end: number
  readonly initial: Float64Array
  readonly event?: (t: number, y: Float64Array) => number
  readonly outputs?: Float64Array
}

export type MethodChoice = 'automatic' | 'explicit' | 'implicit'

/**
 * How exactly, and with how much work at most.
 *
 * Shapes   the error of component i is measured against absolute + relative·|yᵢ|, the larger of
 *          the magnitudes at the two ends of the step. In logarithmic coordinates take
 *          relative = 0: an absolute error there is a relative one of the quantity.
 *          maxSteps counts attempts, accepted or not. `automatic` (the default) starts
 *          explicitly and goes over to the implicit method when the problem proves stiff.
 */
export interface Control {
  readonly relative: number
  readonly absolute: number
  readonly maxSteps: number
  readonly firstStep?: number
  readonly method?: MethodChoice
}

export interface Work {
  readonly stepsAccepted: number
  readonly stepsRejected: number
  readonly rateEvaluations: number
  readonly jacobians: number
}

/**
 * Where a run ended, at its event or at the end of its interval.
 *
 * Shapes   state (n), fresh; outputs row-major, one row of n per output time, of which the first
 *          `outputsReached` rows are filled (the times up to and including `time`).
 *          nextStep is a good first step for a problem that continues from here.
 */
export interface Arrival {
  readonly time: number
  readonly state: Float64Array
  readonly event: boolean
  readonly outputs: Float64Array
  readonly outputsReached: number
  readonly nextStep: number
  readonly work: Work
}

/** The last accepted point of a run that failed. */
export interface Reached {
  readonly time: number
  readonly state: Float64Array
}

/** Why a run could not be completed, and how far it came. */
export type IntegrationFailure =
  | {
      readonly kind: 'rate-not-finite'
      readonly time: number
      readonly component: number
      readonly reached: Reached
    }
  | { readonly kind: 'step-too-small'; readonly time: number; readonly reached: Reached }
  | {
      readonly kind: 'too-many-steps'
      readonly time: number
      readonly taken: number
      readonly reached: Reached
    }
