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

/** The nodes lie symmetrically: what is even and what is odd about the middle are summed apart, over half of them. */
const half = order / 2

/** Running integral at node i < half from even and odd sums of values: half × half, row by row, the two alternating. */
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
  const matrix = new Float64Array(2 * half * half)
  const at = (k: number, i: number): number => (P[k] as Float64Array)[i] as number
  const toNode = (i: number, j: number): number => {
    let sum = gauss16.nodes[i] as number
    for (let k = 1; k < order; k++) sum += 0.5 * at(k, j) * (at(k + 1, i) - at(k - 1, i))
    return (gauss16.weights[j] as number) * sum
  }
  for (let i = 0; i < half; i++) {
    for (let j = 0; j < half; j++) {
      const near = toNode(i, j)
      const far = toNode(i, order - 1 - j)
      matrix[2 * (i * half + j)] = 0.5 * (near + far)
      matrix[2 * (i * half + j) + 1] = 0.5 * (near - far)
    }
  }
  return matrix
}

/** Fills `running` with ∫_0^node of the interpolant of `values`, on [0, 1]; returns ∫_0^1. */
export function integrateToNodesInto(running: Float64Array, values: Float64Array): number {
  const whole = integrateWhole(values)
  for (let i = 0; i < half; i++) {
    let even = 0
    let odd = 0
    let entry = 2 * i * half
    for (let j = 0; j < half; j++) {
      const near = values[j] as number
      const far = values[order - 1 - j] as number
      even += (toNodes[entry] as number) * (near + far)
      odd += (toNodes[entry + 1] as number) * (near - far)
      entry += 2
    }
    running[i] = odd + even
    running[order - 1 - i] = odd - even + whole
  }
  return whole
}

/** ∫_0^1 of the interpolant of `values`. */
export function integrateWhole(values: Float64Array): number {
  let sum = 0
  for (let j = 0; j < order; j++) sum += (gauss16.weights[j] as number) * (values[j] as number)
  return sum
}

/** Legendre coefficient k from even (k even) or odd sums of values: order × half, row by row. */
const toSeries = seriesMatrix()

function seriesMatrix(): Float64Array {
  const P = legendreAtNodes()
  const matrix = new Float64Array(order * half)
  for (let k = 0; k < order; k++)
    for (let j = 0; j < half; j++)
      matrix[k * half + j] =
        (2 * k + 1) * (gauss16.weights[j] as number) * ((P[k] as Float64Array)[j] as number)
  return matrix
}

/** Fills `coefficients` with those of the interpolant in Legendre polynomials of 2x − 1. */
export function legendreCoefficientsInto(coefficients: Float64Array, values: Float64Array): void {
  for (let k = 0; k < order; k += 2) {
    let even = 0
    let odd = 0
    const row = k * half
    for (let j = 0; j < half; j++) {
      const near = values[j] as number
      const far = values[order - 1 - j] as number
      even += (toSeries[row + j] as number) * (near + far)
      odd += (toSeries[row + half + j] as number) * (near - far)
    }
    coefficients[k] = even
    coefficients[k + 1] = odd
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

/** Where in [0, 1] the integral of a positive series reaches `due`: Newton's method in a bracket; `point` is scratch. */
export function seriesReaches(
  point: SeriesPoint,
  coefficients: Float64Array,
  due: number,
  start: number,
): number {
  let low = 0
  let high = 1
  let x = start
  for (let i = 0; i < 60; i++) {
    seriesAtInto(point, coefficients, x)
    const surplus = point.integral - due
    if (surplus < 0) low = x
    else high = x
    let better = x - surplus / point.value
    if (!(better >= low && better <= high)) better = 0.5 * (low + high)
    const step = Math.abs(better - x)
    x = better
    if (step < 1e-15) break
  }
  return x
}
