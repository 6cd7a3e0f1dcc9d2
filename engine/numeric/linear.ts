/**
 * Factorises a small dense matrix in place, PA = LU with partial pivoting.
 *
 * Shapes   a (n·n) row-major, overwritten; pivots (n), overwritten.
 * Fails    false when a pivot is zero or not finite; `a` is then spoilt.
 * Source   Golub & Van Loan, Matrix Computations, 3.4 (outer-product form).
 */
export const factorise = (a: Float64Array, pivots: Int32Array): boolean => {
  const n = pivots.length
  for (let k = 0; k < n; k++) {
    let row = k
    let largest = Math.abs(a[k * n + k] as number)
    for (let i = k + 1; i < n; i++) {
      const size = Math.abs(a[i * n + k] as number)
      if (size > largest) {
        largest = size
        row = i
      }
    }
    pivots[k] = row
    if (!(largest > 0 && largest < Number.POSITIVE_INFINITY)) return false
    if (row !== k) {
      for (let j = 0; j < n; j++) {
        const kept = a[k * n + j] as number
        a[k * n + j] = a[row * n + j] as number
        a[row * n + j] = kept
      }
    }
    const pivot = a[k * n + k] as number
    for (let i = k + 1; i < n; i++) {
      const factor = (a[i * n + k] as number) / pivot
      a[i * n + k] = factor
      for (let j = k + 1; j < n; j++) {
        a[i * n + j] = (a[i * n + j] as number) - factor * (a[k * n + j] as number)
      }
    }
  }
  return true
}

/**
 * Solves Ax = b with the factors of A, in place.
 *
 * Shapes   lu (n·n) and pivots (n) from `factorise`; b (n) becomes x.
 */
export const solveFactorised = (lu: Float64Array, pivots: Int32Array, b: Float64Array): void => {
  const n = pivots.length
  for (let k = 0; k < n; k++) {
    const row = pivots[k] as number
    const value = b[row] as number
    b[row] = b[k] as number
    b[k] = value
  }
  for (let i = 1; i < n; i++) {
    let sum = b[i] as number
    for (let j = 0; j < i; j++) sum -= (lu[i * n + j] as number) * (b[j] as number)
    b[i] = sum
  }
  for (let i = n - 1; i >= 0; i--) {
    let sum = b[i] as number
    for (let j = i + 1; j < n; j++) sum -= (lu[i * n + j] as number) * (b[j] as number)
    b[i] = sum / (lu[i * n + i] as number)
  }
}
