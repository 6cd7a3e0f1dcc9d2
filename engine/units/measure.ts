/**
 * A unit of measure as an exact ratio to coherent SI, and how units combine.
 *
 * Shapes   SI = value · times / over + offset; `times` and `over` are whole numbers, without a common factor.
 * Reason   dividing by 1000 rounds once and right, multiplying by 0.001 does not: "3400 g" is exactly 3.4 kg.
 */
export interface UnitOfMeasure {
  readonly symbol: string
  readonly times: number
  readonly over: number
  /** Added after scaling; only degC has one. */
  readonly offset: number
}

/** A unit from its symbol and its ratio to SI. */
export const unit = (symbol: string, times = 1, over = 1, offset = 0): UnitOfMeasure => {
  const common = greatestCommonDivisor(times, over)
  return { symbol, times: times / common, over: over / common, offset }
}

/** Every unit of the first list over every unit of the second: g/L, mg/L, g/mL … */
export const per = (
  above: readonly UnitOfMeasure[],
  below: readonly UnitOfMeasure[],
): readonly UnitOfMeasure[] => above.flatMap((a) => below.map((b) => quotient(a, b)))

/** Common factors go before anything is multiplied, so that every product is exact. */
const quotient = (a: UnitOfMeasure, b: UnitOfMeasure): UnitOfMeasure => {
  const times = greatestCommonDivisor(a.times, b.times)
  const over = greatestCommonDivisor(a.over, b.over)
  return unit(
    `${a.symbol}/${b.symbol}`,
    (a.times / times) * (b.over / over),
    (a.over / over) * (b.times / times),
  )
}

/** Value in SI of a number given in a unit. */
export const toSi = (value: number, u: UnitOfMeasure): number => {
  const scaled = u.over === 1 ? value * u.times : u.times === 1 ? value / u.over : (value * u.times) / u.over
  return u.offset === 0 ? scaled : scaled + u.offset
}

/** The number to write before a unit for a value in SI. */
export const fromSi = (value: number, u: UnitOfMeasure): number => {
  const base = u.offset === 0 ? value : withoutNoise(value - u.offset)
  return u.times === 1 ? base * u.over : u.over === 1 ? base / u.times : (base * u.over) / u.times
}

/** A double of kelvins is no finer than 6e-14 K; the digits below, which the subtraction bares, say nothing. */
const withoutNoise = (difference: number): number =>
  Math.abs(difference) < 1000 ? Math.round(difference * 1e12) / 1e12 : difference

const greatestCommonDivisor = (a: number, b: number): number => {
  let [x, y] = [a, b]
  while (y !== 0) [x, y] = [y, x % y]
  return x
}
