/** Interleaved timing and the errors that go with it. */

export interface Contender {
  readonly name: string
  /** Times for every case, s; its result is looked at for the error. */
  readonly run: () => Float64Array
}

export interface Measured {
  readonly name: string
  /** Time of one case, ns: the lower quartile of the repeats, for what else runs on a machine only ever adds. */
  readonly nanoseconds: number
  readonly errors: { readonly median: number; readonly p99: number; readonly worst: number }
}

/** So long each contender runs before it is timed, ns: the compiler has then done its work. */
const warmUp = 800_000_000n
/** So long all repeats of one contender take at least, ns, and so many there are at least. */
const enough = 300_000_000
const leastRepeats = 15

/**
 * Times over interleaved repeats, so that what disturbs the machine disturbs all contenders alike.
 *
 * Shapes   `exact` holds the reference for every case; errors are relative, divided by `condition` where given.
 */
export function measure(
  contenders: readonly Contender[],
  exact: Float64Array,
  condition?: Float64Array,
): Measured[] {
  const times = contenders.map(() => [] as number[])
  let slowest = 0
  const results = contenders.map(({ run }) => {
    const start = process.hrtime.bigint()
    let result = run()
    let last = start
    let now = process.hrtime.bigint()
    while (now - start < warmUp) {
      result = run()
      last = now
      now = process.hrtime.bigint()
    }
    slowest = Math.max(slowest, Number(now - last))
    return result
  })
  const repeats = Math.max(leastRepeats, Math.ceil(enough / slowest))
  for (let repeat = 0; repeat < repeats; repeat++)
    contenders.forEach(({ run }, i) => {
      const start = process.hrtime.bigint()
      run()
      times[i]?.push(Number(process.hrtime.bigint() - start))
    })
  return contenders.map(({ name }, i) => {
    const sorted = (times[i] as number[]).sort((a, b) => a - b)
    return {
      name,
      nanoseconds: (sorted[sorted.length >> 2] as number) / exact.length,
      errors: errorsOf(results[i] as Float64Array, exact, condition),
    }
  })
}

/** Relative errors, divided by `condition` where given. */
export function errorsOf(
  times: Float64Array,
  exact: Float64Array,
  condition?: Float64Array,
): Measured['errors'] {
  const errors = Float64Array.from(times, (t, j) => {
    const reference = exact[j] as number
    return Math.abs(t - reference) / reference / Math.max(1, condition?.[j] ?? 1)
  }).sort()
  return {
    median: errors[errors.length >> 1] as number,
    p99: errors[Math.floor(0.99 * errors.length)] as number,
    worst: errors[errors.length - 1] as number,
  }
}

const short = (x: number): string => x.toExponential(1)

/** A time in the unit that suits it. */
export const duration = (ns: number): string =>
  ns < 1000 ? `${ns.toFixed(0)} ns` : `${(ns / 1000).toFixed(2)} µs`

/** One line of the report; without a `goal` it is there to compare with. */
export function report(label: string, measured: Measured, goal?: { text: string; met: boolean }): void {
  const { median, p99, worst } = measured.errors
  console.log(
    `${goal ? (goal.met ? 'meets ' : 'MISSES') : '      '} ${label.padEnd(52)} ${duration(measured.nanoseconds).padStart(9)}  ${(goal?.text ?? '').padEnd(22)} error median ${short(median)}, 99 % ${short(p99)}, worst ${short(worst)}`,
  )
}
