import fc from 'fast-check'
import { expect, test } from 'vitest'
import { factorise, solveFactorised } from '../../../engine/numeric/linear.ts'

test('a system is solved to round-off, whatever the order of its rows', () => {
  // Source: b made from a known x; each row dominated by one entry, the rows then rotated.
  fc.assert(
    fc.property(
      fc.integer({ min: 1, max: 6 }).chain((n) =>
        fc.record({
          n: fc.constant(n),
          turn: fc.nat({ max: n - 1 }),
          entries: fc.array(fc.double({ min: -1, max: 1, noNaN: true }), {
            minLength: n * n,
            maxLength: n * n,
          }),
          x: fc.array(fc.double({ min: -9, max: 9, noNaN: true }), { minLength: n, maxLength: n }),
        }),
      ),
      ({ n, turn, entries, x }) => {
        const a = Float64Array.from(entries)
        for (let i = 0; i < n; i++) a[i * n + ((i + turn) % n)] = 2 * n
        const b = Float64Array.from(x, (_, i) =>
          x.reduce((sum, value, j) => sum + (a[i * n + j] as number) * value, 0),
        )
        const pivots = new Int32Array(n)
        expect(factorise(a, pivots)).toBe(true)
        solveFactorised(a, pivots, b)
        for (let i = 0; i < n; i++) expect(Math.abs((b[i] as number) - (x[i] as number))).toBeLessThan(1e-12)
      },
    ),
  )
})

test('a matrix without an inverse, or with an entry that is not finite, is refused', () => {
  expect(factorise(Float64Array.of(1, 2, 2, 4), new Int32Array(2))).toBe(false)
  expect(factorise(Float64Array.of(0, 0, 0, 0), new Int32Array(2))).toBe(false)
  expect(factorise(Float64Array.of(1, 0, 0, Number.NaN), new Int32Array(2))).toBe(false)
})
