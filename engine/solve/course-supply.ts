/**
 * Enzyme-time supplied while the temperature moves: ∫k(T)·E dt with E falling by ∫kd(T) dt, by Gauss–Legendre in
 * cells short enough that neither rate constant nor the enzyme changes much within one.
 *
 * Source   composite Gauss–Legendre; the inner integral of kd is carried from node to node by a 4-point rule.
 */
import { gauss4, gauss8 } from '../numeric/gauss-legendre.ts'
import type { EnzymeModel } from './enzyme-model.ts'
import { type TemperatureCourse, temperatureAt, timeAtTemperature } from './temperature-course.ts'

/** Change of ln k or ln kd within a cell that leaves 8 nodes at round-off. */
const cellSpan = 1.4
/** Enzyme lost within a cell, in e-folds, that leaves 8 nodes at round-off. */
const cellLoss = 2.5
/** Past this many e-folds what is still supplied is below the last digit of what was. */
const spent = 45

/** The rate constants of one pH as functions of temperature. */
export interface RateConstantsOfTemperature {
  readonly k: (T: number) => number
  readonly k1?: (T: number) => number
}

/** A stretch of a course: enzyme-time and loss (∫kd dt) since its start, filled in place. */
export interface Stretch {
  supplied: number
  loss: number
}

/** One cell from a to b added to a stretch, for one unit of enzyme at the course's start. */
export function addCell(
  { k, k1 }: RateConstantsOfTemperature,
  course: TemperatureCourse,
  a: number,
  b: number,
  stretch: Stretch,
): void {
  const width = b - a
  let loss = stretch.loss
  let sum = 0
  let at = a
  for (let i = 0; i < 8; i++) {
    const node = a + width * (gauss8.nodes[i] as number)
    if (k1) loss += lossBetween(k1, course, at, node)
    at = node
    sum += (gauss8.weights[i] as number) * k(temperatureAt(course, node)) * Math.exp(-loss)
  }
  if (k1) loss += lossBetween(k1, course, at, b)
  stretch.supplied += width * sum
  stretch.loss = loss
}

function lossBetween(k1: (T: number) => number, course: TemperatureCourse, from: number, to: number): number {
  const width = to - from
  let sum = 0
  for (let i = 0; i < 4; i++)
    sum +=
      (gauss4.weights[i] as number) * k1(temperatureAt(course, from + width * (gauss4.nodes[i] as number)))
  return width * sum
}

/**
 * The ends of the cells that a course needs up to `length`, ascending, the first after 0.
 *
 * Shapes   equal steps of temperature, each cut further where the enzyme would be lost within it.
 */
export function cellEnds(
  { k1 }: RateConstantsOfTemperature,
  steepness: EnzymeModel['steepness'],
  course: TemperatureCourse,
  length: number,
): number[] {
  const from = course.from
  const to = temperatureAt(course, length)
  const coolest = Math.min(from, to)
  const steepest = Math.max(steepness.rate, steepness.inactivation)
  const span = (steepest * Math.abs(to - from)) / (coolest * Math.max(from, to))
  const cells = Math.min(4000, Math.max(1, Math.ceil(span / cellSpan)))
  const ends: number[] = []
  let a = 0
  let loss = 0
  for (let i = 1; i <= cells; i++) {
    const b =
      i === cells ? length : Math.min(length, timeAtTemperature(course, from + ((to - from) * i) / cells))
    if (k1 && loss < spent) {
      const before = k1(temperatureAt(course, a))
      const after = k1(temperatureAt(course, b))
      const fastest = Math.max(before, after)
      const cuts = Math.min(64, Math.ceil((fastest * (b - a)) / cellLoss))
      for (let j = 1; j < cuts; j++) ends.push(a + ((b - a) * j) / cuts)
      loss += 0.5 * (before + after) * (b - a)
    }
    ends.push(b)
    a = b
  }
  return ends
}
