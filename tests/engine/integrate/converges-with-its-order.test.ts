import { expect, test } from 'vitest'
import { createDoubling } from '../../../engine/integrate/doubling.ts'
import type { Method } from '../../../engine/integrate/method.ts'
import { rodas } from '../../../engine/integrate/rodas-table.ts'
import { createRosenbrock } from '../../../engine/integrate/rosenbrock.ts'
import { driven } from './problems.ts'

/** Largest error of equal steps, at their ends or at a fraction of the last one. */
const errorOf = (method: Method, steps: number, theta: number): number => {
  const { rate, start, end, initial } = driven.problem
  // Everything is accepted at these tolerances; their ratio only sets increments.
  method.adopt(rate, 1e6, 1e6)
  const h = (end - start) / steps
  const y = initial.slice()
  const f = new Float64Array(2)
  for (let i = 0; i < steps; i++) {
    rate(f, y, start + i * h)
    method.attempt(start + i * h, h, y, f)
    if (i < steps - 1) y.set(method.next)
  }
  method.settle()
  method.at(theta, y)
  const exact = driven.at(end - (1 - theta) * h)
  return Math.max(...exact.map((value, i) => Math.abs((y[i] as number) - value)))
}

const order = (method: Method, steps: number, theta = 1): number =>
  Math.log2(errorOf(method, steps, theta) / errorOf(method, 2 * steps, theta))

test('step doubling is of fifth order, and so is its interpolant', () => {
  expect(order(createDoubling(2), 40)).toBeGreaterThan(4.7)
  expect(order(createDoubling(2), 40)).toBeLessThan(5.3)
  for (const theta of [0.2, 0.5, 0.7]) expect(order(createDoubling(2), 40, theta)).toBeGreaterThan(4.7)
})

test('the implicit method is of fourth order or better where the rate depends on time', () => {
  expect(order(createRosenbrock(2), 60)).toBeGreaterThan(3.7)
})

test('inside a step the implicit method is as exact as at its end', () => {
  for (const theta of [0.3, 0.6]) expect(order(createRosenbrock(2), 60, theta)).toBeGreaterThan(3.7)
})

test('the coefficients of the implicit method meet the conditions of order four', () => {
  // Source: Hairer & Wanner II, table IV.7.1; B = α + Γ, Γ from (1/γ)·I − C = Γ⁻¹.
  const n = 6
  const rows = [...Array(n).keys()]
  const last = rodas.a[4] as readonly number[]
  const a = rows.map((i) => {
    if (i < 5) return rows.map((j) => (rodas.a[i] as readonly number[])[j] ?? 0)
    return [...last, 1, 0]
  })
  const m = [...last, 1, 1]
  // Γ is lower triangular: invert column by column.
  const inverse = rows.map((i) =>
    rows.map((j) => (i === j ? 1 / rodas.gamma : -((rodas.c[i] as readonly number[])[j] ?? 0))),
  )
  const gamma = rows.map(() => rows.map(() => 0))
  const get = (x: number[][], i: number, j: number) => (x[i] as number[])[j] as number
  for (const j of rows) {
    for (let i = j; i < n; i++) {
      let sum = i === j ? 1 : 0
      for (let k = j; k < i; k++) sum -= get(inverse, i, k) * get(gamma, k, j)
      ;(gamma[i] as number[])[j] = sum / get(inverse, i, i)
    }
  }
  const total = (f: (k: number) => number) => rows.reduce((sum, k) => sum + f(k), 0)
  const alpha = rows.map((i) => rows.map((j) => total((k) => get(a, i, k) * get(gamma, k, j))))
  const b = rows.map((j) => total((k) => (m[k] as number) * get(gamma, k, j)))
  const beta = rows.map((i) => rows.map((j) => get(alpha, i, j) + get(gamma, i, j)))
  const sumAlpha = rows.map((i) => total((j) => get(alpha, i, j)))
  const sumBeta = rows.map((i) => total((j) => get(beta, i, j)))
  const weighed = (f: (i: number) => number) => total((i) => (b[i] as number) * f(i))
  const A = (i: number) => sumAlpha[i] as number
  const B = (i: number) => sumBeta[i] as number

  expect(weighed(() => 1)).toBeCloseTo(1, 12)
  expect(weighed(B)).toBeCloseTo(1 / 2, 12)
  expect(weighed((i) => A(i) ** 2)).toBeCloseTo(1 / 3, 12)
  expect(weighed((i) => total((j) => get(beta, i, j) * B(j)))).toBeCloseTo(1 / 6, 12)
  expect(weighed((i) => A(i) ** 3)).toBeCloseTo(1 / 4, 12)
  expect(weighed((i) => A(i) * total((j) => get(alpha, i, j) * B(j)))).toBeCloseTo(1 / 8, 12)
  expect(weighed((i) => total((j) => get(beta, i, j) * A(j) ** 2))).toBeCloseTo(1 / 12, 12)
  expect(weighed((i) => total((j) => get(beta, i, j) * total((k) => get(beta, j, k) * B(k))))).toBeCloseTo(
    1 / 24,
    12,
  )
  for (const [i, value] of rodas.alpha.entries()) expect(A(i)).toBeCloseTo(value, 12)
  for (const [i, value] of rodas.d.entries()) expect(total((j) => get(gamma, i, j))).toBeCloseTo(value, 12)
})
