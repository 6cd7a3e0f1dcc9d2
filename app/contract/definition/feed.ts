/** What is in the vessel before the enzyme. */

import { complain, given, listed, needs, onObject } from './clashes.ts'
import { concentrationField } from './concentration.ts'
import { numberField, quantityField, record, textField } from './fields.ts'

const slow = record('the share of the substrate that reacts slowly', {
  share: numberField('the slow share of the substrate', { above: 0, below: 1 }),
  relativeRate: numberField('the rate of the slow share beside the rest', { above: 0, atMost: 1 }),
})

const substrate = record('the substrate', {
  name: textField('name of the substrate').exactOptional(),
  molarMass: quantityField('molar mass', 'above', {
    title: 'the molar mass of the substrate (needed for activities and molar concentrations)',
  }).exactOptional(),
  concentration: concentrationField('the concentration of substrate charged', 'above'),
  slow: slow.exactOptional(),
})

const product = record('the product that inhibits', {
  name: textField('name of the product').exactOptional(),
  massYield: numberField('the mass of product per mass of substrate', { above: 0 }).exactOptional(),
  molarMass: quantityField('molar mass', 'above', {
    title: 'the molar mass of the product (instead of massYield)',
    example: '180.16 g/mol',
  }).exactOptional(),
  molesPerSubstrate: numberField('the moles of product per mole of substrate (1 if absent)', {
    above: 0,
  }).exactOptional(),
  concentration: concentrationField('the concentration of product charged', 'at-least', '0 g/L'),
})
  .superRefine((value, ctx) => {
    const stoichiometry = given(value, ['molarMass', 'molesPerSubstrate'])
    const both = given(value, ['massYield']).length === 1
    if (both && stoichiometry.length > 0) {
      complain(ctx, `found massYield beside ${listed(stoichiometry, 'and')}; give the yield one way only`)
    } else if (!both && stoichiometry.length === 0) {
      complain(
        ctx,
        'is missing; give the mass of product per mass of substrate as a plain number, or molarMass and molesPerSubstrate instead',
        'massYield',
      )
    } else
      needs(
        ctx,
        value,
        'molesPerSubstrate',
        'molarMass',
        'molesPerSubstrate needs the molar mass of the product',
      )
  }, onObject)
  .meta({
    oneOf: [
      {
        required: ['massYield'],
        not: { anyOf: [{ required: ['molarMass'] }, { required: ['molesPerSubstrate'] }] },
      },
      { required: ['molarMass'], not: { required: ['massYield'] } },
    ],
  })

/** `feed` of the file. */
export const feed = record('what is charged before the enzyme', {
  volume: quantityField('volume', 'above', { title: 'the volume charged' }),
  substrate,
  product,
})
