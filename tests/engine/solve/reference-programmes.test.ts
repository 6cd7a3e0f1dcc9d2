import { afterAll, describe, test } from 'vitest'
import { programmeBatch } from '../../reference/batches.ts'
import { tally } from '../../reference/compare.ts'
import { load } from '../../reference/load.ts'
import {
  automatic,
  compareStates,
  compareTimes,
  explicit,
  finest,
  implicit,
  separation,
  statesAt,
} from '../../reference/routes.ts'

const { cases } = load('temperature_program')

describe.each([separation, automatic, explicit, implicit, finest])(
  'ramps, holds and kill steps run as worked out, by $name',
  (way) => {
    const counted = tally(`programmes by ${way.name}`)
    afterAll(() => console.log(counted.worst()))

    test.each(cases)('$id', (one) => {
      const batch = programmeBatch(one)
      const { state_at_time: rows, time_to_conversion: times } = one.expected
      const states = rows.map(({ kcat_E_integral, ...row }) => ({
        ...row,
        dose: one.inputs.E0,
        enzymeTime: kcat_E_integral,
      }))
      counted.hold(one.id, [
        ...compareTimes(
          way,
          batch,
          times.map(({ X, t = null }) => ({ X, t })),
        ),
        ...compareStates(way, batch, states),
      ])
    })

    test.each(cases)('$id loses its enzyme to the last e-fold', (one) => {
      const rows = one.expected.state_at_time
      const states = statesAt(
        way,
        programmeBatch(one),
        rows.map(({ t }) => t),
      )
      counted.hold(
        one.id,
        rows.map(({ t, ln_E_over_dose }, i) => ({
          what: `ln(E/dose) at ${t}`,
          got: Math.log((1000 * (states[i]?.enzyme ?? Number.NaN)) / one.inputs.E0),
          due: ln_E_over_dose,
          within: way.within,
          // Steps keep the digits of the share of enzyme left, not those of a logarithm near 0.
          floor: way === separation ? 1e-6 : 1,
        })),
      )
    })
  },
)
