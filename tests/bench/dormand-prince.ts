/**
 * The yardstick: Dormand–Prince 5(4) with every rate written into the loop, in substrate and enzyme as they are
 * (no logarithms), with the quartic dense output for the event. It knows one problem at a time and nothing else,
 * as somebody who needs only speed would write it.
 *
 * Source   Dormand & Prince 1980; dense output as in Hairer, Nørsett & Wanner, Solving ODEs I, II.6.
 */

/** Expressions over s, e, t and the numbers named in `constants`. */
export interface Inlined {
  readonly constants: readonly string[]
  /** Statements before the rates at each stage, for what depends on t. */
  readonly stage?: string
  readonly ds: string
  readonly de: string
  /** Falls through zero where the run stops. */
  readonly event: string
}

/** Where a run stopped; filled in place. */
export interface Stop {
  t: number
  s: number
  e: number
  reached: boolean
  steps: number
}

export type Stepper = (
  constants: readonly number[],
  s: number,
  e: number,
  end: number,
  tolerance: number,
  sScale: number,
  eScale: number,
  stop: Stop,
) => void

/** Compiles the stepper of one problem, its rates inlined. */
export function dormandPrince({ constants, stage = '', ds, de, event }: Inlined): Stepper {
  const rates = (n: number, s: string, e: string, t: string): string =>
    `{ const s = ${s}, e = ${e}, t = ${t}; ${stage} k${n} = ${ds}; q${n} = ${de}; }`
  const source = `
    let [${constants.join(', ')}] = constants
    const atolS = tolerance * sScale / 100, atolE = tolerance * eScale / 100
    let now = 0, S = s0, E = e0, steps = 0
    let k1, k2, k3, k4, k5, k6, k7, q1, q2, q3, q4, q5, q6, q7
    ${rates(1, 'S', 'E', 'now')}
    let h = Math.min(end, 0.05 * S / Math.abs(k1), 1e300)
    if (!(h > 0)) h = end * 1e-3
    const eventAt = (t, s, e) => ${event}
    for (;;) {
      steps++
      if (now + h > end) h = end - now
      ${rates(2, 'S + h * 0.2 * k1', 'E + h * 0.2 * q1', 'now + 0.2 * h')}
      ${rates(3, 'S + h * (0.075 * k1 + 0.225 * k2)', 'E + h * (0.075 * q1 + 0.225 * q2)', 'now + 0.3 * h')}
      ${rates(4, 'S + h * (44/45 * k1 - 56/15 * k2 + 32/9 * k3)', 'E + h * (44/45 * q1 - 56/15 * q2 + 32/9 * q3)', 'now + 0.8 * h')}
      ${rates(5, 'S + h * (19372/6561 * k1 - 25360/2187 * k2 + 64448/6561 * k3 - 212/729 * k4)', 'E + h * (19372/6561 * q1 - 25360/2187 * q2 + 64448/6561 * q3 - 212/729 * q4)', 'now + 8/9 * h')}
      ${rates(6, 'S + h * (9017/3168 * k1 - 355/33 * k2 + 46732/5247 * k3 + 49/176 * k4 - 5103/18656 * k5)', 'E + h * (9017/3168 * q1 - 355/33 * q2 + 46732/5247 * q3 + 49/176 * q4 - 5103/18656 * q5)', 'now + h')}
      const s1 = S + h * (35/384 * k1 + 500/1113 * k3 + 125/192 * k4 - 2187/6784 * k5 + 11/84 * k6)
      const e1 = E + h * (35/384 * q1 + 500/1113 * q3 + 125/192 * q4 - 2187/6784 * q5 + 11/84 * q6)
      ${rates(7, 's1', 'e1', 'now + h')}
      const es = h * (71/57600 * k1 - 71/16695 * k3 + 71/1920 * k4 - 17253/339200 * k5 + 22/525 * k6 - 1/40 * k7) / (atolS + tolerance * Math.max(Math.abs(S), Math.abs(s1)))
      const ee = h * (71/57600 * q1 - 71/16695 * q3 + 71/1920 * q4 - 17253/339200 * q5 + 22/525 * q6 - 1/40 * q7) / (atolE + tolerance * Math.max(Math.abs(E), Math.abs(e1)))
      const error = Math.sqrt(0.5 * (es * es + ee * ee))
      if (error <= 1) {
        if (eventAt(now + h, s1, e1) <= 0) {
          const ds = s1 - S, r3 = h * k1 - ds, r4 = ds - h * k7 - r3
          const r5 = h * (-12715105075/11282082432 * k1 + 87487479700/32700410799 * k3 - 10690763975/1880347072 * k4 + 701980252875/199316789632 * k5 - 1453857185/822651844 * k6 + 69997945/29380423 * k7)
          const de = e1 - E
          let lo = 0, hi = 1, x = 0.5, flo = eventAt(now, S, E), fhi = eventAt(now + h, s1, e1)
          for (let i = 0; i < 60 && hi - lo > 1e-15; i++) {
            x = i % 3 === 2 ? 0.5 * (lo + hi) : lo + (hi - lo) * flo / (flo - fhi)
            const v = S + x * (ds + (1 - x) * (r3 + x * (r4 + (1 - x) * r5)))
            const f = eventAt(now + x * h, v, E + x * de)
            if (f > 0) { lo = x; flo = f } else { hi = x; fhi = f }
            if (Math.abs(f) < 1e-14) break
          }
          stop.t = now + x * h; stop.s = S; stop.e = E; stop.reached = true; stop.steps += steps
          return
        }
        now += h; S = s1; E = e1; k1 = k7; q1 = q7
        if (now >= end) { stop.t = end; stop.s = S; stop.e = E; stop.reached = false; stop.steps += steps; return }
      }
      h *= Math.min(5, Math.max(0.2, 0.9 * Math.pow(error, -0.2)))
    }`
  return new Function(
    'constants',
    's0',
    'e0',
    'end',
    'tolerance',
    'sScale',
    'eScale',
    'stop',
    source,
  ) as unknown as Stepper
}
