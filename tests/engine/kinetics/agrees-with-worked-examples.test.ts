import { afterAll, describe, expect, test } from 'vitest'
import { logStretch } from '../../../engine/kinetics/decay.ts'
import { halfLifeFromKd, kdFromHalfLife } from '../../../engine/kinetics/heat-resistance.ts'
import { enzymeTime, enzymeTimeTerms } from '../../../engine/kinetics/integrated-rate-law.ts'
import { type FirstOrderRate, hours, quantity } from '../../../engine/units/quantity.ts'
import { tally } from '../../reference/compare.ts'
import { load, type WorkedCase } from '../../reference/load.ts'

const { cases } = load('worked_examples')
const counted = tally('worked examples')
afterAll(() => console.log(counted.worst()))

const within = 1e-13
const named = (id: string): WorkedCase => {
  const found = cases.find((one) => one.id === id)
  if (!found) expect.unreachable(`no case ${id}`)
  return found
}
const uninhibited = (S0: number) => ({ S0, P0: 0, massYield: 1 })
const to = (conversion: number): number => -Math.log1p(-conversion)

describe('textbook batches, recomputed', () => {
  test('urea to 99 % with urease: a logarithmic and a linear term', () => {
    const { id, inputs, expected } = named('urease-batch-99')
    const Vmax = (inputs.Vmax_at_5_g_per_L * inputs.enzyme_g_per_L) / 5
    const terms = enzymeTimeTerms({ Km: inputs.Km_mol_per_L }, uninhibited(inputs.S0_mol_per_L), to(inputs.X))
    counted.hold(id, [
      { what: 'Vmax', got: Vmax, due: expected.Vmax_mol_per_L_s, within },
      { what: 'logarithmic term', got: terms.substrateShort / Vmax, due: expected.log_term_s, within },
      { what: 'linear term', got: terms.saturated / Vmax, due: expected.linear_term_s, within },
      {
        what: 'time',
        got: (terms.substrateShort + terms.saturated) / Vmax,
        due: expected.t_s,
        within,
      },
    ])
  })

  test('the time course of a batch', () => {
    const { id, inputs, expected } = named('batch-time-course-8.9mM')
    counted.hold(
      id,
      expected.time_to_conversion.map(({ X, t_h }) => ({
        what: `time to ${X}`,
        got: enzymeTime({ Km: inputs.Km_mM }, uninhibited(inputs.S0_mM), to(X)) / inputs.Vmax_mM_per_h,
        due: t_h,
        within,
      })),
    )
  })

  test('the same batch with an enzyme of 4.4 h half-life', () => {
    const { id, inputs, expected } = named('batch-with-deactivation-half-life-4.4h')
    const undecayed =
      enzymeTime({ Km: inputs.Km_mM }, uninhibited(inputs.S0_mM), to(inputs.X)) / inputs.Vmax0_mM_per_h
    const kd = 3600 * kdFromHalfLife(hours(inputs.half_life_h))
    const decayed = (rate: number): number => undecayed * logStretch(rate * undecayed)
    counted.hold(id, [
      { what: 'kd', got: kd, due: expected.kd_per_h, within },
      { what: 'time without loss', got: undecayed, due: expected.t_h_without_decay, within },
      { what: 'time', got: decayed(kd), due: expected.t_h, within },
      {
        what: 'time at the rounded kd',
        got: decayed(0.158),
        due: expected['t_h_with_kd_rounded_0.158'],
        within,
      },
    ])
  })

  test('half-lives of a free and a bound enzyme', () => {
    const { id, expected } = named('half-life-amyloglucosidase')
    const halfLife = (kd: number): number => halfLifeFromKd(quantity<FirstOrderRate>(kd / 60)) / 60
    counted.hold(id, [
      {
        what: 'free',
        got: halfLife(expected.kd_soluble_per_min),
        due: expected.half_life_soluble_min,
        within,
      },
      {
        what: 'bound',
        got: halfLife(expected.kd_immobilised_per_min),
        due: expected.half_life_immobilised_min,
        within,
      },
    ])
  })
})
