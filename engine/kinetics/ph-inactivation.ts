import type { PkPair } from '../scenario.ts'
import { ionisationRatio } from './ionisation-ratio.ts'

/**
 * Factor on kd when acid and alkali speed up inactivation, relative to the pH where kd was measured.
 *
 * Source   two ionisations that expose the enzyme, as in the Michaelis pH functions (Segel 1975):
 *          h(pH)/h(at), h = 1 + 10^(pKa1−pH) + 10^(pH−pKa2).
 */
export const phInactivationFactor = (effect: PkPair & { readonly at: number }, pH: number): number =>
  ionisationRatio(effect, pH, effect.at)
