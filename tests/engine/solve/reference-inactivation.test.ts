import { afterAll, describe, expect, test } from 'vitest'
import { doseScaleFor, leastDoseScale } from '../../../engine/solve/dose.ts'
import { solverOf } from '../../../engine/solve/solver.ts'
import { inactivationBatch, type ReferenceBatch } from '../../reference/batches.ts'
import { type Comparison, tally } from '../../reference/compare.ts'
import { load } from '../../reference/load.ts'
import {
  allowed,
  automatic,
  compareStates,
  compareTimes,
  explicit,
  finest,
  implicit,
  minutesTo,
  separation,
} from '../../reference/routes.ts'
import { scenarioOf } from '../../reference/scenarios.ts'

const { cases } = load('inactivation')
const ways = [separation, automatic, explicit, implicit, finest]

describe.each(ways)('an enzyme that decays does what its closed form says, by $name', (way) => {
  const counted = tally(`inactivation by ${way.name}`)
  afterAll(() => console.log(counted.worst()))

  test.each(cases)('$id reaches each conversion, or never does', (one) => {
    const batch = inactivationBatch(one)
    counted.hold(
      one.id,
      compareTimes(
        way,
        batch,
        one.expected.time_to_conversion.map(({ X, t = null, minimum_dose_E0: least }) => {
          // Enzyme used up over enzyme charged magnifies what is off, as at the edge of reachability.
          const x = (least ?? 0) / one.inputs.E0
          return { X, t, condition: t === null || x === 0 ? 1 : x / ((1 - x) * -Math.log1p(-x)) }
        }),
      ),
    )
  })

  test.each(cases)('$id keeps what is left of the enzyme when it does', (one) => {
    const batch = inactivationBatch(one)
    counted.hold(
      one.id,
      one.expected.time_to_conversion.flatMap(({ X, E_remaining_fraction: left }): Comparison[] => {
        if (left === undefined) return []
        const run = way.route(batch)({ doseScale: 1, target: X, endless: false })
        const enzyme = run.ok ? 1000 * run.value.end.enzyme : undefined
        return [{ what: `enzyme at ${X}`, got: enzyme, due: left * one.inputs.E0, within: way.within }]
      }),
    )
  })

  test.each(cases)('$id passes through each state', (one) => {
    const { kcat, kd, E0 } = one.inputs
    const batch = inactivationBatch(one)
    const enzymeTime = (t: number): number => kcat * E0 * (kd === 0 ? t : -Math.expm1(-kd * t) / kd)
    counted.hold(
      one.id,
      compareStates(
        way,
        batch,
        one.expected.state_at_time.map((row) => ({ ...row, dose: E0, enzymeTime: enzymeTime(row.t) })),
      ),
    )
  })

  test.each(cases.filter((one) => one.expected.edge_of_reachability.length > 0))(
    '$id stays reachable a hair above the least dose, not below',
    (one) => {
      for (const edge of one.expected.edge_of_reachability) {
        const { X, E0, t, condition_number_t_wrt_E0: condition, just_below } = edge
        counted.hold(one.id, compareTimes(way, inactivationBatch(one, E0), [{ X, t, condition }]))
        const below = inactivationBatch(one, just_below.E0)
        expect(minutesTo(way, below, X)).toBe(undefined)
        counted.hold(one.id, resting(below, just_below.limiting_conversion))
      }
    },
  )

  test.each(cases)('$id comes to rest where the enzyme has died', (one) => {
    const { limiting_conversion: limit, one_minus_limiting_conversion: rest } = one.expected
    // Left at 1e-25 of the charge or less, only separation has digits of the rest.
    counted.hold(one.id, resting(inactivationBatch(one), limit ?? 1, way === separation ? rest : null))
  })

  function resting(batch: ReferenceBatch, limit: number, rest: number | null = null): Comparison[] {
    const run = way.route(batch)({ doseScale: 1, endless: true })
    const end = run.ok ? run.value.end : undefined
    const conversion = { what: 'conversion at rest', got: end?.conversion, due: limit, within: way.within }
    if (rest === null || rest === 0) return [conversion]
    const got = end && end.substrate / batch.charge.S0
    return [conversion, { what: 'unconverted at rest', got, due: rest, within: way.within }]
  }
})

describe('doses', () => {
  const counted = tally('doses by separation')
  afterAll(() => console.log(counted.worst()))

  test.each(cases)('$id takes the least dose and the dose for a time of the closed form', (one) => {
    const batch = inactivationBatch(one)
    const solver = solverOf(scenarioOf(batch))
    const { kd, E0 } = one.inputs
    const least = one.expected.time_to_conversion.map(({ X, minimum_dose_E0 }): Comparison => {
      const scale = leastDoseScale(solver, X)
      const got = scale.ok ? scale.value : Number.NaN
      return {
        what: `least dose for ${X}`,
        got: got === null ? 0 : E0 * got,
        due: minimum_dose_E0 ?? 0,
        within: 1e-9,
      }
    })
    const timed = one.expected.dose_for_time.map(({ X, t, E0: due }): Comparison => {
      const scale = doseScaleFor(solver, X, 60 * t)
      const found = scale.ok && scale.value.kind === 'scale' ? E0 * scale.value.scale : undefined
      return {
        what: `dose for ${X} in ${t}`,
        got: found ?? Number.POSITIVE_INFINITY,
        due: due ?? Number.POSITIVE_INFINITY,
        within: 1e-9,
      }
    })
    expect(kd >= 0).toBe(true)
    counted.hold(one.id, [...least, ...timed])
  })

  test.each(cases)('$id is done by steps at the moment its dose was sized for', (one) => {
    const stepped = tally('doses by steps')
    for (const { X, t, E0 } of one.expected.dose_for_time) {
      if (E0 === undefined) continue
      const supplied = one.inputs.kd * t
      const condition = supplied === 0 ? 1 : Math.expm1(supplied) / supplied
      // Past that nothing of the dose's last digits is left in the time.
      if (condition > 1e3) continue
      const batch = inactivationBatch(one, E0)
      const got = minutesTo(automatic, batch, X)
      stepped.hold(one.id, [
        { what: `time to ${X} with ${E0}`, got, due: t, within: allowed(automatic, condition) },
      ])
    }
  })
})
