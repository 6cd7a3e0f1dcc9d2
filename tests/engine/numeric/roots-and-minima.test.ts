import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { minimum } from '../../../engine/numeric/minimum.ts'
import { bracketedRoot, increasingRoot } from '../../../engine/numeric/roots.ts'

describe('a bracketed root', () => {
  test('of a cubic is found to round-off (closed form: the cube root)', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (c) => {
        expect(bracketedRoot((x) => x ** 3 - c, 0, 1 + c)).toBeCloseTo(Math.cbrt(c), 9)
      }),
    )
  })

  test('at an end of the bracket is that end', () => {
    expect(bracketedRoot((x) => x - 2, 2, 5)).toBe(2)
    expect(bracketedRoot((x) => x - 5, 2, 5)).toBe(5)
  })

  test('of a step function is the place of the step', () => {
    expect(bracketedRoot((x) => (x < Math.PI ? -1 : 1), 0, 10)).toBeCloseTo(Math.PI, 12)
  })
})

describe('the root of an increasing function', () => {
  test('keeps its digits over three hundred decades of scale', () => {
    for (const scale of [1e-150, 1e-9, 1, 1e9, 1e150]) {
      const root = increasingRoot(
        (x, at) => {
          at.value = (x / scale) ** 3 - 8
          at.slope = (3 * (x / scale) ** 2) / scale
        },
        0,
        100 * scale,
        50 * scale,
      )
      expect(Math.abs(root / (2 * scale) - 1)).toBeLessThan(4e-16)
    }
  })

  test('is found where Newton alone runs away (arctangent from far out)', () => {
    const root = increasingRoot(
      (x, at) => {
        at.value = Math.atan(x - 3)
        at.slope = 1 / (1 + (x - 3) ** 2)
      },
      -1e6,
      1e6,
      9e5,
    )
    expect(root).toBeCloseTo(3, 12)
  })
})

describe('a minimum', () => {
  test('is found to more digits than comparing values could give', () => {
    // x·e^(−x) turned over: stationary at x = 1 exactly.
    const found = minimum((x) => -x * Math.exp(-x), 0.1, 6)
    expect(Math.abs((found?.at ?? 0) - 1)).toBeLessThan(1e-11)
    expect(found?.atBound).toBe(false)
  })

  test('is the lowest of several valleys', () => {
    // sin x + sin(10x/3) on [2.7, 7.5]: published global minimum at 5.145735 (a common test function, from memory).
    const found = minimum((x) => Math.sin(x) + Math.sin((10 * x) / 3), 2.7, 7.5)
    expect(found?.at).toBeCloseTo(5.145735, 5)
  })

  test('at an end of the range is called so', () => {
    expect(minimum((x) => x, 2, 5)).toEqual({ at: 2, value: 2, atBound: true })
    expect(minimum((x) => -x, 2, 5)).toEqual({ at: 5, value: -5, atBound: true })
  })

  test('is found beside places without a value', () => {
    const found = minimum((x) => (x < 3 ? Number.POSITIVE_INFINITY : (x - 4) ** 2), 0, 10)
    expect(found?.at).toBeCloseTo(4, 9)
  })

  test('of a function that has no value anywhere is none', () => {
    expect(minimum(() => Number.POSITIVE_INFINITY, 0, 1)).toBeNull()
  })
})
