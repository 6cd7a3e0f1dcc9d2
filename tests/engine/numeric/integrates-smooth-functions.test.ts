import { describe, expect, test } from 'vitest'
import {
  integrateToNodesInto,
  integrateWhole,
  legendreCoefficientsInto,
  order,
  seriesAtInto,
} from '../../../engine/numeric/collocation.ts'
import { gauss16, gaussLegendre } from '../../../engine/numeric/gauss-legendre.ts'

test('five nodes and weights are the tabulated ones (Abramowitz & Stegun 25.4.30, on [−1, 1])', () => {
  const { nodes, weights } = gaussLegendre(5)
  expect(2 * (nodes[4] as number) - 1).toBeCloseTo(0.906179845938664, 14)
  expect(2 * (nodes[3] as number) - 1).toBeCloseTo(0.538469310105683, 14)
  expect(2 * (weights[2] as number)).toBeCloseTo(0.568888888888889, 14)
  expect(2 * (weights[0] as number)).toBeCloseTo(0.236926885056189, 14)
})

test('sixteen nodes integrate every power up to the thirty-first exactly', () => {
  for (let power = 0; power < 32; power++) {
    let sum = 0
    for (let i = 0; i < 16; i++) sum += (gauss16.weights[i] as number) * (gauss16.nodes[i] as number) ** power
    expect(Math.abs(sum * (power + 1) - 1)).toBeLessThan(2e-14)
  }
})

describe('an exponential known at the nodes', () => {
  const values = Float64Array.from({ length: order }, (_, i) => Math.exp(3 * (gauss16.nodes[i] as number)))

  test('is integrated from 0 to each node', () => {
    const running = new Float64Array(order)
    integrateToNodesInto(running, values)
    running.forEach((sum, i) => {
      expect(sum).toBeCloseTo(Math.expm1(3 * (gauss16.nodes[i] as number)) / 3, 12)
    })
  })

  test('is integrated as a whole', () => {
    expect(integrateWhole(values)).toBeCloseTo(Math.expm1(3) / 3, 13)
  })

  test('is known with its integral everywhere between', () => {
    const series = new Float64Array(order)
    legendreCoefficientsInto(series, values)
    const point = { integral: 0, value: 0 }
    for (let x = 0; x <= 1; x += 0.01) {
      seriesAtInto(point, series, x)
      expect(point.value).toBeCloseTo(Math.exp(3 * x), 10)
      expect(point.integral).toBeCloseTo(Math.expm1(3 * x) / 3, 11)
    }
  })
})
