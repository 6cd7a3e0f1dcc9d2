/** One integration, and a second one where the first choice of method did not carry. */
import type { Work } from '../answer.ts'
import type { Integrator } from '../integrate/integrator.ts'
import type { Control, Problem } from '../integrate/problem.ts'

/** Attempts after which the automatic choice of method is no longer trusted; ordinary batches take hundreds. */
const patience = 20_000

/** The implicit method is of low order and pays dearly for more digits than these, the second at its last try. */
const implicitTolerances = [1e-10, 1e-9] as const

/** Runs a problem; one that turns stiff after the automatic choice was made is taken up again, implicitly. */
export function patientRun(
  integrator: Integrator,
  problem: Problem,
  control: Control,
): ReturnType<Integrator['run']> {
  if (control.method !== 'automatic') return integrator.run(problem, control)
  const patient = Math.min(patience, control.maxSteps)
  const arrival = integrator.run(problem, { ...control, maxSteps: patient })
  if (arrival.ok) return arrival
  const { firstStep: _, ...rest } = control
  const again = (absolute: number): ReturnType<Integrator['run']> =>
    integrator.run(problem, {
      ...rest,
      method: 'implicit',
      absolute: Math.max(control.absolute, absolute),
      maxSteps: control.maxSteps - patient + 1,
    })
  const implicit = again(implicitTolerances[0])
  return implicit.ok || implicit.failure.kind !== 'too-many-steps' ? implicit : again(implicitTolerances[1])
}

/** The work of two integrations together. */
export const sumOfWork = (a: Work, b: Work): Work => ({
  stepsAccepted: a.stepsAccepted + b.stepsAccepted,
  stepsRejected: a.stepsRejected + b.stepsRejected,
  rateEvaluations: a.rateEvaluations + b.rateEvaluations,
  jacobians: a.jacobians + b.jacobians,
})
