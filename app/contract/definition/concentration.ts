/** Values by mass, or molar and then counted in the substrate. */
import {
  type Concentration,
  type DimensionName,
  type Quantity,
  quantity,
  type SpecificRate,
} from '../../../engine/index.ts'
import { eitherField, type Range } from './fields.ts'

/** As given; a molar one still waits for the substrate's molar mass. */
export type Given<Q, M extends DimensionName> =
  | { readonly by: 'mass'; readonly value: Q }
  | { readonly by: 'amount'; readonly value: Quantity<M> }

export type GivenConcentration = Given<Concentration, 'molar concentration'>
export type GivenSpecificRate = Given<SpecificRate, 'molar specific rate'>

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

/** Mass of substrate, or its amount, per mass of preparation and time. */
export const specificRateField = (title: string) =>
  eitherField(
    ['specific rate', 'molar specific rate'],
    'above',
    { title },
    (dimension, value): GivenSpecificRate =>
      dimension === 'specific rate'
        ? { by: 'mass', value: quantity<SpecificRate>(value) }
        : { by: 'amount', value: quantity<Quantity<'molar specific rate'>>(value) },
  )
