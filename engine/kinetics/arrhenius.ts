import type { MolarEnergy, Temperature } from '../units/quantity.ts'
import { gasConstant } from './gas-constant.ts'

/**
 * Ratio of a rate constant at T to the one at Tref.
 *
 * Units    K, J/mol; returns a plain ratio.
 * Source   Arrhenius law, exp(−Ea/R·(1/T − 1/Tref)), written without the difference of reciprocals.
 */
export const arrheniusFactor = (Ea: MolarEnergy, Tref: Temperature, T: Temperature): number =>
  Math.exp(((Ea / gasConstant) * (T - Tref)) / (T * Tref))
