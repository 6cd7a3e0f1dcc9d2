import { afterAll, describe, expect, test } from 'vitest'
import { type EnzymeForms, formIntegrals, formsAfter } from '../../../engine/kinetics/series-inactivation.ts'
import { type Comparison, tally } from '../../reference/compare.ts'
import { load, type SeriesInputs } from '../../reference/load.ts'

const cases = load('two_step_inactivation').cases.filter((one) => one.expected.activity_vs_time)
const counted = tally('two-step inactivation')
afterAll(() => console.log(counted.worst()))

const within = 1e-12
const native: EnzymeForms = { native: 1, intermediate: 0, final: 0 }
const activity = ({ alpha1, alpha2 }: SeriesInputs, forms: EnzymeForms): number =>
  forms.native + alpha1 * forms.intermediate + alpha2 * forms.final

describe('the forms of a series, their activity and its integral', () => {
  test.each(cases)('$id', ({ id, inputs, expected }) => {
    const { k1, k2 } = inputs
    const at = (t: number): number => activity(inputs, formsAfter(native, k1, k2, t))
    counted.hold(
      id,
      (expected.activity_vs_time ?? []).flatMap((row): Comparison[] => {
        const forms = formsAfter(native, k1, k2, row.t)
        const integral = activity(inputs, formIntegrals(native, k1, k2, row.t))
        return [
          { what: `native at ${row.t}`, got: forms.native, due: row.E, within },
          { what: `intermediate at ${row.t}`, got: forms.intermediate, due: row.E1, within },
          { what: `final at ${row.t}`, got: forms.final, due: row.Ed, within },
          { what: `activity at ${row.t}`, got: activity(inputs, forms), due: row.activity, within },
          { what: `integral to ${row.t}`, got: integral, due: row.activity_integral, within },
        ]
      }),
    )
    const { time_to_half_activity: half, time_of_maximum_activity: top, maximum_activity: most } = expected
    if (half !== undefined)
      counted.hold(id, [{ what: 'activity at its half-time', got: at(half), due: 0.5, within }])
    if (top !== undefined && most !== undefined) {
      counted.hold(id, [{ what: 'highest activity', got: at(top), due: most, within }])
      expect(at(0.99 * top)).toBeLessThan(most)
      expect(at(1.01 * top)).toBeLessThan(most)
    }
  })
})
