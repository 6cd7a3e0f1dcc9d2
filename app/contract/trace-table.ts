/** A trace as a table for reading; a long one is thinned, and says so. */
import type { Trace } from '../../engine/index.ts'

const longest = 60

/** Lines of a table, numbers to the right. */
export const traceTable = (trace: Trace): readonly string[] => {
  const columns: readonly (readonly [string, Float64Array, (value: number) => string])[] = [
    ['time h', trace.time, (s) => (s / 3600).toFixed(3)],
    ['substrate g/L', trace.substrate, (c) => c.toFixed(3)],
    ['product g/L', trace.product, (c) => c.toFixed(3)],
    ['enzyme g/L', trace.enzyme, (c) => c.toPrecision(4)],
    ['degC', trace.temperature, (t) => (t - 273.15).toFixed(1)],
    ...(trace.pH === undefined ? [] : [['pH', trace.pH, (pH: number) => pH.toFixed(2)] as const]),
    ['volume m3', trace.volume, (v) => v.toPrecision(4)],
    ['conversion', trace.conversion, (x) => x.toFixed(4)],
  ]
  const count = trace.time.length
  const rows = Array.from({ length: Math.min(count, longest) }, (_, n) =>
    count <= longest ? n : Math.round((n * (count - 1)) / (longest - 1)),
  )
  const cells = columns.map(([head, values, show]) => [head, ...rows.map((row) => show(values[row] ?? 0))])
  const widths = cells.map((column) => Math.max(...column.map((cell) => cell.length)))
  const lines = [0, ...rows.map((_, n) => n + 1)].map((line) =>
    cells.map((column, n) => (column[line] ?? '').padStart(widths[n] ?? 0)).join('  '),
  )
  return count <= longest ? lines : [...lines, `(${longest} of ${count} times; --json has them all)`]
}
