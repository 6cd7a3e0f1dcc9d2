/** Gauss–Legendre quadrature on [0, 1]. */

export interface Quadrature {
  readonly nodes: Float64Array
  readonly weights: Float64Array
}

/**
 * Nodes and weights of the n-point rule, ascending on [0, 1], by Newton on the Legendre recurrence.
 *
 * Source   Abramowitz & Stegun 25.4.29.
 */
export function gaussLegendre(n: number): Quadrature {
  const nodes = new Float64Array(n)
  const weights = new Float64Array(n)
  for (let i = 0; i < n; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5))
    let slope = 1
    for (let pass = 0; pass < 100; pass++) {
      let p = 1
      let before = 0
      for (let k = 0; k < n; k++) {
        const next = ((2 * k + 1) * x * p - k * before) / (k + 1)
        before = p
        p = next
      }
      slope = (n * (x * p - before)) / (x * x - 1)
      const step = p / slope
      x -= step
      if (Math.abs(step) < 1e-16) break
    }
    nodes[n - 1 - i] = 0.5 * (1 + x)
    weights[n - 1 - i] = 1 / ((1 - x * x) * slope * slope)
  }
  return { nodes, weights }
}

/** The rule of 16 points. */
export const gauss16 = gaussLegendre(16)
