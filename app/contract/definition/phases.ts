/** The phases of a programme. */
import * as z from 'zod'
import { type FeedFlow, type Flow, type MassFlow, nearest, quantity } from '../../../engine/index.ts'
import { found } from '../fault.ts'
import { part } from '../rules/view.ts'
import { suggestion } from '../words/quantity-words.ts'
import { complain, given, onObject } from './clashes.ts'
import { concentrationField } from './concentration.ts'
import { conversionField, eitherField, phField, quantityField, record } from './fields.ts'

const jacket = record('the jacket', {
  temperature: quantityField('temperature', 'above', {
    title: 'the temperature of the jacket',
    example: '60 degC',
  }),
  timeConstant: quantityField('time', 'above', {
    title: 'the time constant of the approach',
    example: '25 min',
  }),
})

const change = {
  to: quantityField('temperature', 'above', { title: 'the set point' }),
  ramp: quantityField('ramp', 'above', {
    title: 'the ramp (absent: at once, or as fast as the jacket lets)',
  }).exactOptional(),
  jacket: jacket.exactOptional(),
}

const heat = record('heating', { phase: z.literal('heat'), ...change })
const cool = record('cooling', { phase: z.literal('cool'), ...change })
const inactivate = record('the kill step', {
  phase: z.literal('inactivate'),
  ...change,
  hold: quantityField('time', 'at-least', { title: 'the time at the set point', example: '10 min' }),
})

const dose = record('a dose', {
  phase: z.literal('dose'),
  amount: quantityField('mass', 'above', { title: 'the dose' }),
})

const hold = record('holding', {
  phase: z.literal('hold'),
  for: quantityField('time', 'above', { title: 'the length of the hold', example: '6 h' }).exactOptional(),
  until: record('what ends the hold', { conversion: conversionField() }).exactOptional(),
  atMost: quantityField('time', 'above', {
    title: 'the longest the hold may take',
    example: '12 h',
  }).exactOptional(),
})
  .superRefine((value, ctx) => {
    const length = given(value, ['for'])
    const goal = given(value, ['until', 'atMost'])
    if (length.length === 1 && goal.length > 0)
      complain(ctx, 'found for beside until or atMost; a hold has one end: for, or until with atMost')
    else if (length.length === 0 && goal.length === 0)
      complain(ctx, 'the hold has no end; give for, or until with atMost')
    else if (length.length === 0 && !goal.includes('atMost')) {
      complain(ctx, 'is missing; write the longest the hold may take, such as "12 h"', 'atMost')
    } else if (length.length === 0 && !goal.includes('until')) {
      complain(ctx, 'is missing; atMost goes with until, such as { "conversion": 0.9 }', 'until')
    }
  }, onObject)
  .meta({
    oneOf: [
      { required: ['for'], not: { anyOf: [{ required: ['until'] }, { required: ['atMost'] }] } },
      { required: ['until', 'atMost'], not: { required: ['for'] } },
    ],
  })

const flow = (title: string) =>
  eitherField(
    ['flow', 'mass flow'],
    'above',
    { title },
    (dimension, value): FeedFlow =>
      dimension === 'flow'
        ? { per: 'volume', value: quantity<Flow>(value) }
        : { per: 'mass', value: quantity<MassFlow>(value) },
  )

const feedPhase = record('feeding', {
  phase: z.literal('feed'),
  flow: flow('the flow of the feed'),
  flowTo: flow('the flow at the end (absent: steady)').exactOptional(),
  for: quantityField('time', 'above', { title: 'the length of the feed', example: '2 h' }),
  concentration: concentrationField('the substrate in the feed', 'above', '150 g/L'),
  enzyme: quantityField('concentration', 'at-least', {
    title: 'the enzyme preparation in the feed',
    example: '0.3 g/L',
  }).exactOptional(),
  product: concentrationField('the product in the feed', 'at-least', '0 g/L').exactOptional(),
  density: quantityField('density', 'above', {
    title: 'the density of the feed (needed for a flow by mass)',
    example: '1.05 kg/L',
  }).exactOptional(),
})

const adjust = record('adjusting the pH', { phase: z.literal('adjust'), pH: phField() })

const known = ['heat', 'dose', 'hold', 'feed', 'adjust', 'inactivate', 'cool']

/** One of `programme.phases`. */
export const phase = z.discriminatedUnion('phase', [heat, dose, hold, feedPhase, adjust, inactivate, cool], {
  error: (issue) => {
    if (issue.code !== 'invalid_union') {
      return `found ${found(issue.input)}; a phase must be an object, such as { "phase": "dose", "amount": "3.5 kg" }`
    }
    const word = part(issue.input, 'phase')
    const phases = `the phases are ${known.join(', ')}`
    if (word === undefined) return `is missing; ${phases}`
    return `found ${found(word)}${typeof word === 'string' ? suggestion(nearest(word, known)) : ''}; ${phases}`
  },
})
