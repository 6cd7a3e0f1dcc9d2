/** A whole batch of constant conditions whose enzyme the substrate protects, by quadrature instead of stepping. */
import { type ProtectedDecay, protectedLoss, protectedTime } from './protected-time.ts'
import type { ReactionPath } from './reaction-path.ts'
import type { Batch } from './route.ts'
import { pathOf } from './separation.ts'

interface Protected {
  readonly path: ReactionPath
  readonly decay: ProtectedDecay
  /** kg/m³ */
  readonly E0: number
}

/** The batch in terms of its integrals; undefined where it is not of this kind. */
function protectedBatch(batch: Batch): Protected | undefined {
  const { model, timeline, feed } = batch
  const { inactivation } = model
  if (inactivation?.Kp === undefined || inactivation.k2 || !timeline.endless || timeline.countDoseVolume)
    return undefined
  const { course, pH } = timeline.after
  const dose = timeline.steps.reduce((sum, step) => sum + (step.kind === 'dose' ? step.mass : 0), 0)
  return {
    path: pathOf(batch),
    decay: { k: model.k(pH)(course.from), kd: inactivation.k1(pH)(course.from), Kp: inactivation.Kp },
    E0: dose / feed.volume,
  }
}

/** Time to a conversion by quadrature, s; undefined for other batches and where it is never reached. */
export function timeByQuadrature(batch: Batch, conversion: number): number | undefined {
  const whole = protectedBatch(batch)
  const u = whole?.path.coordinate(conversion)
  if (!whole || u === undefined || u === null) return undefined
  const time = protectedTime(whole.path, whole.decay, whole.E0, u)
  return Number.isFinite(time) ? time : undefined
}

/** Factor on the dose below which the conversion is never reached; undefined for other batches. */
export function leastScaleByQuadrature(batch: Batch, conversion: number): number | undefined {
  const whole = protectedBatch(batch)
  const u = whole?.path.coordinate(conversion)
  if (!whole || u === undefined || u === null) return undefined
  const scale = protectedLoss(whole.path, whole.decay, u) / whole.E0
  return Number.isFinite(scale) ? scale : undefined
}
