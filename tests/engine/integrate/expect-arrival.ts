import { expect } from 'vitest'
import type { Arrival, IntegrationFailure } from '../../../engine/integrate/problem.ts'
import type { Outcome } from '../../../engine/outcome.ts'

export const expectArrival = (outcome: Outcome<Arrival, IntegrationFailure>): Arrival => {
  if (!outcome.ok) expect.unreachable(`failed: ${JSON.stringify(outcome.failure)}`)
  return outcome.value
}

export const expectFailure = (outcome: Outcome<Arrival, IntegrationFailure>): IntegrationFailure => {
  if (outcome.ok) expect.unreachable(`arrived at ${outcome.value.time}`)
  return outcome.failure
}
