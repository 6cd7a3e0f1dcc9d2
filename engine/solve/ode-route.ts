/**
 * The route by integration: the balances stepped in logarithms, for every batch, those that separate included;
 * restarted at every kink of the programme.
 */
import type { Work } from '../answer.ts'
import { createIntegrator } from '../integrate/integrator.ts'
import type { Control, MethodChoice } from '../integrate/problem.ts'
import { failed, success } from '../outcome.ts'
import { logRates, type Surroundings } from './log-rates.ts'
import { type Mover, march } from './march.ts'
import type { Batch, BatchState, Route } from './route.ts'
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

/** Where an endless run is cut, s: thirty thousand million years. */
const endOfTime = 1e18

/** The route of any batch by integration. */
export function odeRoute(batch: Batch, exactness: Exactness = standardExactness): Route {
  const { model, feed } = batch
  const size = (feed.substrate.slow ? 2 : 1) + (model.inactivation?.k2 ? 2 : 1)
  const integrator = createIntegrator(size)
  return (request) => march(batch, odeMover(batch, integrator, exactness), request)
}

function odeMover(
  batch: Batch,
  integrator: ReturnType<typeof createIntegrator>,
  exactness: Exactness,
): Mover {
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
    conversion: () => 1 - substrateIn(state) / (charged + fedSubstrate),
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
      const end = Math.min(length, endOfTime)
      const substrateFed = run.feed?.substrate ?? 0
      const supplied = charged + fedSubstrate
      const control: Control = {
        relative: logRoundOff,
        absolute: exactness.tolerance,
        maxSteps: exactness.maxSteps,
        method: exactness.method,
        ...(step !== undefined && step > 0 && { firstStep: Math.min(step, end) }),
      }
      const arrival = integrator.run(
        {
          rate: logRates(model, slow, run, start),
          start: 0,
          end,
          initial: state,
          ...(stopAt !== undefined && {
            event: (τ: number, y: Float64Array) =>
              Math.log(substrateIn(y) / ((1 - stopAt) * (supplied + fedAfter(run, τ) * substrateFed))),
          }),
          ...(outputs.length > 0 && { outputs: Float64Array.from(outputs, (τ) => Math.min(τ, end)) }),
        },
        control,
      )
      if (!arrival.ok) return failed(arrival.failure)
      const { time, event, nextStep, outputs: rows, outputsReached } = arrival.value
      work = {
        stepsAccepted: work.stepsAccepted + arrival.value.work.stepsAccepted,
        stepsRejected: work.stepsRejected + arrival.value.work.stepsRejected,
        rateEvaluations: work.rateEvaluations + arrival.value.work.rateEvaluations,
        jacobians: work.jacobians + arrival.value.work.jacobians,
      }
      const states: BatchState[] = []
      for (let i = 0; i < outputsReached; i++) {
        const row = rows.subarray(i * state.length, (i + 1) * state.length)
        states.push(stateAt(row, run, outputs[i] as number, outputs[i] as number, start))
      }
      state.set(arrival.value.state)
      const elapsed = event || time < endOfTime ? time : length
      settle(run, elapsed)
      step = nextStep
      return success({ elapsed, stopped: event, outputs: states })
    },
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
