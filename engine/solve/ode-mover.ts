/** A batch in motion by integration: ln of its substrate and enzyme, and what stands around them. */
import type { Work } from '../answer.ts'
import type { Integrator } from '../integrate/integrator.ts'
import { failed, type Outcome, success } from '../outcome.ts'
import { type Approach, approach, approachable, shareOf } from './approach.ts'
import { convertedOf, levelsAfterFeeding, logRates, type Surroundings, stateSize } from './log-rates.ts'
import type { Advance, Mover } from './march.ts'
import type { Exactness } from './ode-route.ts'
import { sumOfWork } from './patient-run.ts'
import { liftForFeed, restsOf } from './rest.ts'
import type { Batch, BatchState, RouteFailure } from './route.ts'
import { runToRest } from './run-to-rest.ts'
import { temperatureAt } from './temperature-course.ts'
import { type FeedRun, fedAfter, type Run } from './timeline.ts'

/** Logarithms of any size keep this share of themselves: an enzyme e^(−1e9) has no digits to keep. */
const logRoundOff = 1e-13

/** Where an endless run is cut, s: later than anything happens, save in numbers no plant has. */
const endOfTime = 1e30

const noResidual = { first: 0, second: 0 }
const noWork: Work = { stepsAccepted: 0, stepsRejected: 0, rateEvaluations: 0, jacobians: 0 }
const noStates: readonly BatchState[] = []

/** Steps a batch through its runs; see `logRates` for the state. */
export class OdeMover implements Mover {
  private readonly batch: Batch
  private readonly integrator: Integrator
  private readonly exactness: Exactness
  private readonly residual: { readonly first: number; readonly second: number }
  private readonly series: boolean
  private readonly enzymeAt: number
  private readonly levels: Float64Array
  private readonly charged: number
  private volume: number
  private fedSubstrate = 0
  private productPool: number
  private totalEnzyme = 0
  private step = 0
  private spent: Work = noWork

  constructor(batch: Batch, integrator: Integrator, exactness: Exactness) {
    const { feed, model } = batch
    const { slow } = feed.substrate
    this.batch = batch
    this.integrator = integrator
    this.exactness = exactness
    this.residual = model.inactivation?.residual ?? noResidual
    this.series = model.inactivation?.k2 !== undefined
    this.enzymeAt = slow ? 2 : 1
    this.charged = feed.volume * feed.substrate.concentration
    this.volume = feed.volume
    this.productPool = feed.volume * feed.product.concentration + model.massYield * this.charged
    this.levels = new Float64Array(stateSize(batch))
    this.levels[0] = Math.log(this.charged * (1 - (slow?.share ?? 0)))
    if (slow) this.levels[1] = Math.log(this.charged * slow.share)
    this.levels[this.enzymeAt] = Number.NEGATIVE_INFINITY
  }

  dose(mass: number): void {
    const { levels: y, enzymeAt } = this
    const { preparationDensity, timeline } = this.batch
    const living = Math.exp(y[enzymeAt] as number)
    if (this.series) {
      const native = living > 0 ? living * Math.exp(y[enzymeAt + 1] as number) : 0
      y[enzymeAt + 1] = Math.log((native + mass) / (living + mass))
    }
    y[enzymeAt] = Math.log(living + mass)
    this.totalEnzyme += mass
    if (timeline.countDoseVolume && preparationDensity !== undefined) this.volume += mass / preparationDensity
    this.step = 0
  }

  reached(conversion: number): boolean {
    return 1 - this.substrateIn(this.levels) / (this.charged + this.fedSubstrate) >= conversion
  }

  activeEnzyme(): number {
    return this.activeIn(this.levels, this.totalEnzyme)
  }

  state(time: number, run: Run, elapsed: number): BatchState {
    return this.stateAt(this.levels, run, elapsed, time, this.here(), 0)
  }

  work(): Work {
    return this.spent
  }

  advance(
    run: Run,
    length: number,
    stopAt: number | undefined,
    outputs: readonly number[],
  ): Outcome<Advance, RouteFailure> {
    if (this.totalEnzyme === 0) return this.waitForEnzyme(run, length, outputs)
    const end = Math.min(length, endOfTime)
    if (run.feed) {
      liftForFeed(this.batch, this.levels, run.feed, fedAfter(run.feed, end))
      // What comes in may change everything at once; the last step says nothing of it.
      this.step = 0
    }
    let from = 0
    if (outputs.length === 0 && this.enzymeAt === 1 && !this.series && this.exactness.method !== 'implicit') {
      const passed = this.approachTo(run, stopAt, end)
      if (passed) {
        const { levels: y } = this
        this.spent = this.spent === noWork ? passed.work : sumOfWork(this.spent, passed.work)
        y[0] = (y[0] as number) + passed.lnSubstrate
        y[1] = (y[1] as number) + passed.lnEnzyme
        from = passed.elapsed
        this.step = 0
        if (passed.end !== 'spent') {
          if (run.feed) this.settle(run.feed, from)
          return success({ elapsed: from, stopped: passed.end === 'target', outputs: noStates })
        }
      }
    }
    return this.inLogarithms(run, from, length, stopAt, outputs)
  }

  /** The cheaper way through a run, where there is one. */
  private approachTo(run: Run, stopAt: number | undefined, length: number): Approach | undefined {
    const { model } = this.batch
    if (!approachable(model, run, stopAt)) return undefined
    const start = {
      volume: this.volume,
      substrate: this.substrateIn(this.levels),
      enzyme: this.activeEnzyme(),
      productPool: this.productPool,
    }
    const { integrator } = this
    const { tolerance } = this.exactness
    const supplied = this.charged + this.fedSubstrate
    return approach(model, { run, start, length, integrator, tolerance }, supplied, stopAt)
  }

  /** The way that always carries: logarithms in time, from `from` on. */
  private inLogarithms(
    run: Run,
    from: number,
    length: number,
    stopAt: number | undefined,
    outputs: readonly number[],
  ): Outcome<Advance, RouteFailure> {
    const { batch, exactness } = this
    const { feed } = run
    const start = this.here()
    const end = Math.min(length, endOfTime)
    const supplied = this.charged + this.fedSubstrate
    const fedIn = feed?.substrate ?? 0
    const left = (τ: number): number => (1 - (stopAt ?? 0)) * (supplied + fedAfter(feed, τ) * fedIn)
    const due = (τ: number, y: ArrayLike<number>): number => Math.log(this.substrateIn(y) / left(τ))
    const passage = runToRest(
      this.integrator,
      this.levels,
      {
        rate: logRates(batch.model, batch.feed.substrate.slow, run, start),
        from,
        end,
        due: stopAt === undefined ? undefined : due,
        moving: feed ? [] : restsOf(batch, run, start, supplied, exactness.tolerance),
        outputs,
      },
      {
        relative: logRoundOff,
        // An early target hangs on a small change of the logarithm, and that change has to be known as well.
        absolute: Math.max(10 * logRoundOff, exactness.tolerance * shareOf(stopAt)),
        maxSteps: exactness.maxSteps,
        method: exactness.method,
        firstStep: Math.min(this.step, end),
      },
    )
    if (!passage.ok) return failed(passage.failure)
    const { time, stopped, nextStep } = passage.value
    this.spent = sumOfWork(this.spent, passage.value.work)
    this.step = nextStep
    const states = passage.value.states.map((y, i) => {
      const τ = outputs[i] as number
      return this.stateAt(y, run, τ, τ, start)
    })
    const elapsed = stopped || time < end ? time : length
    if (feed) this.settle(feed, elapsed)
    return success({ elapsed, stopped, outputs: states })
  }

  /** Passes a run in which no enzyme is there yet: only feeding moves the batch. */
  private waitForEnzyme(
    run: Run,
    length: number,
    outputs: readonly number[],
  ): Outcome<Advance, RouteFailure> {
    const before = this.levels.slice()
    const share = this.batch.feed.substrate.slow?.share ?? 0
    const after = (τ: number): Float64Array =>
      levelsAfterFeeding(before, fedAfter(run.feed, τ) * (run.feed?.substrate ?? 0), share)
    const start = this.here()
    const states = outputs.map((τ) => this.stateAt(after(τ), run, τ, τ, start))
    this.levels.set(after(length))
    if (run.feed) this.settle(run.feed, length)
    return success({ elapsed: length, stopped: false, outputs: states })
  }

  /** Moves the surroundings to the end of a feed. */
  private settle(feed: FeedRun, elapsed: number): void {
    const fed = fedAfter(feed, elapsed)
    this.volume += fed
    this.fedSubstrate += fed * feed.substrate
    this.productPool += fed * (feed.product + this.batch.model.massYield * feed.substrate)
    this.totalEnzyme += fed * feed.enzyme
  }

  private here(): Surroundings {
    const { volume, productPool, totalEnzyme, fedSubstrate } = this
    return { volume, productPool, totalEnzyme, fed: fedSubstrate }
  }

  private substrateIn(y: ArrayLike<number>): number {
    const first = Math.exp(y[0] as number)
    return this.enzymeAt === 1 ? first : first + Math.exp(y[1] as number)
  }

  private activeIn(y: ArrayLike<number>, total: number): number {
    const living = Math.exp(y[this.enzymeAt] as number)
    if (!this.series) return living
    const native = Math.exp(y[this.enzymeAt + 1] as number)
    const { first, second } = this.residual
    return living * (native + first * (1 - native)) + second * (total - living)
  }

  private stateAt(
    y: ArrayLike<number>,
    run: Run,
    τ: number,
    time: number,
    start: Surroundings,
    fed = fedAfter(run.feed, τ),
  ): BatchState {
    const { massYield } = this.batch.model
    const volume = start.volume + fed
    const substrate = this.substrateIn(y)
    const fedIn = run.feed?.substrate ?? 0
    const supplied = this.charged + start.fed + fed * fedIn
    const pool = start.productPool + fed * ((run.feed?.product ?? 0) + massYield * fedIn)
    const product = Math.max(0, (pool - massYield * substrate) / volume)
    return {
      time,
      substrate: substrate / volume,
      product,
      enzyme: this.activeIn(y, start.totalEnzyme + fed * (run.feed?.enzyme ?? 0)) / volume,
      temperature: temperatureAt(run.course, Number.isFinite(τ) ? τ : 0),
      pH: run.pH,
      volume,
      conversion: convertedOf(this.batch, y, substrate, supplied),
      imbalance: (product * volume + massYield * substrate) / pool - 1,
    }
  }
}
