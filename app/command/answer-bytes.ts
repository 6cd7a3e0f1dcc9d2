/** From the bytes of one scenario to its answer, or to what is wrong with it. */
import { type Answer, plan } from '../../engine/index.ts'
import { decodeScenario, type Fault, failureSentence, type ReadScenario } from '../contract/index.ts'

/** What became of one scenario. */
export type Answered =
  | { readonly kind: 'answer'; readonly read: ReadScenario; readonly answer: Answer }
  | { readonly kind: 'wrong'; readonly faults: readonly Fault[] }
  | { readonly kind: 'failed'; readonly sentence: string }

/** Answers one scenario. */
export const answerBytes = (bytes: Uint8Array): Answered => {
  const read = decodeScenario(bytes)
  if (!read.ok) return { kind: 'wrong', faults: read.failure.faults }
  const answer = plan(read.value.scenario)
  if (!answer.ok) return { kind: 'failed', sentence: failureSentence(answer.failure) }
  return { kind: 'answer', read: read.value, answer: answer.value }
}
