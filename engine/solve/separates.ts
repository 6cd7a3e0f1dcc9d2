import type { Batch } from './route.ts'

/** Whether a batch separates; otherwise only the differential equations describe it. */
export function separates({ model, timeline }: Batch): boolean {
  const runs = [...timeline.steps, timeline.after].filter((step) => step.kind === 'run')
  const moves = runs.some((run) => run.course.kind !== 'steady')
  const pHs = new Set(runs.map((run) => run.pH))
  return (
    !timeline.countDoseVolume &&
    !runs.some((run) => run.feed) &&
    model.inactivation?.Kp === undefined &&
    !(model.lawMovesWithPh && pHs.size > 1) &&
    !(model.inactivation?.k2 && moves)
  )
}
