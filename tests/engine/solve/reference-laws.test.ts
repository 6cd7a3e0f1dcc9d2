import { afterAll, describe, test } from 'vitest'
import { closedFormBatch, inhibitionBatch } from '../../reference/batches.ts'
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

const ways = [separation, automatic, explicit, implicit, finest]

describe.each(ways)('Michaelis–Menten batches run as their closed form, by $name', (way) => {
  const counted = tally(`Michaelis–Menten by ${way.name}`)
  afterAll(() => console.log(counted.worst()))

  test.each(load('michaelis_menten_closed_form').cases)('$id', (one) => {
    const batch = closedFormBatch(one)
    const { Vmax, state_at_time: rows = [], time_to_conversion: times } = one.expected
    const states = rows.map((row) => ({ ...row, enzymeTime: Vmax * row.t }))
    counted.hold(one.id, compareTimes(way, batch, times))
    if (states.length > 0) counted.hold(one.id, compareStates(way, batch, states))
  })
})

test('what is gone in the first moments has all its digits by separation', () => {
  const counted = tally('substrate gone')
  for (const one of load('michaelis_menten_closed_form').cases) {
    const rows = one.expected.state_at_time ?? []
    if (rows.length === 0) continue
    const times = rows.map(({ t }) => t)
    const states = statesAt(separation, closedFormBatch(one), times)
    counted.hold(
      one.id,
      // Nothing was charged of the product, and a gram of substrate gives a gram of it.
      rows.map(({ t, S0_minus_S }, i) => ({
        what: `gone at ${t}`,
        got: states[i]?.product,
        due: S0_minus_S,
        within: 1e-9,
      })),
    )
  }
  console.log(counted.worst())
})

describe.each(ways)('inhibited and reversible batches run as their closed form, by $name', (way) => {
  const counted = tally(`inhibition by ${way.name}`)
  afterAll(() => console.log(counted.worst()))

  test.each(load('product_inhibition').cases)('$id', (one) => {
    const batch = inhibitionBatch(one)
    const { kcat, E } = one.inputs
    const { state_at_time: rows, time_to_conversion: times } = one.expected
    // By steps the equilibrium itself is reached, to round-off, in the time that round-off takes.
    const asked = times.filter(
      ({ X, limiting_conversion }) => way === separation || X !== limiting_conversion,
    )
    counted.hold(one.id, [
      ...compareTimes(
        way,
        batch,
        asked.map(({ X, t = null }) => ({ X, t })),
      ),
      ...compareStates(
        way,
        batch,
        rows.map((row) => ({ ...row, E, enzymeTime: kcat * E * row.t })),
      ),
    ])
  })
})

describe('a reversible batch comes to rest at its equilibrium', () => {
  test.each(load('product_inhibition').cases.filter((one) => one.expected.equilibrium_X !== undefined))(
    '$id',
    (one) => {
      const { equilibrium_S = Number.NaN, equilibrium_X = Number.NaN } = one.expected
      const batch = inhibitionBatch(one)
      const counted = tally('equilibria')
      for (const way of [separation, automatic]) {
        const run = way.route(batch)({ doseScale: 1, endless: true })
        const end = run.ok ? run.value.end : undefined
        counted.hold(one.id, [
          { what: `S by ${way.name}`, got: end?.substrate, due: equilibrium_S, within: way.within },
          { what: `X by ${way.name}`, got: end?.conversion, due: equilibrium_X, within: way.within },
        ])
      }
    },
  )
})
