/**
 * Enzyme-time supplied while the temperature moves: ∫k(T)·E dt with E falling by ∫kd(T) dt, both integrated by
 * collocation at Gauss–Legendre nodes, in cells short enough that neither rate constant nor the enzyme changes much
 * within one.
 *
 * Source   composite Gauss–Legendre; the inner integral by the interpolant through the same nodes.
 */
import {
  integrateToNodesInto,
  integrateWhole,
  legendreCoefficientsInto,
  order,
  type SeriesPoint,
  seriesAtInto,
  seriesReaches,
} from '../numeric/collocation.ts'
import { gauss16 } from '../numeric/gauss-legendre.ts'
import type { EnzymeModel } from './enzyme-model.ts'
import { type TemperatureCourse, temperatureAt, timeAtTemperature } from './temperature-course.ts'

const { nodes } = gauss16

/** Change of ln k or ln kd within a cell whose 16 nodes keep the running integral at 1e-11 of itself. */
const cellSpan = 6
/** The same where hardly any enzyme is lost, so that an error of 3e-11 of the loss does not count. */
const calmSpan = 9
/** Loss over the course, in e-folds, below which that is so. */
const calmLoss = 0.1
/** Change of the logarithm of a two-state equilibrium within a cell: it turns from flat to steep within a few. */
const turnSpan = 2
/** Enzyme lost within a cell, in e-folds, that keeps it there. */
const cellLoss = 1.3
/** Before this share of a cell a time is sought in a smaller one, of this share at least, and so often at most. */
const earlyShare = 0.1
const leastNarrowing = 1e-4
const mostNarrowings = 60
/** Past this many e-folds what is still supplied is below the last digit of what was. */
const spent = 45

/** The rate constants of one pH as functions of temperature. */
export interface RateConstantsOfTemperature {
  readonly k: (T: number) => number
  readonly k1: ((T: number) => number) | undefined
}

/** Room for one course at a time, to be used again and again. */
export interface CourseWorkspace {
  readonly loss: Float64Array
  readonly running: Float64Array
  readonly rate: Float64Array
  readonly rateSeries: Float64Array
  readonly lossSeries: Float64Array
  readonly point: SeriesPoint
}

/** Makes the room that a `CourseSupply` works in. */
export const courseWorkspace = (): CourseWorkspace => ({
  loss: new Float64Array(order),
  running: new Float64Array(order),
  rate: new Float64Array(order),
  rateSeries: new Float64Array(order),
  lossSeries: new Float64Array(order),
  point: { integral: 0, value: 0 },
})

/** The supply of one course for one unit of enzyme at its start, made cell by cell as far as it is asked. */
export class CourseSupply {
  private readonly constants: RateConstantsOfTemperature
  private readonly course: TemperatureCourse
  private readonly length: number
  private readonly cells: number
  /** Too little is lost for a cell to be cut. */
  private readonly calm: boolean
  private readonly temperatureStep: number
  /** The present cell: its number, ends, and what had been supplied and lost before it. */
  private cell = -1
  private cellEnd = 0
  private from = 0
  private to = 0
  private suppliedBefore = 0
  private lostBefore = 0
  private suppliedWithin = 0
  private lostWithin = 0
  private fresh = false
  private readonly room: CourseWorkspace

  constructor(
    constants: RateConstantsOfTemperature,
    steepness: EnzymeModel['steepness'],
    course: TemperatureCourse,
    length: number,
    room: CourseWorkspace,
    mostCells: number,
  ) {
    this.room = room
    this.constants = constants
    this.course = course
    this.length = length
    const from = course.from
    const to = temperatureAt(course, length)
    const steepest = Math.max(steepness.rate, steepness.inactivation)
    const reach = Math.abs(to - from) / (from * to)
    const span = steepest * reach
    const { k1 } = constants
    // A constant that grows e-fold `span` times along a ramp has nearly all its integral in the last of these e-folds.
    const most = k1 ? Math.max(k1(from), k1(to)) * length : 0
    this.calm = most < Math.min(cellLoss, calmLoss * Math.max(1, span))
    const widest = this.calm ? calmSpan : cellSpan
    const turns = (steepness.loss * reach) / turnSpan
    this.cells = Math.min(mostCells, Math.max(1, Math.ceil(Math.max(span / widest, turns))))
    this.temperatureStep = (to - from) / this.cells
    this.next()
  }

  /** Supplied up to τ, s. */
  suppliedUntil(τ: number): number {
    this.seek(τ)
    return this.suppliedBefore + this.within(this.room.rateSeries, τ)
  }

  /** ∫kd dt up to τ: the enzyme left is e to its negative. */
  lostUntil(τ: number): number {
    if (!this.constants.k1) return 0
    this.seek(τ)
    return this.lostBefore + this.within(this.room.lossSeries, τ)
  }

  /** Supplied over the whole length. */
  supplied(): number {
    while (this.next());
    return this.suppliedBefore + this.suppliedWithin
  }

  /** ∫kd dt over the whole length. */
  lost(): number {
    while (this.next());
    return this.lostBefore + this.lostWithin
  }

  /** Time at which `amount` has been supplied; null where the course ends before. */
  timeFor(amount: number): number | null {
    while (this.suppliedBefore + this.suppliedWithin < amount) if (!this.next()) return null
    if (!(this.suppliedWithin > 0)) return this.from
    let x = this.shareFor(amount)
    // The digits of a cell are those of its whole: what is supplied early in it is found in a smaller one.
    for (let i = 0; i < mostNarrowings && x < earlyShare; i++) {
      this.to = this.from + Math.max(2 * x, leastNarrowing) * this.width()
      if (!(this.to > this.from)) return this.from
      this.fill()
      while (this.suppliedBefore + this.suppliedWithin < amount && this.to < this.cellEnd) {
        this.to = Math.min(this.cellEnd, this.from + 4 * this.width())
        this.fill()
      }
      x = this.shareFor(amount)
    }
    return this.from + x * this.width()
  }

  /** The share of the present cell's width at which `amount` has been supplied. */
  private shareFor(amount: number): number {
    this.prepareSeries()
    const { point, rateSeries } = this.room
    const due = amount - this.suppliedBefore
    return seriesReaches(point, rateSeries, due / this.width(), Math.min(1, due / this.suppliedWithin))
  }

  private width(): number {
    return this.to - this.from
  }

  /** Integral of a series over the present cell up to τ. */
  private within(series: Float64Array, τ: number): number {
    if (!(this.to > this.from)) return 0
    const { point } = this.room
    seriesAtInto(point, series, Math.min(1, Math.max(0, (τ - this.from) / this.width())))
    return this.width() * point.integral
  }

  /** Goes on to the cell that holds τ; earlier cells are not kept, so τ never goes back. */
  private seek(τ: number): void {
    while (this.to < τ && this.next());
    this.prepareSeries()
  }

  private prepareSeries(): void {
    if (this.fresh) return
    this.fresh = true
    legendreCoefficientsInto(this.room.rateSeries, this.room.rate)
    if (this.constants.k1) legendreCoefficientsInto(this.room.lossSeries, this.room.loss)
  }

  /** Takes up the next cell or the next piece of it; false at the end of the course. */
  private next(): boolean {
    if (!(this.to < this.cellEnd)) {
      if (this.cell + 1 >= this.cells) return false
      this.cell++
      const { course, cells, cell, length } = this
      this.cellEnd =
        cell + 1 === cells
          ? length
          : Math.min(length, timeAtTemperature(course, course.from + this.temperatureStep * (cell + 1)))
    }
    this.suppliedBefore += this.suppliedWithin
    this.lostBefore += this.lostWithin
    this.from = this.to
    this.to = this.pieceEnd(this.from, this.cellEnd)
    this.fill()
    return true
  }

  /** How far a piece of a cell may go so that the enzyme does not die within it. */
  private pieceEnd(from: number, end: number): number {
    const { k1 } = this.constants
    if (!k1 || this.calm || this.lostBefore > spent) return end
    const before = k1(temperatureAt(this.course, from))
    let to = end
    for (;;) {
      const loss = Math.max(before, k1(temperatureAt(this.course, to))) * (to - from)
      if (!(loss > cellLoss)) return to
      const shorter = from + (to - from) * Math.max(0.125, cellLoss / loss)
      if (!(shorter > from && shorter < to)) return to
      to = shorter
    }
  }

  private fill(): void {
    const { course } = this
    const { loss, rate, running } = this.room
    const { k, k1 } = this.constants
    const width = this.width()
    this.fresh = false
    const linear = course.kind === 'linear'
    const slope = linear ? course.slope : 0
    if (!k1) {
      for (let i = 0; i < order; i++) {
        const τ = this.from + width * (nodes[i] as number)
        rate[i] = k(linear ? course.from + slope * τ : temperatureAt(course, τ))
      }
    } else {
      for (let i = 0; i < order; i++) {
        const τ = this.from + width * (nodes[i] as number)
        const T = linear ? course.from + slope * τ : temperatureAt(course, τ)
        loss[i] = k1(T)
        rate[i] = k(T)
      }
      this.lostWithin = width * integrateToNodesInto(running, loss)
      for (let i = 0; i < order; i++)
        rate[i] = (rate[i] as number) * left(this.lostBefore + width * (running[i] as number))
    }
    this.suppliedWithin = width * integrateWhole(rate)
  }
}

/** e^(−loss), by its series where hardly anything is lost yet: most of a heat-up, and much cheaper there. */
const left = (loss: number): number =>
  loss > 0.03
    ? Math.exp(-loss)
    : 1 - loss * (1 - (loss / 2) * (1 - (loss / 3) * (1 - (loss / 4) * (1 - (loss / 5) * (1 - loss / 6)))))
