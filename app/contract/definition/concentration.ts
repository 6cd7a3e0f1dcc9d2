/** Concentrations of substrate and product: by mass, or molar and then of the substrate. */
import { type Concentration, type Quantity, quantity } from '../../../engine/index.ts'
import { eitherField, type Range } from './fields.ts'

/** As given; a molar one still waits for the substrate's molar mass. */
export type GivenConcentration =
  | { readonly by: 'mass'; readonly value: Concentration }
  | { readonly by: 'amount'; readonly value: Quantity<'molar concentration'> }

/** A concentration by mass or molar. */
export const concentrationField = (title: string, range: Range, example = '45 g/L') =>
  eitherField(
    ['concentration', 'molar concentration'],
    range,
    { title, example, called: 'a concentration' },
    (dimension, value): GivenConcentration =>
      dimension === 'concentration'
        ? { by: 'mass', value: quantity<Concentration>(value) }
        : { by: 'amount', value: quantity<Quantity<'molar concentration'>>(value) },
  )
