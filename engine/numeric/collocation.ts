/**
 * A smooth function known at the Gauss–Legendre nodes of [0, 1]: its running integral, at the nodes and anywhere
 * between.
 *
 * Source   discrete orthogonality of the Legendre polynomials at the Gauss nodes (Trefethen, Approximation Theory
 *          and Approximation Practice); ∫P_k = (P_(k+1) − P_(k−1))/(2k + 1).
 */
import { gauss16 } from './gauss-legendre.ts'

/** Number of nodes. */
export const order = 16

/** Running integral of the interpolant at node i from the values at nodes j: order × order, row by row. */
const toNodes = integrationMatrix()

/** P_k at node j, k by k. */
function legendreAtNodes(): Float64Array[] {
  const rows = Array.from({ length: order + 1 }, () => new Float64Array(order))
  for (let j = 0; j < order; j++) {
    const x = 2 * (gauss16.nodes[j] as number) - 1
    let before = 0
    let now = 1
    for (let k = 0; k <= order; k++) {
      ;(rows[k] as Float64Array)[j] = now
      const next = ((2 * k + 1) * x * now - k * before) / (k + 1)
      before = now
      now = next
    }
  }
  return rows
}

function integrationMatrix(): Float64Array {
  const P = legendreAtNodes()
  const matrix = new Float64Array(order * order)
  const at = (k: number, i: number): number => (P[k] as Float64Array)[i] as number
  for (let i = 0; i < order; i++) {
    const x = 2 * (gauss16.nodes[i] as number) - 1
    for (let j = 0; j < order; j++) {
      let sum = 0.5 * (1 + x)
      for (let k = 1; k < order; k++) sum += 0.5 * at(k, j) * (at(k + 1, i) - at(k - 1, i))
      matrix[i * order + j] = (gauss16.weights[j] as number) * sum
    }
  }
  return matrix
}

/** Fills `running` with ∫_0^node of the interpolant of `values`, on [0, 1]. */
export function integrateToNodesInto(running: Float64Array, values: Float64Array): void {
  for (let i = 0; i < order; i++) {
    let sum = 0
    const row = i * order
    for (let j = 0; j < order; j++) sum += (toNodes[row + j] as number) * (values[j] as number)
    running[i] = sum
  }
}

/** ∫_0^1 of the interpolant of `values`. */
export function integrateWhole(values: Float64Array): number {
  let sum = 0
  for (let j = 0; j < order; j++) sum += (gauss16.weights[j] as number) * (values[j] as number)
  return sum
}

/** Legendre coefficient k from the values at nodes j: order × order, row by row. */
const toSeries = seriesMatrix()

function seriesMatrix(): Float64Array {
  const P = legendreAtNodes()
  const matrix = new Float64Array(order * order)
  for (let k = 0; k < order; k++)
    for (let j = 0; j < order; j++)
      matrix[k * order + j] =
        (2 * k + 1) * (gauss16.weights[j] as number) * ((P[k] as Float64Array)[j] as number)
  return matrix
}

/** Fills `coefficients` with those of the interpolant in Legendre polynomials of 2x − 1. */
export function legendreCoefficientsInto(coefficients: Float64Array, values: Float64Array): void {
  for (let k = 0; k < order; k++) {
    let sum = 0
    const row = k * order
    for (let j = 0; j < order; j++) sum += (toSeries[row + j] as number) * (values[j] as number)
    coefficients[k] = sum
  }
}

/** Recurrence P_(k+1) = rise·s·P_k − fall·P_(k−1), and 1/(2(2k + 1)), without divisions in the loop. */
const rise = Float64Array.from({ length: order }, (_, k) => (2 * k + 1) / (k + 1))
const fall = Float64Array.from({ length: order }, (_, k) => k / (k + 1))
const share = Float64Array.from({ length: order }, (_, k) => 0.5 / (2 * k + 1))

/** A Legendre series on [0, 1] and its integral from 0. */
export interface SeriesPoint {
  integral: number
  value: number
}

/** Fills `point` with ∫_0^x of a Legendre series and the series at x, x in [0, 1]. */
export function seriesAtInto(point: SeriesPoint, coefficients: Float64Array, x: number): void {
  const s = 2 * x - 1
  let before = 1
  let now = s
  let integral = 0.5 * (coefficients[0] as number) * (1 + s)
  let value = coefficients[0] as number
  for (let k = 1; k < order; k++) {
    const c = coefficients[k] as number
    const next = (rise[k] as number) * s * now - (fall[k] as number) * before
    integral += c * (share[k] as number) * (next - before)
    value += c * now
    before = now
    now = next
  }
  point.integral = integral
  point.value = value
}
