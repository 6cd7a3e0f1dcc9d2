/** Rules across the parts of a file. */
import type * as z from 'zod'
import { phasesFollow, slowWithoutReverse } from './order-of-phases.ts'
import { densityWhereNeeded, doseWhereNeeded, molarMassWhereNeeded, phWhereNeeded } from './what-is-needed.ts'

const rules = [
  molarMassWhereNeeded,
  slowWithoutReverse,
  densityWhereNeeded,
  phWhereNeeded,
  doseWhereNeeded,
  phasesFollow,
]

/** Applies every rule to a file, whole or partly read. */
export const scenarioRules = (file: unknown, ctx: z.core.$RefinementCtx): void => {
  for (const rule of rules) rule(file, ctx)
}
