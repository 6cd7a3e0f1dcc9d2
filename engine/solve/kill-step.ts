/** What the kill steps of a programme do to the enzyme. */
import type { KillStep } from '../answer.ts'
import type { Scenario } from '../scenario.ts'
import { CourseSupply, courseWorkspace } from './course-supply.ts'
import type { BatchRun } from './route.ts'
import type { Solver } from './solver.ts'
import type { Run } from './timeline.ts'

/**
 * Residual activity and log reduction over the kill steps, from a run through the whole programme.
 *
 * Shapes   undefined without a kill step or without enzyme before it.
 * Source   first-order loss integrated over the steps' temperatures, so that it counts on where the activity itself
 *          has left the range of doubles; of protected enzymes and series from the activities before and after.
 */
export function killStepOf(scenario: Scenario, { batch }: Solver, run: BatchRun): KillStep | undefined {
  if (scenario.programme.kind !== 'phases') return undefined
  const { phases } = scenario.programme
  const kills = run.marks.filter(({ phase }) => phases[phase]?.phase === 'inactivate')
  const first = kills[0]
  const last = kills[kills.length - 1]
  if (!first || !last || !(first.enzymeFrom > 0)) return undefined
  const { inactivation } = batch.model
  const integrated = inactivation !== undefined && !inactivation.k2 && inactivation.Kp === undefined
  const lost = integrated
    ? batch.timeline.steps.reduce(
        (sum, step) =>
          sum + (step.kind === 'run' && step.purpose === 'inactivate' ? lossIn(batch.model, step) : 0),
        0,
      )
    : -Math.log(Math.max(last.enzymeTo / first.enzymeFrom, Number.MIN_VALUE))
  const residualActivity = (first.enzymeFrom / run.dosed) * Math.exp(-lost)
  const logReduction = lost * Math.LOG10E
  return Number.isFinite(residualActivity + logReduction) ? { residualActivity, logReduction } : undefined
}

/** Cells that a kill step is cut into at most. */
const mostCells = 1000

/** ∫kd dt over a run. */
function lossIn(model: Solver['batch']['model'], run: Run): number {
  const k1 = model.inactivation?.k1(run.pH)
  if (!k1) return 0
  if (run.course.kind === 'steady') return k1(run.course.from) * run.duration
  const constants = { k: model.k(run.pH), k1 }
  return new CourseSupply(
    constants,
    model.steepness,
    run.course,
    run.duration,
    courseWorkspace(),
    mostCells,
  ).lost()
}
