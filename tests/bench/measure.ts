/** Interleaved timing and the errors that go with it. */

export interface Contender {
  readonly name: string
  /** Times for every case, s; its result is looked at for the error. */
  readonly run: () => Float64Array
}

export interface Measured {
  readonly name: string
  /** Median time of one case, ns. */
  readonly nanoseconds: number
  readonly errors: { readonly median: number; readonly p99: number; readonly worst: number }
}

/**
 * Medians over interleaved repeats, so that what disturbs the machine disturbs all contenders alike.
 *
 * Shapes   `exact` holds the reference for every case; errors are relative, divided by `condition` where given.
 */
export function measure(
  contenders: readonly Contender[],
  exact: Float64Array,
  condition?: Float64Array,
  repeats = 15,
): Measured[] {
  const times = contenders.map(() => [] as number[])
  const results = contenders.map(({ run }) => {
    run()
    return run()
  })
  for (let repeat = 0; repeat < repeats; repeat++)
    contenders.forEach(({ run }, i) => {
      const start = process.hrtime.bigint()
      run()
      times[i]?.push(Number(process.hrtime.bigint() - start))
    })
  return contenders.map(({ name }, i) => {
    const sorted = (times[i] as number[]).sort((a, b) => a - b)
    const errors = Float64Array.from(results[i] as Float64Array, (t, j) => {
      const reference = exact[j] as number
      return Math.abs(t - reference) / reference / Math.max(1, condition?.[j] ?? 1)
    }).sort()
    return {
      name,
      nanoseconds: (sorted[sorted.length >> 1] as number) / exact.length,
      errors: {
        median: errors[errors.length >> 1] as number,
        p99: errors[Math.floor(0.99 * errors.length)] as number,
        worst: errors[errors.length - 1] as number,
      },
    }
  })
}

const short = (x: number): string => x.toExponential(1)

/** A time in the unit that suits it. */
export const duration = (ns: number): string =>
  ns < 1000 ? `${ns.toFixed(0)} ns` : `${(ns / 1000).toFixed(2)} µs`

/** One line of the report. */
export function report(label: string, measured: Measured, goal: string, met: boolean): void {
  const { median, p99, worst } = measured.errors
  console.log(
    `${met ? 'meets ' : 'MISSES'} ${label.padEnd(52)} ${duration(measured.nanoseconds).padStart(9)}  ${goal.padEnd(28)} error median ${short(median)}, 99 % ${short(p99)}, worst ${short(worst)}`,
  )
}
