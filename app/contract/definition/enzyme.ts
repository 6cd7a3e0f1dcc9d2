/** The enzyme preparation and its constants. */
import type * as z from 'zod'
import {
  type Activity,
  type DeclaredActivity,
  quantity,
  type VolumetricActivity,
} from '../../../engine/index.ts'
import { complain, exactlyOne, given, needs, onObject } from './clashes.ts'
import { concentrationField, specificRateField } from './concentration.ts'
import { eitherField, numberField, phField, quantityField, record, textField } from './fields.ts'
import { inactivation } from './inactivation.ts'

/** Temperature and, where something follows it, pH. */
export const conditions = (title: string) =>
  record(title, {
    temperature: quantityField('temperature', 'above', { title: 'the temperature' }),
    pH: phField().exactOptional(),
  })

const activity = record('a declared activity and how it was measured', {
  declared: eitherField(
    ['activity per mass', 'activity per volume'],
    'above',
    { title: 'the declared activity', called: 'an activity of the preparation' },
    (dimension, value): DeclaredActivity =>
      dimension === 'activity per mass'
        ? { per: 'mass', value: quantity<Activity>(value) }
        : { per: 'volume', value: quantity<VolumetricActivity>(value) },
  ),
  assay: record("the assay's conditions", {
    temperature: quantityField('temperature', 'above', {
      title: 'the temperature of the assay',
      example: '37 degC',
    }),
    pH: phField('the pH of the assay').exactOptional(),
    substrate: concentrationField(
      'the substrate in the assay (absent: it saturates the enzyme)',
      'above',
      '50 g/L',
    ).exactOptional(),
  }),
})

const rate = record('the rate law and its constants', {
  specificRate: specificRateField(
    'the specific rate (saturated and uninhibited, at the reference)',
  ).exactOptional(),
  activity: activity.exactOptional(),
  reference: conditions('where the specific rate holds').exactOptional(),
  Km: concentrationField('Km', 'above', '8 g/L'),
  Kic: concentrationField('Kic, competitive inhibition by the product', 'above', '5 g/L').exactOptional(),
  Kiu: concentrationField('Kiu, uncompetitive inhibition by the product', 'above', '40 g/L').exactOptional(),
  Ksi: concentrationField('Ksi, inhibition by the substrate', 'above', '300 g/L').exactOptional(),
  Keq: numberField('Keq, product over substrate at equilibrium in (g/L)/(g/L)', { above: 0 }).exactOptional(),
})
  .superRefine((value, ctx) => {
    exactlyOne(ctx, value, ['specificRate', 'activity'])
    if (given(value, ['activity']).length === 0) {
      needs(
        ctx,
        value,
        'specificRate',
        'reference',
        'a specificRate needs the temperature (and pH) at which it holds',
      )
    }
  }, onObject)
  .meta({
    oneOf: [
      { required: ['specificRate', 'reference'], not: { required: ['activity'] } },
      { required: ['activity'], not: { required: ['specificRate'] } },
    ],
  })

const temperature = record('how the rate follows the temperature', {
  Ea: quantityField('molar energy', 'at-least', {
    title: 'Ea, activation energy of the reaction',
  }).exactOptional(),
  Q10: numberField('Q10, the factor of the rate over 10 K', { above: 0 }).exactOptional(),
  from: quantityField('temperature', 'above', {
    title: 'the lower temperature of the pair that Q10 spans',
    example: '30 degC',
  }).exactOptional(),
  reversibleLoss: record('loss of activity in the heat that cooling restores', {
    half: quantityField('temperature', 'above', {
      title: 'the temperature at which half of the enzyme is out of action',
      example: '55 degC',
    }),
    energy: quantityField('molar energy', 'at-least', {
      title: 'the energy of the reversible loss',
      example: '300 kJ/mol',
    }),
  }).exactOptional(),
})
  .superRefine((value, ctx) => {
    exactlyOne(ctx, value, ['Ea', 'Q10'])
    if (given(value, ['Ea', 'Q10']).length === 1) {
      needs(ctx, value, 'Q10', 'from', 'a Q10 needs the lower temperature of its pair, such as "30 degC"')
      if (given(value, ['Ea', 'from']).length === 2)
        complain(ctx, 'found from beside Ea; from belongs to Q10')
    }
  }, onObject)
  .meta({
    oneOf: [
      { required: ['Ea'], not: { anyOf: [{ required: ['Q10'] }, { required: ['from'] }] } },
      { required: ['Q10', 'from'], not: { required: ['Ea'] } },
    ],
  })

/** The two constants of a bell over pH. */
export const pkPair = {
  pKa1: numberField('pKa1, the acid side of the bell'),
  pKa2: numberField('pKa2, the alkaline side of the bell'),
}

const pH = record('how the rate follows the pH', {
  pKa1: pkPair.pKa1.exactOptional(),
  pKa2: pkPair.pKa2.exactOptional(),
  free: record('the bell of the free enzyme', pkPair).exactOptional(),
  complex: record('the bell of the enzyme with its substrate', pkPair).exactOptional(),
})
  .superRefine((value, ctx) => {
    const one = given(value, ['pKa1', 'pKa2'])
    const two = given(value, ['free', 'complex'])
    if (one.length > 0 && two.length > 0)
      complain(ctx, 'found one bell beside two; give pKa1 and pKa2, or free and complex')
    else if (two.length === 1) {
      complain(ctx, 'is missing; free and complex go together', two[0] === 'free' ? 'complex' : 'free')
    } else if (two.length === 0) {
      for (const key of ['pKa1', 'pKa2']) {
        if (!one.includes(key))
          complain(ctx, 'is missing; the bell needs pKa1 and pKa2 as plain numbers', key)
      }
    }
  }, onObject)
  .meta({
    oneOf: [
      { required: ['pKa1', 'pKa2'], not: { anyOf: [{ required: ['free'] }, { required: ['complex'] }] } },
      { required: ['free', 'complex'], not: { anyOf: [{ required: ['pKa1'] }, { required: ['pKa2'] }] } },
    ],
  })

/** `enzyme` of the file. */
export const enzyme = record('the enzyme preparation', {
  name: textField('name of the preparation').exactOptional(),
  form: textField('liquid, powder …').exactOptional(),
  density: quantityField('density', 'above', {
    title: 'the density of the preparation (needed for activities per volume and countDoseVolume)',
  }).exactOptional(),
  rate,
  temperature,
  pH: pH.exactOptional(),
  inactivation: inactivation.exactOptional(),
})

export type EnzymeFile = z.output<typeof enzyme>
