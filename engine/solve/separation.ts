/**
 * The route by separation: what the enzyme supplies (∫k·E dt) does not depend on the substrate, what the conversion
 * demands does not depend on time, so a batch of constant volume needs one integral and one root, and no stepping.
 *
 * Source   separation of variables; closed forms where the temperature stands still, Gauss–Legendre where it moves.
 */
import type { Charge } from '../kinetics/integrated-rate-law.ts'
import type { EnzymeForms } from '../kinetics/series-inactivation.ts'
import { type Outcome, success } from '../outcome.ts'
import { CourseSupply, type CourseWorkspace, courseWorkspace } from './course-supply.ts'
import { type Advance, type Mover, march, sameMoment } from './march.ts'
import { coordinateAfter, type ReactionPath, reactionPath } from './reaction-path.ts'
import type { Batch, BatchState, Route, RouteFailure } from './route.ts'
import { activeOf, type SteadyConstants, steadyForms, steadySupply, steadyTimeFor } from './steady-supply.ts'
import { temperatureAt } from './temperature-course.ts'
import type { Run } from './timeline.ts'

/** The path of a batch that separates. */
export function pathOf({ feed, model, timeline }: Batch): ReactionPath {
  const charge: Charge = {
    S0: feed.substrate.concentration,
    P0: feed.product.concentration,
    massYield: model.massYield,
  }
  return reactionPath(model.law(timeline.after.pH), charge, feed.substrate.slow)
}

/**
 * The route of a batch that separates.
 *
 * Shapes   a workspace may be handed in and is then shared with other routes, one run at a time.
 */
export function separationRoute(batch: Batch, room: CourseWorkspace = courseWorkspace()): Route {
  const path = pathOf(batch)
  return (request) => march(batch, new SeparationMover(batch, path, room), request)
}

/**
 * Enzyme-time that a separable batch supplies until a moment (s from the programme's start, Infinity allowed) for
 * its stated doses, kg/m³; it grows in proportion to the doses unless a hold waits for a conversion.
 */
export function supplyUntil(batch: Batch, until: number, endless: boolean): Outcome<number, RouteFailure> {
  const mover = new SeparationMover(batch, pathOf(batch), courseWorkspace())
  const run = march(batch, mover, { doseScale: 1, until, endless })
  return run.ok ? success(mover.supplied) : run
}

const noWork = { stepsAccepted: 0, stepsRejected: 0, rateEvaluations: 0, jacobians: 0 }

/** A separable batch in motion: enzyme-time supplied and forms of the enzyme; the substrate is found when asked. */
class SeparationMover implements Mover {
  /** Enzyme-time since the start, kg/m³. */
  supplied = 0
  private readonly batch: Batch
  private readonly path: ReactionPath
  private readonly room: CourseWorkspace
  private readonly mostCells: number
  private readonly residual: SteadyConstants['residual']
  private forms: EnzymeForms = { native: 0, intermediate: 0, final: 0 }
  /** The coordinate that `supplied` comes to, once it has been sought. */
  private u = 0
  private uAt = 0
  private aimedAt = Number.NaN
  private targetAt: number | null = null
  private demanded = Number.POSITIVE_INFINITY

  constructor(batch: Batch, path: ReactionPath, room: CourseWorkspace) {
    this.batch = batch
    this.path = path
    this.room = room
    this.mostCells = mostCellsOf(batch)
    this.residual = batch.model.inactivation?.residual ?? { first: 0, second: 0 }
  }

  dose(mass: number): void {
    const { native, intermediate, final } = this.forms
    this.forms = { native: native + mass / this.batch.feed.volume, intermediate, final }
  }

  reached(conversion: number): boolean {
    this.aim(conversion)
    return this.targetAt !== null && (this.u >= this.targetAt || this.supplied >= this.demanded)
  }

  /** Coordinate and demand of the conversion that is asked for again and again. */
  private aim(conversion: number): void {
    if (this.aimedAt === conversion) return
    this.aimedAt = conversion
    this.targetAt = this.path.coordinate(conversion)
    this.demanded = this.targetAt === null ? Number.POSITIVE_INFINITY : this.path.demand(this.targetAt)
  }

  activeEnzyme(): number {
    return activeOf(this.residual, this.forms) * this.batch.feed.volume
  }

  state(time: number, run: Run, elapsed: number): BatchState {
    return this.stateAt(this.position(), this.forms, run, elapsed, time)
  }

  /** The coordinate that the enzyme-time supplied so far has come to. */
  private position(): number {
    if (this.uAt !== this.supplied) {
      this.u = coordinateAfter(this.path, this.supplied, this.u)
      this.uAt = this.supplied
    }
    return this.u
  }

  work(): typeof noWork {
    return noWork
  }

  advance(
    run: Run,
    length: number,
    stopAt: number | undefined,
    outputs: readonly number[],
  ): Outcome<Advance, RouteFailure> {
    const { native, intermediate, final } = this.forms
    if (!(native > 0 || intermediate > 0 || final > 0)) return this.standStill(run, length, outputs)
    if (stopAt !== undefined) this.aim(stopAt)
    const target = stopAt === undefined ? null : this.targetAt
    const due = target === null ? Number.POSITIVE_INFINITY : this.demanded - this.supplied
    return run.course.kind === 'steady'
      ? this.steadily(run, length, target, due, outputs)
      : this.alongCourse(run, length, target, due, outputs)
  }

  private steadily(
    run: Run,
    length: number,
    target: number | null,
    due: number,
    outputs: readonly number[],
  ): Outcome<Advance, RouteFailure> {
    const { model } = this.batch
    const T = run.course.from
    const constants: SteadyConstants = {
      k: model.k(run.pH)(T),
      k1: model.inactivation ? model.inactivation.k1(run.pH)(T) : 0,
      k2: model.inactivation?.k2?.(run.pH)(T),
      residual: this.residual,
    }
    const { forms } = this
    const stop = due <= 0 ? 0 : due < Number.POSITIVE_INFINITY ? steadyTimeFor(constants, forms, due) : null
    const stopped = stop !== null && stop <= length
    const elapsed = stopped ? stop : length
    const states = this.outputsOf(run, elapsed, outputs, (τ) => ({
      supplied: steadySupply(constants, forms, τ),
      forms: steadyForms(constants, forms, τ),
    }))
    this.settle(stopped ? target : null, due, stopped ? due : steadySupply(constants, forms, elapsed))
    this.forms = steadyForms(constants, forms, elapsed)
    return success({ elapsed, stopped, outputs: states })
  }

  private alongCourse(
    run: Run,
    length: number,
    target: number | null,
    due: number,
    outputs: readonly number[],
  ): Outcome<Advance, RouteFailure> {
    const { model } = this.batch
    const constants = { k: model.k(run.pH), k1: model.inactivation?.k1(run.pH) }
    const E = this.forms.native
    const supply = new CourseSupply(constants, model.steepness, run.course, length, this.room, this.mostCells)
    const stop = due <= 0 ? 0 : due < Number.POSITIVE_INFINITY ? supply.timeFor(due / E) : null
    const stopped = stop !== null
    const elapsed = stopped ? stop : length
    const given = stopped ? due : E * supply.supplied()
    const lost = stopped ? supply.lostUntil(elapsed) : supply.lost()
    // The course is passed once more for the times wanted: cells that lie behind are not kept.
    const again =
      outputs.length > 0
        ? new CourseSupply(constants, model.steepness, run.course, length, courseWorkspace(), this.mostCells)
        : supply
    const states = this.outputsOf(run, elapsed, outputs, (τ) => ({
      supplied: E * again.suppliedUntil(τ),
      forms: { native: E * Math.exp(-again.lostUntil(τ)), intermediate: 0, final: 0 },
    }))
    this.settle(stopped ? target : null, due, given)
    this.forms = { native: E * Math.exp(-lost), intermediate: 0, final: 0 }
    return success({ elapsed, stopped, outputs: states })
  }

  /** A run without enzyme: nothing happens in it but time. */
  private standStill(run: Run, length: number, outputs: readonly number[]): Outcome<Advance, RouteFailure> {
    const states = outputs.map((τ) => this.stateAt(this.position(), this.forms, run, τ, τ))
    return success({ elapsed: length, stopped: false, outputs: states })
  }

  /** Takes up the enzyme-time of a run; at a target exactly what it demanded. */
  private settle(target: number | null, due: number, given: number): void {
    if (target === null) {
      this.supplied += given
      return
    }
    // A hold whose conversion is there already ends where it began.
    if (due <= 0) return
    this.supplied += due
    this.u = target
    this.uAt = this.supplied
  }

  private outputsOf(
    run: Run,
    elapsed: number,
    outputs: readonly number[],
    at: (τ: number) => { readonly supplied: number; readonly forms: EnzymeForms },
  ): readonly BatchState[] {
    if (outputs.length === 0) return noStates
    const states: BatchState[] = []
    let near = this.u
    for (const τ of outputs) {
      if (τ > elapsed + sameMoment) break
      const { supplied, forms } = at(τ)
      near = coordinateAfter(this.path, this.supplied + supplied, near)
      states.push(this.stateAt(near, forms, run, τ, τ))
    }
    return states
  }

  private stateAt(u: number, forms: EnzymeForms, run: Run, τ: number, time: number): BatchState {
    const { feed, model } = this.batch
    const { massYield } = model
    const consumed = this.path.consumed(u)
    const substrate = this.path.substrate(u)
    const product = feed.product.concentration + massYield * consumed
    const S0 = feed.substrate.concentration
    return {
      time,
      substrate,
      product,
      enzyme: activeOf(this.residual, forms),
      temperature: temperatureAt(run.course, Number.isFinite(τ) ? τ : 0),
      pH: run.pH,
      volume: feed.volume,
      conversion: consumed / S0,
      imbalance: (substrate + product / massYield) / (S0 + feed.product.concentration / massYield) - 1,
    }
  }
}

const noStates: readonly BatchState[] = []

/** Cells that all moving courses of a batch may be cut into together; ordinary ramps take ten each. */
const allCells = 8000

const mostCellsOf = ({ timeline }: Batch): number => {
  const moving = timeline.steps.filter((step) => step.kind === 'run' && step.course.kind !== 'steady').length
  return Math.max(32, Math.min(1000, Math.floor(allCells / Math.max(1, moving))))
}
