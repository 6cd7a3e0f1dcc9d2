/** What a plan answers, in SI; sentences and units of display are the reader's business. */
import type { Ask } from './scenario.ts'
import type { Mass, Temperature, Time } from './units/quantity.ts'

export interface Answer {
  readonly ask: Ask
  readonly reachable: boolean
  /** From the first dose. */
  readonly time?: Time
  /** Sum of all doses. */
  readonly dose?: Mass
  readonly temperature?: Temperature
  readonly conversion?: number
  readonly cost?: { readonly value: number; readonly currency: string }
  /** Where the conversion comes to rest when the target is never reached. */
  readonly limitingConversion?: number
  /** Below this the target is never reached, however long the hold. */
  readonly leastDose?: Mass
  readonly trace?: Trace
  readonly check: Check
  /** By how much an error of the constants is magnified, and how many digits that leaves. */
  readonly precision?: { readonly amplification: number; readonly digits: number }
  readonly hours?: HoursLedger
  /** What would shorten the hold, or make an unreachable target reachable; the strongest first. */
  readonly remedies?: readonly Remedy[]
  readonly killStep?: KillStep
  readonly work: Work
  /** Largest relative drift of substrate + product/yield along the integration. */
  readonly massBalance: number
  readonly warnings: readonly Warning[]
}

/** The same answer by an independent route. */
export interface Check {
  readonly method: CheckMethod
  /** Null when the checking route gave up; a warning says why. */
  readonly relativeDifference: number | null
}

/** Integration by explicit steps or by implicit ones, or quadrature along the reaction. */
export type CheckMethod = 'ode-explicit' | 'ode-implicit' | 'quadrature'

/** Columns of one length; the state at the moment of a dose is the one after it. */
export interface Trace {
  readonly time: Float64Array
  readonly substrate: Float64Array
  readonly product: Float64Array
  readonly enzyme: Float64Array
  readonly temperature: Float64Array
  readonly pH?: Float64Array
  readonly volume: Float64Array
  readonly conversion: Float64Array
}

export type HoursCause =
  | 'saturated'
  | 'substrate-short'
  | 'product-inhibition'
  | 'substrate-inhibition'
  | 'reversibility'
  | 'slow-fraction'
  | 'pH'
  | 'enzyme-loss'
  | 'heating'
  | 'staging'

/** The hold time as a sum over causes in a fixed order; a line may be negative. */
export interface HoursLedger {
  readonly total: Time
  readonly lines: readonly { readonly cause: HoursCause; readonly time: Time }[]
  /** The largest line that a change of plan could avoid. */
  readonly largestAvoidable?: HoursCause
}

export type Remedy =
  | { readonly kind: 'more-dose'; readonly dose: Mass; readonly time: Time }
  | { readonly kind: 'cooler' | 'warmer'; readonly temperature: Temperature; readonly time: Time }
  | { readonly kind: 'lower-target'; readonly conversion: number; readonly time: Time }
  | { readonly kind: 'less-inhibition'; readonly time: Time }
  | { readonly kind: 'better-pH'; readonly pH: number; readonly time: Time }
  | { readonly kind: 'longer-hold'; readonly extra: Time; readonly time: Time }
  /** All doses given at the programme's start. */
  | { readonly kind: 'sooner'; readonly time: Time }
  | {
      readonly kind: 'staged'
      readonly doses: number
      readonly each: Mass
      readonly every: Time
      readonly time: Time
    }

export interface KillStep {
  /** Active over charged enzyme at the end of the kill step. */
  readonly residualActivity: number
  /** −log10 of what the step itself leaves. */
  readonly logReduction: number
}

export interface Work {
  readonly stepsAccepted: number
  readonly stepsRejected: number
  readonly rateEvaluations: number
  readonly jacobians: number
}

export type Warning =
  /** Few digits are left: the answer hangs on the last per mille of the constants. */
  | { readonly code: 'near-the-edge'; readonly amplification: number; readonly digits: number }
  | { readonly code: 'optimum-at-bound'; readonly temperature: Temperature }
  | { readonly code: 'hold-shorter-than-time'; readonly hold: Time; readonly time: Time }
  | { readonly code: 'kill-step-incomplete'; readonly residualActivity: number }
  /** The reaction runs far from the temperature at which the rate was measured. */
  | { readonly code: 'far-from-measured'; readonly measured: Temperature; readonly used: Temperature }
  | { readonly code: 'routes-disagree'; readonly relativeDifference: number }
  /** The checking route gave up. */
  | { readonly code: 'check-failed'; readonly failure: PlanFailure['kind'] }
  | { readonly code: 'beyond-equilibrium'; readonly equilibriumConversion: number }
  /** The target is met before all of the feed is in; feeding goes on so long after it. */
  | { readonly code: 'fed-after-target'; readonly until: Time }
  /** Held at one temperature from the first dose the batch would never get there: its hours cannot be split. */
  | { readonly code: 'hours-not-split'; readonly temperature: Temperature }
  /** Longer than anybody waits: over a year. */
  | { readonly code: 'very-long'; readonly time: Time }

/** Why there is no answer. */
export type PlanFailure =
  | { readonly kind: 'rate-not-finite'; readonly time: number; readonly component: number }
  | { readonly kind: 'step-too-small'; readonly time: number }
  | { readonly kind: 'too-many-steps'; readonly time: number; readonly taken: number }
  | { readonly kind: 'beyond-doubles'; readonly what: string }
