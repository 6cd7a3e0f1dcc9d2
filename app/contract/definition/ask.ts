/** What the file asks. */
import * as z from 'zod'
import { formatQuantity, nearest, parseQuantity, type Temperature, type Time } from '../../../engine/index.ts'
import { found } from '../fault.ts'
import { part } from '../rules/view.ts'
import { quantitySentence, suggestion } from '../words/quantity-words.ts'
import { complain, onList } from './clashes.ts'
import { conversionField, quantityField, quantityPattern, rangeSentence, record } from './fields.ts'

const within = quantityField('time', 'above', { title: 'the reaction time from the first dose' })

const between = z
  .tuple(
    [
      quantityField('temperature', 'above', { title: 'the lower bound', example: '25 degC' }),
      quantityField('temperature', 'above', { title: 'the upper bound', example: '60 degC' }),
    ],
    {
      error: (issue) => `found ${found(issue.input)}; between is a list of two temperatures, the lower first`,
    },
  )
  .superRefine((value, ctx) => {
    const [low, high] = Array.isArray(value) ? value : []
    if (typeof low === 'number' && typeof high === 'number' && !(low < high)) {
      complain(
        ctx,
        `found ${degrees(low)} before ${degrees(high)}; between goes from the lower to the higher`,
      )
    }
  }, onList)

const degrees = (t: Temperature): string => formatQuantity(t, 'temperature', 'degC', 6)

const longestTrace = 1_000_000
const mostTimesNamed = 20
const due = { called: 'a time', units: ['h', 'min', 's', 'd'], example: '1 h' }

/** Times of a trace, read in one loop: a million of them must neither be slow nor each raise its own fault. */
const traceTimes = z
  .array(z.unknown(), {
    error: (issue) => `found ${found(issue.input)}; at is a list of times, such as ["0 h", "1 h"]`,
  })
  .meta({
    description: 'times from the start of the programme',
    minItems: 1,
    maxItems: longestTrace,
    items: { type: 'string', pattern: quantityPattern(['time'], 'at-least'), examples: ['1 h'] },
  })
  .transform((list, ctx): readonly Time[] => {
    const refuse = (message: string, ...path: number[]) =>
      ctx.issues.push({ code: 'custom', input: list, message, path })
    if (list.length === 0) refuse('found an empty list; at least one time is due, such as "1 h"')
    if (list.length > longestTrace) {
      refuse(`found ${list.length} times; a trace has at most ${longestTrace}`)
      return z.NEVER
    }
    const times: Time[] = []
    for (const [place, text] of list.entries()) {
      const time = traceTime(text)
      if (typeof time === 'number') times.push(time)
      else if (place - times.length < mostTimesNamed) refuse(time, place)
    }
    const wrong = list.length - times.length
    if (wrong > mostTimesNamed)
      refuse(`${wrong} of ${list.length} entries are not times; the first are named`)
    return times
  })

/** A time of a trace, or what is wrong with it. */
const traceTime = (text: unknown): Time | string => {
  if (typeof text !== 'string') {
    return `found ${found(text)}; write a time as a text with its unit, such as "1 h" (units that fit: ${due.units.join(', ')})`
  }
  const read = parseQuantity(text, 'time')
  if (!read.ok) return quantitySentence(text, read.failure, due)
  return read.value >= 0 ? read.value : rangeSentence(text, 'at-least', 'a time of the trace')
}

const find = <F extends string>(word: F) => z.literal(word)

const temperature = z.discriminatedUnion(
  'best',
  [
    record('the temperature with the shortest time', {
      find: find('temperature'),
      best: z.literal('time'),
      conversion: conversionField(),
      between,
    }),
    record('the temperature with the highest conversion', {
      find: find('temperature'),
      best: z.literal('conversion'),
      within,
      between,
    }),
  ],
  {
    error: (issue) => wordFault(issue, 'best', 'with "find": "temperature", best is "time" or "conversion"'),
  },
)

/** The question of a file; what a later version answers is named as such. */
export const ask = z.discriminatedUnion(
  'find',
  [
    record('how long a conversion takes', { find: find('time'), conversion: conversionField() }),
    record('the dose that makes a conversion in time', {
      find: find('dose'),
      conversion: conversionField(),
      within,
    }),
    temperature,
    record('the course of the batch', { find: find('trace'), at: traceTimes }),
  ],
  {
    error: (issue) =>
      wordFault(issue, 'find', 'this version answers "time", "dose", "temperature" and "trace"'),
  },
)

const later = ['cheapest', 'probability']

const wordFault = (
  issue: { readonly code?: string; readonly input?: unknown; readonly options?: readonly unknown[] },
  key: string,
  answers: string,
): string => {
  if (issue.code !== 'invalid_union') {
    const due = 'ask must be an object that says what to find'
    return issue.input === undefined ? `is missing; ${due}` : `found ${found(issue.input)}; ${due}`
  }
  const word = part(issue.input, key)
  if (word === undefined) return `is missing; ${answers}`
  if (typeof word !== 'string') return `found ${found(word)}; ${answers}`
  const words = (issue.options ?? []).filter((option) => typeof option === 'string')
  return later.includes(word)
    ? `found ${found(word)}, which this version does not answer; ${answers}`
    : `found ${found(word)}${suggestion(nearest(word, words))}; ${answers}`
}
