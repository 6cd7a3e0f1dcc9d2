import type { MolarMass } from '../units/quantity.ts'

/** Molar mass of water, kg/mol (CIAAW standard atomic weights 2021, conventional values: 2·1.008 + 15.999). */
export const waterMolarMass = 0.018015

/**
 * Mass of all products per mass of substrate when each molecule of substrate takes up water.
 *
 * Shapes   `bonds` split per molecule: 1 for a disaccharide or for one anhydroglucose unit of starch.
 * Source   mass balance of hydrolysis; 1.0526 for a disaccharide of hexoses, 1.1111 for starch to glucose.
 */
export const hydrolysisMassGain = (molarMass: MolarMass, bonds = 1): number =>
  1 + (bonds * waterMolarMass) / molarMass

/** Mass of one product per mass of substrate, from molar masses and moles per mole. */
export const massYieldOf = (product: MolarMass, substrate: MolarMass, molesPerSubstrate: number): number =>
  (molesPerSubstrate * product) / substrate
