/** The lowest point of a function of one variable, to the digits its smoothness allows. */

export interface Minimum {
  readonly at: number
  readonly value: number
  /** The lowest point is the end of the range, not a place where the slope vanishes. */
  readonly atBound: boolean
}

const golden = 0.5 * (3 - Math.sqrt(5))

/**
 * Global minimum on [low, high]: a scan finds the valley, golden section narrows it, and the root of the
 * slope of a Chebyshev interpolant gives the digits that comparing values cannot (a flat bottom hides half of
 * them).
 *
 * Shapes   f may be Infinity where there is no value; null when it is so everywhere on the scan.
 * Fails    null: no finite value found.
 * Source   Brent 1973 (golden section); Trefethen, Approximation Theory and Approximation Practice, ch. 21.
 */
export function minimum(
  f: (x: number) => number,
  low: number,
  high: number,
  scan = 96,
  settle = 1e-9,
): Minimum | null {
  let best = low
  let bestValue = Number.POSITIVE_INFINITY
  const width = (high - low) / scan
  for (let i = 0; i <= scan; i++) {
    const x = i === scan ? high : low + i * width
    const value = f(x)
    if (value < bestValue) {
      best = x
      bestValue = value
    }
  }
  if (!Number.isFinite(bestValue)) return null
  let a = Math.max(low, best - width)
  let b = Math.min(high, best + width)
  let x = a + golden * (b - a)
  let y = b - golden * (b - a)
  let fx = f(x)
  let fy = f(y)
  const enough = Math.max(settle * Math.max(Math.abs(low), Math.abs(high)), 1e-5 * (b - a))
  while (b - a > enough) {
    if (fx < fy || (fx === fy && x - low > high - y)) {
      b = y
      y = x
      fy = fx
      x = a + golden * (b - a)
      fx = f(x)
    } else {
      a = x
      x = y
      fx = fy
      y = b - golden * (b - a)
      fy = f(y)
    }
  }
  const near = 0.5 * (a + b)
  const ends: Minimum[] = [
    { at: low, value: f(low), atBound: true },
    { at: high, value: f(high), atBound: true },
  ]
  const inner = { at: near, value: f(near), atBound: false }
  const edge = ends.find((end) => end.value <= inner.value && Math.abs(end.at - near) <= 4 * enough)
  if (edge) return edge
  const polished = polish(f, near, Math.min(0.25 * (high - low), near - low, high - near, 1.5))
  return polished ?? inner
}

/**
 * Stationary point near x from a Chebyshev interpolant of half-width r; narrower ones until it settles.
 * Null when f is not smooth and finite around x.
 */
function polish(f: (x: number) => number, x: number, r: number): Minimum | null {
  let centre = x
  let found: Minimum | null = null
  for (let pass = 0; pass < 6 && r > 1e-6 * Math.abs(centre); pass++) {
    const at = stationaryPoint(f, centre, r)
    if (at !== null && Math.abs(at - centre) <= r) {
      const value = f(at)
      if (Number.isFinite(value)) {
        found = { at, value, atBound: false }
        if (pass > 0) return found
        centre = at
      }
    }
    r *= 0.5
  }
  return found
}

const degree = 12

function stationaryPoint(f: (x: number) => number, centre: number, r: number): number | null {
  const values: number[] = []
  for (let j = 0; j <= degree; j++) {
    const value = f(centre + r * Math.cos((Math.PI * (j + 0.5)) / (degree + 1)))
    if (!Number.isFinite(value)) return null
    values.push(value)
  }
  // Differences from the centre keep the digits of a flat function.
  const base = values[degree / 2] as number
  const c: number[] = []
  for (let k = 0; k <= degree; k++) {
    let sum = 0
    for (let j = 0; j <= degree; j++)
      sum += ((values[j] as number) - base) * Math.cos((Math.PI * k * (j + 0.5)) / (degree + 1))
    c.push((2 / (degree + 1)) * sum)
  }
  const largest = Math.max(...c.slice(1).map(Math.abs))
  // The last term says whether a polynomial of this degree follows f here.
  if (!(Math.abs(c[degree] as number) < 1e-4 * largest)) return null
  const slope = (s: number): { value: number; curvature: number } => {
    // T_k' = k·U_(k−1), T_k'' from (s² − 1)U_(k−1)' = k·T_k − s·U_(k−1).
    let value = 0
    let curvature = 0
    let u0 = 0
    let u1 = 1
    let t0 = 1
    let t1 = s
    for (let k = 1; k <= degree; k++) {
      value += k * (c[k] as number) * u1
      curvature += (k * (c[k] as number) * (k * t1 - s * u1)) / (s * s - 1)
      const u2 = 2 * s * u1 - u0
      u0 = u1
      u1 = u2
      const t2 = 2 * s * t1 - t0
      t0 = t1
      t1 = t2
    }
    return { value, curvature }
  }
  let s = 0
  for (let i = 0; i < 50; i++) {
    const { value, curvature } = slope(s)
    if (!(curvature > 0)) return null
    const step = -value / curvature
    s += step
    if (!(Math.abs(s) < 0.95)) return null
    if (Math.abs(step) < 1e-14) break
  }
  return centre + r * s
}
