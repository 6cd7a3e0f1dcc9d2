/**
 * The kinds of field a scenario is made of. Each one both reads its value into SI and describes itself for the
 * JSON Schema, so that the two cannot drift apart.
 */
import * as z from 'zod'
import {
  type DimensionName,
  dimensions,
  fittingPer,
  fittingUnits,
  type Money,
  type MoneyPer,
  parseMoney,
  parseOneOf,
  perSymbols,
  type Quantity,
  quantity,
} from '../../../engine/index.ts'
import { found } from '../fault.ts'
import { unknownKeySentences } from '../words/key-words.ts'
import { type Due, quantitySentence } from '../words/quantity-words.ts'

/** What values of a quantity are allowed, in SI; for a temperature `above` means above absolute zero. */
export type Range = 'above' | 'at-least'

interface Described {
  readonly title: string
  readonly example?: string
  /** What is due, with its article, where the dimension's own name says too little. */
  readonly called?: string
}

/** A quantity of one dimension. */
export const quantityField = <D extends DimensionName>(dimension: D, range: Range, about: Described) =>
  eitherField([dimension], range, about, (_, value) => quantity<Quantity<D>>(value))

/** A quantity that may be given in either of several dimensions. */
export const eitherField = <D extends DimensionName, T>(
  due: readonly [D, ...D[]],
  range: Range,
  about: Described,
  made: (dimension: D, value: number) => T,
) => {
  const first = due[0]
  const words: Due = {
    called: about.called ?? dimensions[first].called,
    units: due.flatMap(fittingUnits),
    example: about.example ?? dimensions[first].example,
  }
  return describedText(words, about.title, quantityPattern(due, range)).transform((text, ctx) => {
    const read = parseOneOf(text, due)
    const message = !read.ok
      ? quantitySentence(text, read.failure, words)
      : outOfRange(read.value.value, range)
        ? rangeSentence(text, range, about.title, first)
        : undefined
    if (read.ok && message === undefined) return made(read.value.dimension, read.value.value)
    ctx.issues.push({ code: 'custom', input: text, message: message ?? '' })
    return z.NEVER
  })
}

/** Money per something, at least 0. */
export const moneyField = (per: MoneyPer, about: Described & { readonly example: string }) => {
  const words: Due = {
    called: `money per ${per}`,
    units: fittingPer(per).map((symbol) => `EUR/${symbol}`),
    example: about.example,
  }
  const pattern = `^${numberIn['at-least']} *[A-Z]{3}/(?:${alternatives(perSymbols(per))})$`
  return describedText(words, about.title, pattern).transform((text, ctx): Money => {
    const read = parseMoney(text, per)
    if (read.ok && read.value.value >= 0) return read.value
    const message = read.ok
      ? rangeSentence(text, 'at-least', about.title)
      : quantitySentence(text, read.failure, words)
    ctx.issues.push({ code: 'custom', input: text, message })
    return z.NEVER
  })
}

interface Bounds {
  readonly above?: number
  readonly atLeast?: number
  readonly below?: number
  readonly atMost?: number
}

/** A plain number within bounds; `above` and `below` exclude their bound. */
export const numberField = (title: string, bounds: Bounds = {}) => {
  const due = `must be a plain number${boundsText(bounds)}`
  const error = (issue: { readonly input?: unknown }): string =>
    issue.input === undefined ? `is missing; ${title} ${due}` : `found ${found(issue.input)}; ${title} ${due}`
  let field = z.number({ error })
  if (bounds.above !== undefined) field = field.gt(bounds.above, { error })
  if (bounds.atLeast !== undefined) field = field.gte(bounds.atLeast, { error })
  if (bounds.below !== undefined) field = field.lt(bounds.below, { error })
  if (bounds.atMost !== undefined) field = field.lte(bounds.atMost, { error })
  return field.meta({ description: title })
}

/** pH, 0 to 14. */
export const phField = (title = 'the pH') => numberField(title, { atLeast: 0, atMost: 14 })

/** Conversion, between 0 and 1. */
export const conversionField = () => numberField('the conversion', { above: 0, below: 1 })

/** Free text for people. */
export const textField = (title: string) =>
  z
    .string({ error: (issue) => `found ${found(issue.input)}; ${title} must be a text` })
    .meta({ description: title })

/** true or false. */
export const flagField = (title: string) =>
  z
    .boolean({ error: (issue) => `found ${found(issue.input)}; write true or false` })
    .meta({ description: title })

/** An object whose every key is known; messages for unknown keys come one a line, in the order of the keys. */
export const record = <S extends z.core.$ZodLooseShape>(title: string, shape: S) => {
  const known = Object.keys(shape)
  return z
    .strictObject(shape, {
      error: (issue) => {
        if (issue.code === 'unrecognized_keys') {
          return unknownKeySentences(issue.keys, known)
        }
        return issue.input === undefined
          ? `is missing; it is an object with ${known.join(', ')}`
          : `found ${found(issue.input)}; ${title} must be an object with ${known.join(', ')}`
      },
    })
    .meta({ description: title })
}

/** Says how a value lies outside its range. */
export const rangeSentence = (text: string, range: Range, title: string, of?: DimensionName): string => {
  const least = of === 'temperature' ? 'absolute zero (-273.15 degC)' : '0'
  return `found ${found(text)}; ${title} must be ${range === 'above' ? 'above' : 'at least'} ${least}`
}

const boundsText = (bounds: Bounds): string => {
  if (bounds.atLeast !== undefined && bounds.atMost !== undefined) {
    return ` from ${bounds.atLeast} to ${bounds.atMost}`
  }
  const limits = [
    ...(bounds.above === undefined ? [] : [`above ${bounds.above}`]),
    ...(bounds.atLeast === undefined ? [] : [`of at least ${bounds.atLeast}`]),
    ...(bounds.below === undefined ? [] : [`below ${bounds.below}`]),
    ...(bounds.atMost === undefined ? [] : [`at most ${bounds.atMost}`]),
  ]
  return limits.length === 0 ? '' : ` ${limits.join(' and ')}`
}

const outOfRange = (value: number, range: Range): boolean =>
  range === 'above' ? !(value > 0) : !(value >= 0)

/** The texts a quantity may be, as a regular expression for the JSON Schema. */
export const quantityPattern = (due: readonly DimensionName[], range: Range): string => {
  const symbols = due.flatMap((dimension) => dimensions[dimension].units.map((u) => u.symbol))
  return `^${due[0] === 'temperature' ? `[+-]?${number}` : numberIn[range]} *(?:${alternatives(symbols)})$`
}

const number = '(?:0|[1-9][0-9]*)(?:\\.[0-9]+)?(?:[eE][+-]?[0-9]+)?'
const zero = '0(?:\\.0+)?(?:[eE][+-]?[0-9]+)?'

const numberIn: Readonly<Record<Range, string>> = {
  above: `\\+?(?!${zero}[^.0-9eE])${number}`,
  'at-least': `(?:\\+?${number}|-${zero})`,
}

const alternatives = (symbols: readonly string[]): string => [...new Set(symbols)].join('|')

const describedText = (words: Due, title: string, pattern: string) =>
  z
    .string({
      error: (issue) => {
        const such = `write ${words.called} as a text with its unit, such as "${words.example}" (units that fit: ${words.units.join(', ')})`
        if (issue.input === undefined) return `is missing; ${such}`
        return typeof issue.input === 'number'
          ? `found the bare number ${issue.input} where a unit is due; ${such}`
          : `found ${found(issue.input)}; ${such}`
      },
    })
    .meta({ description: title, pattern, examples: [words.example] })
