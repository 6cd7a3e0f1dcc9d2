import type { MolarEnergy, Temperature } from '../units/quantity.ts'
import { gasConstant } from './gas-constant.ts'

/**
 * Share of the enzyme in its active state when it opens and closes reversibly between two states.
 *
 * Units    K, J/mol; returns 0..1, one half at `half`, falling with temperature.
 * Source   two-state equilibrium with van 't Hoff's law: 1/(1 + exp(ΔH/R·(1/Thalf − 1/T))).
 */
export const activeShare = (half: Temperature, energy: MolarEnergy, T: Temperature): number =>
  1 / (1 + Math.exp(((energy / gasConstant) * (T - half)) / (T * half)))
