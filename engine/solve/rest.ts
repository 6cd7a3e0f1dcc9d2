/**
 * Parts of a batch that come to rest long before others: substrate that is spent or in equilibrium with its product,
 * an enzyme of which only the last form of a series acts. Stepping on with them would be stiff for nothing, and a
 * logarithm without end.
 */
import type { RateInto } from '../integrate/problem.ts'
import type { Surroundings } from './log-rates.ts'
import type { Batch } from './route.ts'
import type { FeedRun, Run } from './timeline.ts'

export interface Rest {
  /** The components that then stand still, from the first to before the last. */
  readonly components: readonly [first: number, last: number]
  /** Above 0 until the rest is reached. */
  readonly level: (y: ArrayLike<number>) => number
  /** Takes up the state of rest exactly. */
  readonly settle: (y: Float64Array) => void
}

/** Logarithm of the share of the charge below which substrate counts as spent; within reach of a double. */
const logSpent = -575
/** Logarithm of a share that a double does not see beside 1. */
const logUnseen = -41
/** Logarithm of an amount that is 0 in a double. */
const logNothing = -746

/**
 * The rests a batch without feed may come to in a run.
 *
 * Units    supplied kg of substrate up to the run; tolerance: how near to its equilibrium stepping can tell.
 */
export function restsOf(
  { feed, model }: Batch,
  run: Run,
  at: Surroundings,
  supplied: number,
  tolerance: number,
): Rest[] {
  const { slow } = feed.substrate
  const { Keq } = model.law(run.pH)
  const substrates = slow ? 2 : 1
  const empty = Math.log(supplied) + logSpent
  const rests: Rest[] = [
    {
      components: [0, substrates],
      level: slow ? (y) => Math.max(y[0] as number, y[1] as number) - empty : (y) => (y[0] as number) - empty,
      settle: () => {},
    },
  ]
  if (Keq !== undefined && !slow) {
    const atRest = Math.log(at.productPool / (Keq + model.massYield))
    rests.push({
      components: [0, 1],
      level: (y) => Math.abs((y[0] as number) - atRest) - tolerance,
      settle: (y) => {
        y[0] = atRest
      },
    })
  }
  const { inactivation } = model
  if (inactivation?.k2) {
    const { first, second } = inactivation.residual
    const lasting = Math.log((second * at.totalEnzyme) / Math.max(1, first, second)) + logUnseen
    const least = Math.max(logNothing, lasting)
    rests.push({
      components: [substrates, substrates + 2],
      level: (y) => (y[substrates] as number) - least,
      settle: () => {},
    })
    // Of the native form nothing is left: its share has no more to say.
    rests.push({
      components: [substrates + 1, substrates + 2],
      level: (y) => (y[substrates + 1] as number) - logNothing,
      settle: () => {},
    })
  }
  return rests
}

/** The same rates with some components at rest. */
export const stillOf = (rate: RateInto, resting: readonly Rest[]): RateInto =>
  resting.length === 0
    ? rate
    : (out, y, t) => {
        rate(out, y, t)
        for (const { components } of resting) out.fill(0, ...components)
      }

/** How far the nearest rest is; Infinity where there is none. */
export function levelOf(moving: readonly Rest[], y: ArrayLike<number>): number {
  let least = Number.POSITIVE_INFINITY
  for (const { level } of moving) least = Math.min(least, level(y))
  return least
}

/**
 * A feed into next to nothing: a logarithm without bottom is lifted to what rounds away beside the amount fed, or
 * its rate, fed over present, would be out of all bounds.
 *
 * Units    fed m³ over the whole run.
 */
export function liftForFeed(
  { feed: { substrate }, model }: Batch,
  state: Float64Array,
  feed: FeedRun,
  fed: number,
): void {
  const lift = (i: number, amount: number): void => {
    state[i] = Math.max(state[i] as number, Math.log(amount) + logUnseen)
  }
  const { slow } = substrate
  const enzymeAt = slow ? 2 : 1
  lift(0, fed * feed.substrate * (1 - (slow?.share ?? 0)))
  if (slow) lift(1, fed * feed.substrate * slow.share)
  lift(enzymeAt, fed * feed.enzyme)
  if (model.inactivation?.k2 && feed.enzyme > 0) lift(enzymeAt + 1, 1)
}
