/** Sentences for quantities that cannot be read; one case for each failure, checked by the compiler. */
import { dimensions, type MoneyFailure } from '../../../engine/index.ts'
import { found, visible } from '../fault.ts'

/** What a place in the file is due. */
export interface Due {
  /** With its article: "a temperature". */
  readonly called: string
  readonly units: readonly string[]
  readonly example: string
}

/** Why a text is not the quantity due. */
export const quantitySentence = (text: string, failure: MoneyFailure, due: Due): string => {
  const units = `units that fit: ${due.units.join(', ')}`
  const such = `write ${due.called} as "${due.example}"`
  switch (failure.kind) {
    case 'not-a-quantity':
      return `found ${found(text)}, which does not begin with a number; ${such} (${units})`
    case 'number-form':
      return `found ${found(text)}, where "${visible(failure.number)}" is not written as a plain number; ${such}, with digits on both sides of the point and no grouping (${units})`
    case 'decimal-comma':
      return `found ${found(text)} with a decimal comma; write a point, as in "${visible(failure.written)}", and no grouping of thousands (${units})`
    case 'no-unit':
      return `found ${found(text)} without a unit; ${such} (${units})`
    case 'unknown-unit':
      return `found ${found(text)}, where "${visible(failure.unit)}" is not a known unit${suggestion(failure.near)}; ${units}`
    case 'wrong-dimension':
      return `found ${found(text)}, where ${failure.unit} is a unit of ${bare(dimensions[failure.of].called)}; ${due.called} is due here (${units})`
    case 'not-finite':
      return `found ${found(text)}, which is not a finite number; ${such} (${units})`
    case 'too-small':
      return `found ${found(text)}, which is too near to 0 to be held as a double; ${such} (${units})`
    case 'no-per':
      return `found ${found(text)}, which does not say per what; ${such} (${units})`
    case 'unknown-currency':
      return `found ${found(text)}, where "${visible(failure.currency)}" is not an ISO 4217 currency code${suggestion(failure.near)}; ${such} (${units})`
    case 'wrong-per':
      return `found ${found(text)}, where "${visible(failure.unit)}" is not ${due.called}; ${units}`
    default:
      return failure satisfies never
  }
}

/** The end of a sentence that offers the nearest known word. */
export const suggestion = (near: string | undefined): string =>
  near === undefined ? '' : `; perhaps ${near} is meant`

const bare = (called: string): string => called.replace(/^an? /, '').replace(/ \(.*$/, '')
