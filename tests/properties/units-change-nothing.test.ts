/** The same values in other units are the same scenario. */
import { expect, test } from 'vitest'
import { answerTo, apart, type File, type Json } from './asking.ts'
import { holds } from './holding.ts'
import { widePlan } from './wide-programmes.ts'

/** Units that a value may be rewritten in, each with its size in the unit before. */
const others: { readonly [unit: string]: readonly (readonly [unit: string, size: number])[] } = {
  m3: [['L', 1e-3]],
  'g/L': [
    ['kg/m3', 1],
    ['mg/L', 1e-3],
  ],
  'g/g/h': [
    ['mg/mg/h', 1],
    ['g/g/min', 60],
  ],
  'kJ/mol': [
    ['J/mol', 1e-3],
    ['kcal/mol', 4.184],
  ],
  '1/h': [
    ['1/min', 60],
    ['1/d', 1 / 24],
  ],
  h: [
    ['min', 1 / 60],
    ['s', 1 / 3600],
    ['d', 24],
  ],
  min: [['h', 60]],
  kg: [
    ['g', 1e-3],
    ['t', 1e3],
  ],
  'K/min': [
    ['K/h', 1 / 60],
    ['degC/min', 1],
  ],
  'm3/h': [['L/h', 1e-3]],
}

/** Every quantity of a file in the nth other unit. */
function rewritten(value: Json, n: number): Json {
  if (typeof value === 'string') {
    const [number, unit] = value.split(' ')
    if (unit === 'degC') return `${Number(number) + 273.15} K`
    const units = others[unit ?? '']
    const other = units?.[n % units.length]
    return other ? `${Number(number) / other[1]} ${other[0]}` : value
  }
  if (typeof value !== 'object' || value === null) return value
  if (Array.isArray(value)) return value.map((part: Json) => rewritten(part, n))
  return Object.fromEntries(Object.entries(value).map(([key, part]) => [key, rewritten(part, n)]))
}

test('a scenario in other units has the same answer', () => {
  holds(widePlan({ separable: true }), (file) => {
    const one = answerTo(file)
    const factor = Math.max(1, one.precision?.amplification ?? 1)
    for (let n = 0; n < 3; n++) {
      const other = answerTo(rewritten(file, n) as File)
      expect(other.reachable).toBe(one.reachable)
      // A temperature loses a digit or two on the way from degC to K, a loss of 500 kJ/mol makes much of it.
      if (one.reachable) expect(apart(one.time ?? 0, other.time ?? 0)).toBeLessThan(1e-8 * factor)
      else
        expect(Math.abs((one.limitingConversion ?? 0) - (other.limitingConversion ?? 0))).toBeLessThan(1e-9)
    }
  })
})
