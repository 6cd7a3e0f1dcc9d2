/** Bracketed roots of one variable. */

/** A function with its slope at one point, filled in place so that a search allocates nothing. */
export interface ValueAndSlope {
  value: number
  slope: number
}

/**
 * Root of an increasing function by Newton's method kept inside a bracket; bisection takes over where a
 * Newton step would leave it.
 *
 * Shapes   `evaluate` fills `at`; `low` ≤ root ≤ `high`, `start` anywhere between.
 * Fails    never: after 200 halvings the bracket is a single double.
 * Source   safeguarded Newton, Dennis & Schnabel 1983.
 */
export function increasingRoot(
  evaluate: (x: number, at: ValueAndSlope) => void,
  low: number,
  high: number,
  start: number,
): number {
  const at: ValueAndSlope = { value: 0, slope: 0 }
  let x = start
  let previousStep = high - low
  for (let i = 0; i < 200; i++) {
    evaluate(x, at)
    if (at.value === 0) return x
    if (at.value < 0) low = x
    else high = x
    let next = x - at.value / at.slope
    const outside = !(next >= low && next <= high)
    const stalled = i > 40 && Math.abs(next - x) > 0.5 * previousStep
    if (outside || stalled) next = low + 0.5 * (high - low)
    const step = Math.abs(next - x)
    if (step <= 1e-16 * Math.abs(next) || next === x) return next
    if (!outside && step <= 4e-16 * Math.abs(next)) return next
    previousStep = step
    x = next
  }
  return x
}

/**
 * Root of a continuous function between two points of opposite sign.
 *
 * Shapes   `atLow`, `atHigh` are f there, if already known.
 * Fails    never: where the signs agree it returns the end nearer to zero.
 * Source   Brent 1973, Algorithms for Minimization without Derivatives, chapter 4.
 */
export function bracketedRoot(
  f: (x: number) => number,
  low: number,
  high: number,
  atLow = f(low),
  atHigh = f(high),
  tolerance = 1e-15,
): number {
  let a = low
  let b = high
  let fa = atLow
  let fb = atHigh
  if (fa === 0) return a
  if (fb === 0) return b
  if (fa < 0 === fb < 0) return Math.abs(fa) < Math.abs(fb) ? a : b
  let c = a
  let fc = fa
  let d = b - a
  let e = d
  for (let i = 0; i < 200; i++) {
    if (fb < 0 === fc < 0) {
      c = a
      fc = fa
      d = b - a
      e = d
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      a = b
      b = c
      c = a
      fa = fb
      fb = fc
      fc = fa
    }
    const tol = 2 * 2.2e-16 * Math.abs(b) + 0.5 * tolerance * Math.abs(b)
    const m = 0.5 * (c - b)
    if (Math.abs(m) <= tol || fb === 0) return b
    if (Math.abs(e) >= tol && Math.abs(fa) > Math.abs(fb)) {
      const s = fb / fa
      let p: number
      let q: number
      if (a === c) {
        p = 2 * m * s
        q = 1 - s
      } else {
        const r = fb / fc
        const v = fa / fc
        p = s * (2 * m * v * (v - r) - (b - a) * (r - 1))
        q = (v - 1) * (r - 1) * (s - 1)
      }
      if (p > 0) q = -q
      else p = -p
      if (2 * p < Math.min(3 * m * q - Math.abs(tol * q), Math.abs(e * q))) {
        e = d
        d = p / q
      } else {
        d = m
        e = m
      }
    } else {
      d = m
      e = m
    }
    a = b
    fa = fb
    b += Math.abs(d) > tol ? d : m > 0 ? tol : -tol
    fb = f(b)
  }
  return b
}
