import { afterAll, describe, expect, test } from 'vitest'
import { activityPerMass, specificRateFromActivity } from '../../../engine/kinetics/activity.ts'
import { arrheniusFactor } from '../../../engine/kinetics/arrhenius.ts'
import { gasConstant } from '../../../engine/kinetics/gas-constant.ts'
import {
  DAt,
  DFromKd,
  EaFromZ,
  halfLifeFromKd,
  kdFromD,
  kdFromHalfLife,
  zFromEa,
} from '../../../engine/kinetics/heat-resistance.ts'
import { EaFromQ10, EaFromRates, Q10FromEa } from '../../../engine/kinetics/q10.ts'
import { inUnit } from '../../../engine/units/display.ts'
import { parseQuantity } from '../../../engine/units/parse.ts'
import {
  celsius,
  type Density,
  type FirstOrderRate,
  type MolarEnergy,
  type MolarMass,
  quantity,
  type TemperatureDifference,
  type Time,
  type VolumetricActivity,
} from '../../../engine/units/quantity.ts'
import { type Comparison, tally } from '../../reference/compare.ts'
import { load, type RelationCase } from '../../reference/load.ts'

const { cases } = load('temperature_relations')
const counted = tally('temperature relations')
afterAll(() => console.log(counted.worst()))

const kilojoules = (kJ: number): MolarEnergy => quantity<MolarEnergy>(1000 * kJ)
const perMinute = (kd: number): FirstOrderRate => quantity<FirstOrderRate>(kd / 60)
const time = (min: number): Time => quantity<Time>(60 * min)
const kelvins = (K: number): TemperatureDifference => quantity<TemperatureDifference>(K)
const read = (text: string, dimension: 'amount rate' | 'first-order rate'): number => {
  const got = parseQuantity(text, dimension)
  return got.ok ? got.value : Number.NaN
}

/** What the functions give for each number that a case expects, by the same name. */
const given: Readonly<
  Record<string, (i: RelationCase['inputs'], e: RelationCase['expected']) => Readonly<Record<string, number>>>
> = {
  Q10_to_Ea: ({ Q10, T }) => ({ Ea: EaFromQ10(Q10, celsius(T)) / 1000 }),
  Ea_to_Q10: ({ Ea, T }) => ({ Q10: Q10FromEa(kilojoules(Ea), celsius(T)) }),
  two_rates: ({ k1, T1, k2, T2 }) => {
    const Ea = EaFromRates(k1, celsius(T1), k2, celsius(T2))
    return {
      Ea: Ea / 1000,
      Q10_between: arrheniusFactor(Ea / gasConstant, celsius(T1), celsius(T2)) ** (10 / (T2 - T1)),
    }
  },
  kd_halflife_D: ({ kd }) => {
    const halfLife = halfLifeFromKd(perMinute(kd))
    const D = DFromKd(perMinute(kd))
    return {
      half_life: halfLife / 60,
      D_value: D / 60,
      D_over_half_life: D / halfLife,
      residual_after_60_min: Math.exp(-kdFromHalfLife(halfLife) * time(60)),
      kd_per_h: inUnit(kdFromD(D), 'first-order rate', '1/h') ?? Number.NaN,
      kd_per_s: read(`${kd} 1/min`, 'first-order rate'),
    }
  },
  z_to_Ed: ({ z, T_low, T_high, D_at_T_low }) => {
    const [low, high] = [celsius(T_low), celsius(T_high)]
    const D = time(D_at_T_low)
    const DHigh = DAt(D, low, kelvins(z), high)
    return {
      Ed_two_temperature: EaFromRates(1 / D, low, 1 / DHigh, high) / 1000,
      Ed_local_at_T_low: EaFromZ(kelvins(z), low) / 1000,
      Ed_local_at_T_high: EaFromZ(kelvins(z), high) / 1000,
      D_at_T_high_by_z: DHigh / 60,
      z_back_from_Ed: zFromEa(EaFromZ(kelvins(z), low), low),
    }
  },
  Ed_to_z: ({ Ed, T }, { z_exact_tenfold_above_T = Number.NaN }) => ({
    z_local: zFromEa(kilojoules(Ed), celsius(T)),
    z_exact_tenfold_above_T:
      z_exact_tenfold_above_T *
      Math.log10(
        arrheniusFactor(kilojoules(Ed) / gasConstant, celsius(T), celsius(T + z_exact_tenfold_above_T)),
      ),
  }),
  unit_to_katal: ({ U }) => {
    const rate = quantity<never>(read(`${U} U`, 'amount rate'))
    const as = (unit: string): number => inUnit<'amount rate'>(rate, 'amount rate', unit) ?? Number.NaN
    return { kat: as('kat'), nkat: as('nkat'), umol_per_min: as('umol/min'), mol_per_s: as('mol/s') }
  },
  activity_to_Vmax: ({ U_per_mL, molar_mass_g_per_mol }) => {
    const read = parseQuantity(`${U_per_mL} U/mL`, 'activity per volume')
    const activity = read.ok ? read.value : quantity<VolumetricActivity>(Number.NaN)
    const density = quantity<Density>(1150)
    const M = quantity<MolarMass>(molar_mass_g_per_mol / 1000)
    // Saturated, and the preparation itself filling the vessel: kg/(m³ s) is 60 g/(L min).
    const Vmax = specificRateFromActivity(activityPerMass(activity, density), M, 5) * density
    return {
      Vmax_g_per_L_min: 60 * Vmax,
      Vmax_mmol_per_L_min: (60 * Vmax) / M,
      kat_per_m3: activity,
    }
  },
  assay_to_process: ({ activity_U_per_g, T_assay, T_process, Ea }) => {
    const factor = arrheniusFactor(kilojoules(Ea) / gasConstant, celsius(T_assay), celsius(T_process))
    return { factor, activity_at_process_U_per_g: activity_U_per_g * factor }
  },
}

describe('Q10, Ea, half-life, D, z and activity convert as worked out', () => {
  test.each(cases)('$id', ({ id, inputs, expected }) => {
    const got = given[inputs.relation]?.(inputs, expected) ?? {}
    expect(Object.keys(got).sort()).toEqual(Object.keys(expected).sort())
    counted.hold(
      id,
      Object.entries(expected).map(
        // exp(−198) carries the round-off of its exponent.
        ([what, due]): Comparison => ({ what, got: got[what], due, within: due < 1e-80 ? 1e-13 : 4e-15 }),
      ),
    )
  })
})
