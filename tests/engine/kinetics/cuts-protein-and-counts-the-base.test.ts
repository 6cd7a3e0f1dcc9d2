import { afterAll, describe, test } from 'vitest'
import { decayMean } from '../../../engine/kinetics/decay.ts'
import {
  degreeOfHydrolysisAt,
  degreeOfHydrolysisRate,
  timeToDegreeOfHydrolysis,
} from '../../../engine/kinetics/degree-of-hydrolysis.ts'
import {
  baseForDegreeOfHydrolysis,
  degreeOfHydrolysisFromBase,
  dissociatedShare,
  pKAt,
} from '../../../engine/kinetics/ph-stat.ts'
import { celsius, minutes, quantity, type Time } from '../../../engine/units/quantity.ts'
import { type Comparison, tally } from '../../reference/compare.ts'
import { load } from '../../reference/load.ts'

const { cases } = load('protein_dh')
const of = (model: string) => cases.filter(({ inputs }) => inputs.model === model)
const counted = tally('degree of hydrolysis')
afterAll(() => console.log(counted.worst()))

const within = 1e-13

/** The cases count percent and minutes, the functions shares and seconds. */
const perSecond = (percentPerMinute: number): number => percentPerMinute / 100 / 60
const perShare = (perPercent: number): number => 100 * perPercent

describe('the degree of hydrolysis grows and slows down exponentially', () => {
  test.each(of('dh_exponential'))('$id', ({ id, inputs, expected }) => {
    const a = perSecond(inputs.a)
    const b = perShare(inputs.b)
    counted.hold(id, [
      ...expected.DH_vs_time.flatMap(({ t, DH, rate }): Comparison[] => [
        { what: `DH at ${t}`, got: 100 * degreeOfHydrolysisAt(a, b, minutes(t)), due: DH, within },
        {
          what: `rate at ${t}`,
          got: 6000 * degreeOfHydrolysisRate(a, b, degreeOfHydrolysisAt(a, b, minutes(t))),
          due: rate ?? Number.NaN,
          within,
        },
      ]),
      ...expected.time_to_DH.map(({ DH, t }) => ({
        what: `time to ${DH} %`,
        got: timeToDegreeOfHydrolysis(a, b, DH / 100) / 60,
        due: t,
        within,
      })),
    ])
  })
})

describe('an enzyme that decays cuts as long as its mean life lasts', () => {
  test.each(of('dh_exponential_decay'))('$id', ({ id, inputs, expected }) => {
    const { kd, DH0 } = inputs
    const degreeAfter = (t: Time): number =>
      100 * degreeOfHydrolysisAt(perSecond(inputs.a), perShare(inputs.b), t, DH0 / 100)
    counted.hold(id, [
      ...expected.DH_vs_time.map(({ t, DH }) => ({
        what: `DH at ${t}`,
        got: degreeAfter(quantity<Time>(60 * t * decayMean(kd * t))),
        due: DH,
        within,
      })),
      { what: 'DH in the end', got: degreeAfter(minutes(1 / kd)), due: expected.limiting_DH, within },
    ])
  })
})

describe('base used at constant pH', () => {
  test.each(of('pH_stat'))('$id', ({ id, inputs, expected }) => {
    const { B_mL, Nb_meq_per_mL, pH, pK, MP_g_protein, htot_meq_per_g } = inputs
    const share = dissociatedShare(pH, pK)
    const protein = MP_g_protein / 1000
    const DH = degreeOfHydrolysisFromBase((B_mL * Nb_meq_per_mL) / 1000, share, protein, htot_meq_per_g)
    const base = baseForDegreeOfHydrolysis(0.1, share, protein, htot_meq_per_g)
    counted.hold(id, [
      { what: 'alpha', got: share, due: expected.alpha, within },
      { what: '1/alpha', got: 1 / share, due: expected.inverse_alpha, within },
      { what: 'DH', got: 100 * DH, due: expected.DH_percent, within },
      {
        what: 'base for a tenth',
        got: (1000 * base) / Nb_meq_per_mL,
        due: expected.base_needed_mL_for_DH_10_percent,
        within,
      },
    ])
  })
})

describe('the pK of amino groups falls with temperature', () => {
  test.each(of('pK_of_T'))('$id', ({ id, inputs, expected }) => {
    const { T, pK_25, slope_K } = inputs
    counted.hold(id, [{ what: 'pK', got: pKAt(pK_25, slope_K, celsius(T)), due: expected.pK, within }])
  })
})
