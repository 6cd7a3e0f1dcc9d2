import type { Scenario } from '../scenario.ts'
import { enzymeModel } from './enzyme-model.ts'
import type { Batch } from './route.ts'
import { timeline } from './timeline.ts'

/** The batch that a scenario describes. */
export function batchOf({ feed, enzyme, programme }: Scenario): Batch {
  return {
    feed,
    model: enzymeModel(enzyme, feed),
    timeline: timeline(programme),
    ...(enzyme.density !== undefined && { preparationDensity: enzyme.density }),
  }
}
