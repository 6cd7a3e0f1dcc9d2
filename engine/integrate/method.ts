import type { RateInto } from './problem.ts'

/**
 * One step of a one-step method, and how to interpolate inside it. Owns its workspace;
 * knows nothing of events, outputs, budgets or the length of the run.
 */
export interface Method {
  /** The estimated error of a step of length h shrinks like h^(1/exponent). */
  readonly exponent: number
  /** State at the end of the latest attempt and, if that was good enough, the rate there. */
  readonly next: Float64Array
  readonly nextRate: Float64Array
  /** Rate evaluations and Jacobians since `adopt`. */
  rateEvaluations: number
  jacobians: number
  /** Takes up another problem and forgets everything about the one before. */
  adopt(rate: RateInto, relative: number, absolute: number): void
  /**
   * Tries a step of length h from (t, y), where the rate is f. Returns the estimated error over
   * the tolerance: ≤ 1 is good enough, not finite means the step left the domain of the rate.
   */
  attempt(t: number, h: number, y: Float64Array, f: Float64Array): number
  /** Makes `at` ready for the latest attempt, which was good enough. */
  settle(): void
  /** State at the fraction theta of the settled step. */
  at(theta: number, out: Float64Array): void
  /** How far the latest step reaches towards the limit of stability; ≥ 1 is at the limit. */
  strain(): number
}
