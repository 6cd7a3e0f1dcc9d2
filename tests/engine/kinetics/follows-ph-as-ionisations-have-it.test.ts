import { afterAll, describe, test } from 'vitest'
import { bell, bellHalfWidth, bellOptimum } from '../../../engine/kinetics/ph-bell.ts'
import { fullOptimum, kmFactor, limitingRateFactor } from '../../../engine/kinetics/ph-full.ts'
import { saturation } from '../../../engine/kinetics/rate-law.ts'
import { tally } from '../../reference/compare.ts'
import { type BellCase, type FullPhCase, load } from '../../reference/load.ts'

const { cases } = load('ph_profile')
const counted = tally('pH profiles')
afterAll(() => console.log(counted.worst()))

const within = 1e-13
const isBell = (one: BellCase | FullPhCase): one is BellCase => one.inputs.model === 'bell'

describe('the bell of two ionisations', () => {
  test.each(cases.filter(isBell))('$id', ({ id, inputs, expected }) => {
    const optimum = bellOptimum(inputs)
    const top = bell(inputs, optimum)
    const [acid, alkaline] = bellHalfWidth(inputs)
    counted.hold(id, [
      { what: 'optimum', got: optimum, due: expected.optimum_pH, within },
      { what: 'height', got: top, due: expected.raw_at_optimum, within },
      { what: 'acid side', got: acid, due: expected.half_activity_pH[0], within },
      { what: 'alkaline side', got: alkaline, due: expected.half_activity_pH[1], within },
      ...expected.profile.flatMap(({ pH, raw, normalised }) => [
        { what: `share at pH ${pH}`, got: bell(inputs, pH), due: raw, within },
        { what: `share of the top at pH ${pH}`, got: bell(inputs, pH) / top, due: normalised, within },
      ]),
    ])
  })
})

describe('the full model with the pKs of free enzyme and complex apart', () => {
  const isFull = (one: BellCase | FullPhCase): one is FullPhCase => !isBell(one)
  test.each(cases.filter(isFull))('$id', ({ id, inputs, expected }) => {
    const { kcat, E, Km, S } = inputs
    const free = { pKa1: inputs.pKe1, pKa2: inputs.pKe2 }
    const complex = { pKa1: inputs.pKes1, pKa2: inputs.pKes2 }
    const at = (pH: number) => {
      const Vmax = kcat * E * limitingRateFactor(complex, pH)
      const KmHere = Km * kmFactor(free, complex, pH)
      return { Vmax, Km: KmHere, v: Vmax * saturation({ Km: KmHere }, S, 0) }
    }
    const optimum = fullOptimum(free, complex, Km, S)
    counted.hold(id, [
      { what: 'optimum of v', got: optimum, due: expected.optimum_pH_of_v, within },
      { what: 'v at its optimum', got: at(optimum).v, due: expected.v_at_optimum, within },
      { what: 'optimum of Vmax', got: bellOptimum(complex), due: expected.optimum_pH_of_Vmax, within },
      // Substrate far below Km leaves only Vmax/Km.
      {
        what: 'optimum of Vmax/Km',
        got: fullOptimum(free, complex, Km, 1e-30 * Km),
        due: expected.optimum_pH_of_Vmax_over_Km,
        within,
      },
      ...expected.profile.flatMap((row) => {
        const here = at(row.pH)
        return [
          { what: `Vmax at pH ${row.pH}`, got: here.Vmax, due: row.Vmax_app, within },
          { what: `Km at pH ${row.pH}`, got: here.Km, due: row.Km_app, within },
          {
            what: `Vmax/Km at pH ${row.pH}`,
            got: here.Vmax / here.Km,
            due: row.Vmax_over_Km_app,
            within,
          },
          { what: `v at pH ${row.pH}`, got: here.v, due: row.v, within },
        ]
      }),
    ])
  })
})
