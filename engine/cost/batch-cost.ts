/** What one batch costs. */
import type { Costs } from '../scenario.ts'
import type { Mass, Time } from '../units/quantity.ts'

/**
 * Money per batch: enzyme, and the vessel from the first dose to the target plus the turnaround.
 *
 * Shapes   an absent part costs nothing; the currency is that of `costs`.
 * Units    kg, s; prices per kg and per s.
 */
export const batchCost = (costs: Costs, dose: Mass, time: Time): number =>
  (costs.enzyme ?? 0) * dose + (costs.vessel ?? 0) * (time + (costs.turnaround ?? 0))
