import {
  type Activity,
  type Density,
  type MolarMass,
  quantity,
  type SpecificRate,
  type VolumetricActivity,
} from '../units/quantity.ts'

/**
 * Specific rate at saturation behind a declared activity, under the assay's own temperature and pH.
 *
 * Units    activity mol/(s·kg), molar mass of the substrate kg/mol, Km and S in one unit; returns kg/(kg·s).
 *          S absent: the assay saturates the enzyme.
 * Source   Michaelis–Menten at the assay's substrate: activity·M·(Km + S)/S.
 */
export const specificRateFromActivity = (
  activity: Activity,
  molarMass: MolarMass,
  Km: number,
  S?: number,
): SpecificRate => quantity<SpecificRate>(activity * molarMass * (S === undefined ? 1 : 1 + Km / S))

/** Activity per mass of preparation from one per volume. */
export const activityPerMass = (activity: VolumetricActivity, density: Density): Activity =>
  quantity<Activity>(activity / density)
