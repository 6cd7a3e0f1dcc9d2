import { afterAll, describe, expect, test } from 'vitest'
import type { Answer } from '../../../engine/answer.ts'
import { plan } from '../../../engine/plan.ts'
import type { Ask } from '../../../engine/scenario.ts'
import { celsius, minutes } from '../../../engine/units/quantity.ts'
import { optimumBatch } from '../../reference/batches.ts'
import { tally } from '../../reference/compare.ts'
import { load, type OptimumCase } from '../../reference/load.ts'
import {
  automatic,
  compareStates,
  compareTimes,
  finest,
  minutesTo,
  separation,
} from '../../reference/routes.ts'
import { scenarioOf } from '../../reference/scenarios.ts'

const of = (problem: string): readonly OptimumCase[] =>
  load('optimum').cases.filter(({ inputs }) => inputs.problem === problem)
const shortest = of('temperature_for_minimum_time')
const furthest = of('temperature_for_maximum_conversion')

const counted = tally('best temperatures')
afterAll(() => console.log(counted.worst()))

const answered = (one: OptimumCase, ask: Ask): Answer => {
  const outcome = plan(scenarioOf(optimumBatch(one, 45), ask))
  if (!outcome.ok) expect.unreachable(JSON.stringify(outcome.failure))
  return outcome.value
}
const between = ({ inputs }: OptimumCase) => [celsius(inputs.T_min), celsius(inputs.T_max)] as const
const warned = (answer: Answer): boolean => answer.warnings.some(({ code }) => code === 'optimum-at-bound')
/** 1e-8 K of an absolute temperature: what the root of a slope gives, and comparing values does not. */
const kelvins = (one: OptimumCase): number => 1e-8 / celsius(one.expected.T_opt)

describe('the temperature of the shortest time', () => {
  test.each(shortest)('$id', (one) => {
    const { T_opt, t_min, at_bound, E_remaining_fraction } = one.expected
    const answer = answered(one, {
      find: 'temperature',
      best: 'time',
      conversion: one.inputs.X,
      between: between(one),
    })
    const time = answer.time === undefined ? undefined : answer.time / 60
    const run = separation.route(optimumBatch(one, T_opt))({
      doseScale: 1,
      target: one.inputs.X,
      endless: false,
    })
    const left = run.ok ? (1000 * run.value.end.enzyme) / one.inputs.E0 : undefined
    counted.hold(one.id, [
      { what: 'temperature', got: answer.temperature, due: celsius(T_opt), within: kelvins(one) },
      { what: 'time', got: time, due: t_min, within: 1e-9 },
      { what: 'enzyme left', got: left, due: E_remaining_fraction, within: 1e-9 },
    ])
    expect(warned(answer)).toBe(at_bound)
    expect(answer.reachable).toBe(true)
    expect(answer.check.relativeDifference).toBeLessThan(1e-6)
  })

  test.each(shortest)('$id is out of reach from the temperature found on', (one) => {
    const { T_max_reachable: edge } = one.expected
    if (edge === null) {
      expect(minutesTo(separation, optimumBatch(one, one.inputs.T_max), one.inputs.X)).toBeDefined()
      return
    }
    for (const way of [separation, finest]) {
      expect(minutesTo(way, optimumBatch(one, edge - 1e-6), one.inputs.X)).toBeDefined()
      expect(minutesTo(way, optimumBatch(one, edge + 1e-6), one.inputs.X)).toBeUndefined()
    }
  })
})

describe('the temperature of the highest conversion', () => {
  test.each(furthest)('$id', (one) => {
    const { T_opt, X_max, at_bound, kd_t_at_optimum } = one.expected
    const answer = answered(one, {
      find: 'temperature',
      best: 'conversion',
      within: minutes(one.inputs.t),
      between: between(one),
    })
    const run = separation.route(optimumBatch(one, T_opt))({
      doseScale: 1,
      until: 60 * one.inputs.t,
      endless: false,
    })
    const lost = run.ok ? -Math.log((1000 * run.value.end.enzyme) / one.inputs.E0) : undefined
    counted.hold(one.id, [
      { what: 'temperature', got: answer.temperature, due: celsius(T_opt), within: kelvins(one) },
      { what: 'conversion', got: answer.conversion, due: X_max, within: 1e-9 },
      { what: 'kd·t', got: lost, due: kd_t_at_optimum, within: 1e-9 },
    ])
    expect(warned(answer)).toBe(at_bound)
    expect(answer.check.relativeDifference).toBeLessThan(1e-6)
  })
})

describe.each([separation, automatic, finest])('at other temperatures, by $name', (way) => {
  const others = tally(`other temperatures by ${way.name}`)
  afterAll(() => console.log(others.worst()))

  test.each(shortest)('$id takes longer', (one) => {
    for (const { T, t } of one.expected.time_at_other_temperatures) {
      const x = kdAt(one, T) * t
      const condition = Math.expm1(x) / x
      others.hold(one.id, compareTimes(way, optimumBatch(one, T), [{ X: one.inputs.X, t, condition }]))
      expect(t).toBeGreaterThan(one.expected.t_min)
    }
  })

  test.each(furthest)('$id comes less far', (one) => {
    for (const { T, X } of one.expected.conversion_at_other_temperatures) {
      const S = one.inputs.S0 * (1 - X)
      const [, conversion] = compareStates(way, optimumBatch(one, T), [{ t: one.inputs.t, S, X }])
      others.hold(one.id, conversion ? [conversion] : [])
      expect(X).toBeLessThan(one.expected.X_max)
    }
  })
})

/** 1/min */
function kdAt({ inputs }: OptimumCase, T: number): number {
  const { kd_ref, Ed, Td_ref } = inputs
  return kd_ref * Math.exp((-1000 * Ed * (1 / celsius(T) - 1 / celsius(Td_ref))) / 8.31446261815324)
}
