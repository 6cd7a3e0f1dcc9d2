import { type MolarEnergy, quantity, type Temperature } from '../units/quantity.ts'
import { gasConstant } from './gas-constant.ts'

/**
 * Activation energy behind a Q10 measured between T and T + 10 K.
 *
 * Units    Q10 plain and above 0; T in K; returns J/mol.
 * Source   Arrhenius law at T and T + 10: Ea = R·ln(Q10)·T·(T + 10)/10.
 */
export const EaFromQ10 = (Q10: number, T: Temperature): MolarEnergy =>
  quantity<MolarEnergy>((gasConstant * Math.log(Q10) * T * (T + 10)) / 10)

/** Q10 between T and T + 10 K of an activation energy; the inverse of `EaFromQ10`. */
export const Q10FromEa = (Ea: MolarEnergy, T: Temperature): number =>
  Math.exp((10 * Ea) / (gasConstant * T * (T + 10)))

/** Activation energy from the rate constants at two temperatures; the constants in any one unit. */
export const EaFromRates = (k1: number, T1: Temperature, k2: number, T2: Temperature): MolarEnergy =>
  quantity<MolarEnergy>((gasConstant * Math.log(k2 / k1) * T1 * T2) / (T2 - T1))
