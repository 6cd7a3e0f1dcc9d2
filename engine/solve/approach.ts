/**
 * Ways through a run that are cheaper than the logarithms in time, as far as they carry: along the reaction
 * coordinate at a steady temperature, in plain amounts where the temperature moves or substrate is fed.
 */
import type { Work } from '../answer.ts'
import type { Integrator } from '../integrate/integrator.ts'
import type { EnzymeModel } from './enzyme-model.ts'
import { plainRates } from './plain-rates.ts'
import { type ReactionStart, reactionRates } from './reaction-rates.ts'
import { fedAfter, type Run } from './timeline.ts'

export interface Approach {
  /** s since the run's start */
  readonly elapsed: number
  /** The target, the run's end, or neither: something was nearly spent, and logarithms are the better coordinates. */
  readonly end: 'target' | 'run' | 'spent'
  /** ln of the substrate's and of the enzyme's increase. */
  readonly lnSubstrate: number
  readonly lnEnzyme: number
  readonly work: Work
}

/** What is to be passed, and how exactly. */
export interface Stretch {
  readonly run: Run
  readonly start: ReactionStart
  /** s */
  readonly length: number
  readonly integrator: Integrator
  readonly tolerance: number
}

/**
 * What a step may add along the reaction and in plain amounts, in tolerances: the time to a conversion then comes out
 * wrong by 1.0 tolerances at worst, as the bench shows.
 */
const stepShare = 2
const plainShare = 2.5
/** Time and enzyme, and substrate and enzyme, relative to the start. */
const atStart = Float64Array.of(0, 1)
const whole = Float64Array.of(1, 1)
/** Below this share of its start the enzyme makes time too steep a function of conversion. */
const spentEnzyme = 1e-3
/** Below this share of its start plain substrate has too few digits. */
const spentSubstrate = 1e-2
/** A run that takes more steps than this is not the smooth one that these coordinates are for. */
const mostSteps = 2000
/** The first step of a fifth-order method in coordinates of order one. */
const firstStepOf = (tolerance: number): number => 7 * tolerance ** 0.2

/** An enzyme that dies within a single step may come out of it below nothing. */
const isAmount = (x: number | undefined): boolean => x !== undefined && x > 0 && x < Number.POSITIVE_INFINITY

/** How much of the way to the end, in logarithms, a target lies; 1 without one. */
export const shareOf = (target: number | undefined): number =>
  target === undefined ? 1 : Math.min(1, -Math.log1p(-target))

/** Whether there is a cheaper way for this kind of run: uniform substrate, one step of inactivation. */
export function approachable(model: EnzymeModel, run: Run, stopAt: number | undefined): boolean {
  const steady = run.course.kind === 'steady'
  if (steady && !run.feed) return stopAt !== undefined
  return (steady || !run.feed) && model.inactivation?.Kp === undefined
}

/**
 * The cheaper way through a run, to its end or to the conversion `stopAt` of the substrate supplied so far, kg, and
 * what the run feeds.
 */
export function approach(
  model: EnzymeModel,
  stretch: Stretch,
  supplied: number,
  stopAt: number | undefined,
): Approach | undefined {
  const { run, start, tolerance } = stretch
  const { feed } = run
  if (run.course.kind === 'steady' && !feed && stopAt !== undefined)
    return approachByReaction(model, Math.log(start.substrate / ((1 - stopAt) * supplied)), stretch)
  const tighter = { ...stretch, tolerance: Math.max(1e-14, tolerance * shareOf(stopAt)) }
  if (stopAt === undefined) return approachInAmounts(model, undefined, tighter)
  const left = (1 - stopAt) / start.substrate
  const fedIn = feed?.substrate ?? 0
  return approachInAmounts(model, (t, m) => m - left * (supplied + fedAfter(feed, t) * fedIn), tighter)
}

/**
 * Steps along u = ln(m0/m) to `u`, or to where the run ends or the enzyme is spent; at a steady temperature.
 *
 * Shapes   undefined where the reaction does not go forward or the stepping gives up.
 */
function approachByReaction(
  model: EnzymeModel,
  u: number,
  { run, start, length, integrator, tolerance }: Stretch,
): Approach | undefined {
  if (!(u > 0 && u < 700) || !(u < toEquilibrium(model, run, start))) return undefined
  const rates = reactionRates(model, run, start)
  if (!rates) return undefined
  const { timeScale } = rates
  const last = length / timeScale
  const arrival = integrator.run(
    {
      rate: rates.rate,
      start: 0,
      end: u,
      initial: atStart,
      event: (_, y) => Math.min(last - (y[0] as number), (y[1] as number) - spentEnzyme),
    },
    {
      relative: stepShare * tolerance,
      // The way to an early target is short, and so is its time.
      absolute: stepShare * tolerance * Math.min(1, u),
      maxSteps: mostSteps,
      method: 'explicit',
      firstStep: Math.min(u, last, firstStepOf(tolerance)),
    },
  )
  if (!arrival.ok || !isAmount(arrival.value.state[1])) return undefined
  const { time: at, state, event, work } = arrival.value
  const ended = event && last - (state[0] as number) <= 1e-9 * last
  return {
    elapsed: ended ? length : (state[0] as number) * timeScale,
    end: !event ? 'target' : ended ? 'run' : 'spent',
    lnSubstrate: -at,
    lnEnzyme: Math.log(state[1] as number),
    work,
  }
}

/** u of the equilibrium, beyond which no step may be tried: the reaction would seem to run in time gone by. */
function toEquilibrium({ law, massYield }: EnzymeModel, run: Run, start: ReactionStart): number {
  const { Keq } = law(run.pH)
  if (Keq === undefined) return Number.POSITIVE_INFINITY
  return Math.log((start.substrate * (Keq + massYield)) / start.productPool)
}

/**
 * Steps through a run in plain amounts, to its end or to where `due` falls to 0 or something is nearly spent.
 *
 * Shapes   due(t, m) of the time and the substrate's mass relative to the start; undefined where the stepping gives up.
 */
function approachInAmounts(
  model: EnzymeModel,
  due: ((t: number, m: number) => number) | undefined,
  { run, start, length, integrator, tolerance }: Stretch,
): Approach | undefined {
  const left = (y: ArrayLike<number>): number =>
    Math.min((y[0] as number) - spentSubstrate, (y[1] as number) - spentEnzyme)
  const { rate, end, timeAt } = plainRates(model, run, start, length)
  const arrival = integrator.run(
    {
      rate,
      start: 0,
      end,
      initial: whole,
      event: due ? (x, y) => Math.min(left(y), due(timeAt(x), y[0] as number)) : (_, y) => left(y),
    },
    {
      relative: plainShare * tolerance,
      absolute: 0.01 * plainShare * tolerance,
      maxSteps: mostSteps,
      method: 'explicit',
      firstStep: end * Math.min(1, firstStepOf(tolerance)),
    },
  )
  if (!arrival.ok || !isAmount(arrival.value.state[0]) || !isAmount(arrival.value.state[1])) return undefined
  const { time: at, state, event, work } = arrival.value
  const elapsed = event ? timeAt(at) : length
  const reached = event && due !== undefined && due(elapsed, state[0] as number) <= Math.max(0, left(state))
  return {
    elapsed,
    end: !event ? 'run' : reached ? 'target' : 'spent',
    lnSubstrate: Math.log(state[0] as number),
    lnEnzyme: Math.log(state[1] as number),
    work,
  }
}
