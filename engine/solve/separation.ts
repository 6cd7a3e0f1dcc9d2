/**
 * The route by separation: what the enzyme supplies (∫k·E dt) does not depend on the substrate, what the conversion
 * demands does not depend on time, so a batch of constant volume needs one integral and one root, and no stepping.
 *
 * Source   separation of variables; closed forms where the temperature stands still, Gauss–Legendre where it moves.
 */

import { decayMean, logStretch } from '../kinetics/decay.ts'
import type { Charge } from '../kinetics/integrated-rate-law.ts'
import { type EnzymeForms, formIntegrals, formsAfter } from '../kinetics/series-inactivation.ts'
import { increasingRoot } from '../numeric/roots.ts'
import { type Outcome, success } from '../outcome.ts'
import { addCell, cellEnds, type Stretch } from './course-supply.ts'
import { type Advance, type Mover, march, sameMoment } from './march.ts'
import { coordinateAfter, type ReactionPath, reactionPath } from './reaction-path.ts'
import type { Batch, BatchState, Route, RouteFailure } from './route.ts'
import { temperatureAt } from './temperature-course.ts'
import type { Run } from './timeline.ts'

/** Whether a batch separates; otherwise only the differential equations describe it. */
export function separates({ model, timeline }: Batch): boolean {
  const runs = [...timeline.steps, timeline.after].filter((step) => step.kind === 'run')
  const moves = runs.some((run) => run.course.kind !== 'steady')
  const pHs = new Set(runs.map((run) => run.pH))
  return (
    !timeline.countDoseVolume &&
    !runs.some((run) => run.feed) &&
    model.inactivation?.Kp === undefined &&
    !(model.lawMovesWithPh && pHs.size > 1) &&
    !(model.inactivation?.k2 && moves)
  )
}

/** The path of a batch that separates. */
export function pathOf({ feed, model, timeline }: Batch): ReactionPath {
  const charge: Charge = {
    S0: feed.substrate.concentration,
    P0: feed.product.concentration,
    massYield: model.massYield,
  }
  return reactionPath(model.law(timeline.after.pH), charge, feed.substrate.slow)
}

/** The route of a batch that separates. */
export function separationRoute(batch: Batch): Route {
  const path = pathOf(batch)
  return (request) => march(batch, separationMover(batch, path), request)
}

/**
 * Enzyme-time that a separable batch supplies until a moment (s from the programme's start, Infinity allowed) for
 * its stated doses, kg/m³; it grows in proportion to the doses unless a hold waits for a conversion.
 */
export function supplyUntil(batch: Batch, until: number, endless: boolean): Outcome<number, RouteFailure> {
  const mover = separationMover(batch, pathOf(batch))
  const run = march(batch, mover, { doseScale: 1, until, endless })
  return run.ok ? success(mover.supplied()) : run
}

function separationMover({ feed, model }: Batch, path: ReactionPath): Mover & { supplied: () => number } {
  const S0 = feed.substrate.concentration
  const supplied = S0 + feed.product.concentration / model.massYield
  const { inactivation } = model
  const residual = inactivation?.residual ?? { first: 0, second: 0 }
  let spent = 0
  let u = 0
  let forms: EnzymeForms = { native: 0, intermediate: 0, final: 0 }
  const active = (f: EnzymeForms): number =>
    f.native + residual.first * f.intermediate + residual.second * f.final

  const stateAt = (at: number, f: EnzymeForms, run: Run, τ: number, time: number): BatchState => {
    const consumed = path.consumed(at)
    const substrate = path.substrate(at)
    const product = feed.product.concentration + model.massYield * consumed
    return {
      time,
      substrate,
      product,
      enzyme: active(f),
      temperature: temperatureAt(run.course, Number.isFinite(τ) ? τ : 0),
      pH: run.pH,
      volume: feed.volume,
      conversion: consumed / S0,
      imbalance: (substrate + product / model.massYield) / supplied - 1,
    }
  }

  /** Enzyme-time supplied and forms left after τ of a run at steady temperature. */
  const steady = (run: Run) => {
    const T = run.course.from
    const k = model.k(run.pH)(T)
    const k1 = inactivation ? inactivation.k1(run.pH)(T) : 0
    const k2 = inactivation?.k2?.(run.pH)(T)
    const start = forms
    const supply = (τ: number): number => {
      if (k2 === undefined) {
        if (τ === Number.POSITIVE_INFINITY)
          return k1 > 0 ? (k * start.native) / k1 : unless0(k * start.native)
        return k * start.native * τ * decayMean(k1 * τ)
      }
      if (τ === Number.POSITIVE_INFINITY) return endlessSupply(k, k1, k2, start)
      const integrals = formIntegrals(start, k1, k2, τ)
      return k * active(integrals)
    }
    const endlessSupply = (k: number, k1: number, k2: number, from: EnzymeForms): number => {
      const lasting =
        k1 === 0
          ? active(from)
          : k2 === 0
            ? residual.first
            : residual.second * (from.native + from.intermediate + from.final)
      if (k * lasting > 0) return Number.POSITIVE_INFINITY
      return (k * from.native) / k1 + (residual.first * k * (from.native + from.intermediate)) / k2
    }
    const left = (τ: number): EnzymeForms => {
      if (k2 !== undefined)
        return τ === Number.POSITIVE_INFINITY
          ? formsAfter(start, k1, k2, Number.MAX_VALUE)
          : formsAfter(start, k1, k2, τ)
      const decay = k1 === 0 ? 0 : k1 * τ
      return { native: start.native * Math.exp(-decay), intermediate: 0, final: 0 }
    }
    /** Time in which the run supplies an amount; null where it never does. */
    const timeFor = (amount: number): number | null => {
      if (k2 === undefined) {
        const undecayed = amount / (k * start.native)
        if (!Number.isFinite(undecayed)) return null
        const x = k1 * undecayed
        return x < 1 ? undecayed * logStretch(x) : null
      }
      if (!(supply(Number.POSITIVE_INFINITY) > amount)) return null
      let high = amount / (k * active(start)) || 1
      while (supply(high) < amount) high *= 2
      return increasingRoot(
        (τ, at) => {
          at.value = supply(τ) - amount
          at.slope = k * active(formsAfter(start, k1, k2, τ))
        },
        0,
        high,
        0.5 * high,
      )
    }
    return { supply, left, timeFor }
  }

  /** The same for a run whose temperature moves; the enzyme is then lost in one step only. */
  const moving = (run: Run, length: number) => {
    const E = forms.native
    const constants = { k: model.k(run.pH), ...(inactivation && { k1: inactivation.k1(run.pH) }) }
    const ends = cellEnds(constants, model.steepness, run.course, length)
    const starts: { at: number; supplied: number; loss: number }[] = [{ at: 0, supplied: 0, loss: 0 }]
    const stretch: Stretch = { supplied: 0, loss: 0 }
    let a = 0
    for (const b of ends) {
      addCell(constants, run.course, a, b, stretch)
      starts.push({ at: b, supplied: stretch.supplied, loss: stretch.loss })
      a = b
    }
    const upTo = (τ: number): Stretch => {
      let i = 0
      while (i + 1 < starts.length && (starts[i + 1] as { at: number }).at <= τ) i++
      const start = starts[i] as { at: number; supplied: number; loss: number }
      const at: Stretch = { supplied: start.supplied, loss: start.loss }
      if (τ > start.at) addCell(constants, run.course, start.at, τ, at)
      return at
    }
    const supply = (τ: number): number => E * upTo(τ).supplied
    const left = (τ: number): EnzymeForms => ({
      native: E * Math.exp(-upTo(τ).loss),
      intermediate: 0,
      final: 0,
    })
    const timeFor = (amount: number): number | null => {
      if (!(E * stretch.supplied >= amount)) return null
      let i = 1
      while (E * (starts[i] as Stretch).supplied < amount) i++
      const low = starts[i - 1] as { at: number; supplied: number }
      const high = starts[i] as { at: number; supplied: number }
      const share = (amount / E - low.supplied) / (high.supplied - low.supplied)
      return increasingRoot(
        (τ, at) => {
          const here = upTo(τ)
          at.value = E * here.supplied - amount
          at.slope = E * constants.k(temperatureAt(run.course, τ)) * Math.exp(-here.loss)
        },
        low.at,
        high.at,
        low.at + share * (high.at - low.at),
      )
    }
    return { supply, left, timeFor }
  }

  return {
    supplied: () => spent,
    dose: (mass) => {
      forms = { ...forms, native: forms.native + mass / feed.volume }
    },
    conversion: () => path.consumed(u) / S0,
    activeEnzyme: () => active(forms) * feed.volume,
    state: (time, run, elapsed) => stateAt(u, forms, run, elapsed, time),
    work: () => ({ stepsAccepted: 0, stepsRejected: 0, rateEvaluations: 0, jacobians: 0 }),
    advance: (run, length, stopAt, outputs) => {
      const alive = forms.native > 0 || forms.intermediate > 0 || forms.final > 0
      const piece = run.course.kind === 'steady' || !alive ? steady(run) : moving(run, length)
      let elapsed = length
      let stopped = false
      if (stopAt !== undefined && alive) {
        const target = path.coordinate(stopAt)
        const due = target === null ? null : path.demand(target) - spent
        const time = due === null ? null : due <= 0 ? 0 : piece.timeFor(due)
        if (time !== null && time <= length && target !== null) {
          elapsed = time
          stopped = true
          u = target
        }
      }
      const states: BatchState[] = []
      let near = u
      for (const τ of outputs) {
        if (τ > elapsed + sameMoment) break
        near = coordinateAfter(path, spent + piece.supply(τ), stopped ? 0 : near)
        states.push(stateAt(near, piece.left(τ), run, τ, τ))
      }
      spent += piece.supply(elapsed)
      forms = piece.left(elapsed)
      if (!stopped) u = coordinateAfter(path, spent, u)
      const value: Advance = { elapsed, stopped, outputs: states }
      return success(value)
    },
  }
}

/** Endless supply of an enzyme that does not decay: without bound if there is any. */
const unless0 = (rate: number): number => (rate > 0 ? Number.POSITIVE_INFINITY : 0)
