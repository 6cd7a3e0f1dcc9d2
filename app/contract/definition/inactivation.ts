/** How heat (and pH) takes the enzyme away: one step, or two in series. */
import * as z from 'zod'
import { found } from '../fault.ts'
import { complain, exactlyOne, given, listed, onList, onObject } from './clashes.ts'
import { concentrationField } from './concentration.ts'
import { numberField, phField, quantityField, record } from './fields.ts'

const stepKeys = ['kd', 'halfLife', 'D', 'at', 'Ea', 'z'] as const

const stepFields = {
  kd: quantityField('first-order rate', 'at-least', { title: 'kd, rate of inactivation' }).exactOptional(),
  halfLife: quantityField('time', 'above', {
    title: 'the half-life, ln 2/kd,',
    example: '8.7 h',
  }).exactOptional(),
  D: quantityField('time', 'above', {
    title: 'D, the time for a tenth to remain,',
    example: '28.8 h',
  }).exactOptional(),
  at: quantityField('temperature', 'above', {
    title: 'the temperature at which kd holds',
    example: '40 degC',
  }),
  Ea: quantityField('molar energy', 'at-least', {
    title: 'Ea, activation energy of the inactivation',
    example: '230 kJ/mol',
  }).exactOptional(),
  z: quantityField('temperature difference', 'above', {
    title: 'z, rise that makes D a tenth',
  }).exactOptional(),
}

const oneOfRates = [
  { required: ['kd'], not: { anyOf: [{ required: ['halfLife'] }, { required: ['D'] }] } },
  { required: ['halfLife'], not: { anyOf: [{ required: ['kd'] }, { required: ['D'] }] } },
  { required: ['D'], not: { anyOf: [{ required: ['kd'] }, { required: ['halfLife'] }] } },
]
const oneOfSlopes = [
  { required: ['Ea'], not: { required: ['z'] } },
  { required: ['z'], not: { required: ['Ea'] } },
]

const stepRules = (value: unknown, ctx: z.core.$RefinementCtx): void => {
  exactlyOne(ctx, value, ['kd', 'halfLife', 'D'])
  exactlyOne(ctx, value, ['Ea', 'z'])
}

const seriesStep = record('one step of inactivation', {
  ...stepFields,
  residual: numberField('the activity of the form after this step beside the native one', { atLeast: 0 }),
})
  .superRefine(stepRules, onObject)
  .meta({ allOf: [{ oneOf: oneOfRates }, { oneOf: oneOfSlopes }] })

const series = z
  .array(seriesStep, {
    error: (issue) => `found ${found(issue.input)}; series is a list of two steps, the first and the second`,
  })
  .superRefine((value, ctx) => {
    if (Array.isArray(value) && value.length !== 2) {
      complain(
        ctx,
        `found a list of ${value.length}; series is a list of two steps, the first and the second`,
      )
    }
  }, onList)
  .meta({ description: 'two steps in series', minItems: 2, maxItems: 2 })

/** `enzyme.inactivation` of the file. */
export const inactivation = record('how the enzyme is lost', {
  ...stepFields,
  at: stepFields.at.exactOptional(),
  series: series.exactOptional(),
  Kp: concentrationField('Kp, protection by the substrate', 'above', '20 g/L').exactOptional(),
  pH: record('how the loss follows the pH', {
    pKa1: numberField('pKa1, below which acid speeds the loss'),
    pKa2: numberField('pKa2, above which alkali speeds the loss'),
    at: phField('the pH at which kd holds'),
  }).exactOptional(),
})
  .superRefine((value, ctx) => {
    const single = given(value, stepKeys)
    if (given(value, ['series']).length === 0) {
      stepRules(value, ctx)
      if (!single.includes('at'))
        complain(ctx, 'is missing; write the temperature at which kd holds, such as "40 degC"', 'at')
    } else if (single.length > 0) {
      complain(ctx, `found series beside ${listed(single, 'and')}; give one step, or a series of two`)
    }
  }, onObject)
  .meta({
    oneOf: [
      {
        required: ['at'],
        not: { required: ['series'] },
        allOf: [{ oneOf: oneOfRates }, { oneOf: oneOfSlopes }],
      },
      { required: ['series'], not: { anyOf: stepKeys.map((key) => ({ required: [key] })) } },
    ],
  })
