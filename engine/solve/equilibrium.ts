/** The conversion at which a reversible reaction comes to rest, whatever the dose, the temperature and the time. */
import type { Batch } from './route.ts'
import { pathOf } from './separation.ts'

/**
 * The equilibrium conversion where a target lies at or beyond it; undefined where the target lies before, or where
 * feeding or the volume of doses moves it.
 */
export function equilibriumBefore(batch: Batch, conversion: number): number | undefined {
  const { steps, countDoseVolume } = batch.timeline
  if (countDoseVolume || steps.some((step) => step.kind === 'run' && step.feed)) return undefined
  const path = pathOf(batch)
  return path.coordinate(conversion) === null ? path.restingConversion : undefined
}
