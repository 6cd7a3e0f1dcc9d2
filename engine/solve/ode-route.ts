/**
 * The route by integration: the balances stepped in logarithms, for every batch, those that separate included;
 * restarted at every kink of the programme.
 */
import type { Work } from '../answer.ts'
import { createIntegrator, type Integrator } from '../integrate/integrator.ts'
import type { Control, MethodChoice } from '../integrate/problem.ts'
import { failed, success } from '../outcome.ts'
import { type Approach, approachByReaction, approachInAmounts, type Stretch } from './approach.ts'
import { logRates, type Surroundings } from './log-rates.ts'
import { type Mover, march } from './march.ts'
import { sumOfWork } from './patient-run.ts'
import { liftForFeed, restsOf } from './rest.ts'
import type { Batch, BatchState, Route } from './route.ts'
import { runToRest } from './run-to-rest.ts'
import { temperatureAt } from './temperature-course.ts'
import type { Run } from './timeline.ts'

export interface Exactness {
  /** Relative error of substrate and enzyme that a step may add. */
  readonly tolerance: number
  readonly method: MethodChoice
  readonly maxSteps: number
}

/** What the program integrates with unless asked otherwise. */
export const standardExactness: Exactness = { tolerance: 1e-8, method: 'automatic', maxSteps: 200_000 }

/** Logarithms of any size keep this share of themselves: an enzyme e^(−1e9) has no digits to keep. */
const logRoundOff = 1e-13

/** Where an endless run is cut, s: later than anything happens, save in numbers no plant has. */
const endOfTime = 1e30

/** Size of the state that a batch is integrated with. */
const stateSize = ({ feed, model }: Batch): number =>
  (feed.substrate.slow ? 2 : 1) + (model.inactivation?.k2 ? 2 : 1)

/**
 * The route of any batch by integration.
 *
 * Shapes   an integrator of the right size may be handed in and is then reused, run after run.
 */
export function odeRoute(
  batch: Batch,
  exactness: Exactness = standardExactness,
  workspace?: Integrator,
): Route {
  let integrator = workspace
  return (request) => {
    integrator ??= createIntegrator(stateSize(batch))
    return march(batch, odeMover(batch, integrator, exactness), request)
  }
}

function odeMover(batch: Batch, integrator: Integrator, exactness: Exactness): Mover {
  const { feed, model, preparationDensity, timeline } = batch
  const { slow } = feed.substrate
  const { inactivation, massYield } = model
  const residual = inactivation?.residual ?? { first: 0, second: 0 }
  const series = inactivation?.k2 !== undefined
  const enzymeAt = slow ? 2 : 1
  const state = new Float64Array(enzymeAt + (series ? 2 : 1))
  const charged = feed.volume * feed.substrate.concentration
  state[0] = Math.log(charged * (1 - (slow?.share ?? 0)))
  if (slow) state[1] = Math.log(charged * slow.share)
  state[enzymeAt] = Number.NEGATIVE_INFINITY
  let volume: number = feed.volume
  let fedSubstrate = 0
  let productPool = feed.volume * feed.product.concentration + massYield * charged
  let totalEnzyme = 0
  let step: number | undefined
  let work: Work = { stepsAccepted: 0, stepsRejected: 0, rateEvaluations: 0, jacobians: 0 }

  const substrateIn = (y: ArrayLike<number>): number =>
    Math.exp(y[0] as number) + (slow ? Math.exp(y[1] as number) : 0)
  const activeIn = (y: ArrayLike<number>, total: number): number => {
    const living = Math.exp(y[enzymeAt] as number)
    if (!series) return living
    const native = Math.exp(y[enzymeAt + 1] as number)
    return living * (native + residual.first * (1 - native)) + residual.second * (total - living)
  }
  const fedAfter = (run: Run, τ: number): number =>
    run.feed ? τ * (run.feed.flow + 0.5 * run.feed.flowSlope * τ) : 0

  const stateAt = (
    y: ArrayLike<number>,
    run: Run,
    τ: number,
    time: number,
    start: Surroundings & { fed: number },
    fed = fedAfter(run, τ),
  ): BatchState => {
    const v = start.volume + fed
    const substrate = substrateIn(y)
    const supplied = charged + start.fed + fed * (run.feed?.substrate ?? 0)
    const pool = start.productPool + fed * ((run.feed?.product ?? 0) + massYield * (run.feed?.substrate ?? 0))
    const product = (pool - massYield * substrate) / v
    return {
      time,
      substrate: substrate / v,
      product,
      enzyme: activeIn(y, start.totalEnzyme + fed * (run.feed?.enzyme ?? 0)) / v,
      temperature: temperatureAt(run.course, Number.isFinite(τ) ? τ : 0),
      pH: run.pH,
      volume: v,
      conversion: 1 - substrate / supplied,
      imbalance: (product * v + massYield * substrate) / pool - 1,
    }
  }

  const here = (): Surroundings & { fed: number } => ({ volume, productPool, totalEnzyme, fed: fedSubstrate })

  return {
    dose: (mass) => {
      const living = Math.exp(state[enzymeAt] as number)
      if (series) {
        const native = living > 0 ? living * Math.exp(state[enzymeAt + 1] as number) : 0
        state[enzymeAt + 1] = Math.log((native + mass) / (living + mass))
      }
      state[enzymeAt] = Math.log(living + mass)
      totalEnzyme += mass
      if (timeline.countDoseVolume && preparationDensity !== undefined) volume += mass / preparationDensity
      step = undefined
    },
    reached: (conversion) => 1 - substrateIn(state) / (charged + fedSubstrate) >= conversion,
    activeEnzyme: () => activeIn(state, totalEnzyme),
    state: (time, run, elapsed) => stateAt(state, run, elapsed, time, here(), 0),
    work: () => work,
    advance: (run, length, stopAt, outputs) => {
      const start = here()
      if (totalEnzyme === 0) {
        const rest = withoutEnzyme(run)
        const states = outputs.map((τ) => stateAt(rest(τ), run, τ, τ, start))
        state.set(rest(length))
        settle(run, length)
        return success({ elapsed: length, stopped: false, outputs: states })
      }
      if (run.feed) {
        liftForFeed(batch, state, run.feed, fedAfter(run, Math.min(length, endOfTime)))
        // What comes in may change everything at once; the last step says nothing of it.
        step = undefined
      }
      const end = Math.min(length, endOfTime)
      let from = 0
      if (outputs.length === 0 && !slow && !series && exactness.method !== 'implicit') {
        const approach = approachTo(run, stopAt, end)
        if (approach) {
          work = sumOfWork(work, approach.work)
          state[0] = (state[0] as number) + approach.lnSubstrate
          state[1] = (state[1] as number) + approach.lnEnzyme
          from = approach.elapsed
          step = undefined
          if (approach.end !== 'spent') {
            settle(run, from)
            return success({ elapsed: from, stopped: approach.end === 'target', outputs: noStates })
          }
        }
      }
      const substrateFed = run.feed?.substrate ?? 0
      const supplied = charged + fedSubstrate
      const control: Control = {
        relative: logRoundOff,
        // An early target hangs on a small change of the logarithm, and that change has to be known as well.
        absolute: Math.max(10 * logRoundOff, exactness.tolerance * shareOf(stopAt)),
        maxSteps: exactness.maxSteps,
        method: exactness.method,
        ...(step !== undefined && step > 0 && { firstStep: Math.min(step, end) }),
      }
      const rate = logRates(model, slow, run, start)
      const passage = runToRest(
        integrator,
        state,
        {
          rate,
          from,
          end,
          due:
            stopAt === undefined
              ? undefined
              : (τ, y) =>
                  Math.log(substrateIn(y) / ((1 - stopAt) * (supplied + fedAfter(run, τ) * substrateFed))),
          moving: run.feed ? [] : restsOf(batch, run, start, supplied, exactness.tolerance),
          outputs,
        },
        control,
      )
      if (!passage.ok) return failed(passage.failure)
      const { time, stopped, nextStep } = passage.value
      work = sumOfWork(work, passage.value.work)
      step = nextStep
      const states = passage.value.states.map((y, i) => {
        const τ = outputs[i] as number
        return stateAt(y, run, τ, τ, start)
      })
      const elapsed = stopped || time < end ? time : length
      settle(run, elapsed)
      return success({ elapsed, stopped, outputs: states })
    },
  }

  /** The cheaper way through a run, where there is one. */
  function approachTo(run: Run, stopAt: number | undefined, length: number): Approach | undefined {
    const substrate = substrateIn(state)
    const start = { volume, substrate, enzyme: activeIn(state, totalEnzyme), productPool }
    const stretch: Stretch = { run, start, length, integrator, tolerance: exactness.tolerance }
    const supplied = charged + fedSubstrate
    const steady = run.course.kind === 'steady'
    if (steady && !run.feed)
      return stopAt === undefined
        ? undefined
        : approachByReaction(model, Math.log(substrate / ((1 - stopAt) * supplied)), stretch)
    if ((run.feed && !steady) || inactivation?.Kp !== undefined) return undefined
    const left = stopAt === undefined ? undefined : (1 - stopAt) / substrate
    const fedIn = run.feed?.substrate ?? 0
    return approachInAmounts(
      model,
      left === undefined ? undefined : (t, m) => m - left * (supplied + fedAfter(run, t) * fedIn),
      { ...stretch, tolerance: Math.max(1e-14, exactness.tolerance * shareOf(stopAt)) },
    )
  }

  /** Moves the surroundings to the end of a run. */
  function settle(run: Run, elapsed: number): void {
    if (!run.feed) return
    const fed = fedAfter(run, elapsed)
    volume += fed
    fedSubstrate += fed * run.feed.substrate
    productPool += fed * (run.feed.product + massYield * run.feed.substrate)
    totalEnzyme += fed * run.feed.enzyme
  }

  /** The state after τ while no enzyme is there yet: only feeding moves it. */
  function withoutEnzyme(run: Run): (τ: number) => Float64Array {
    const before = state.slice()
    return (τ) => {
      const fed = fedAfter(run, τ) * (run.feed?.substrate ?? 0)
      const y = before.slice()
      const share = slow?.share ?? 0
      y[0] = Math.log(Math.exp(before[0] as number) + fed * (1 - share))
      if (slow) y[1] = Math.log(Math.exp(before[1] as number) + fed * share)
      return y
    }
  }
}

const noStates: readonly BatchState[] = []

/** How much of the way to the end, in logarithms, a target lies; 1 without one. */
const shareOf = (target: number | undefined): number =>
  target === undefined ? 1 : Math.min(1, -Math.log1p(-target))
