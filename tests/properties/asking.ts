/** Asks the program's own reader and engine, as the command line does, for scenarios made in a test. */
import { type JsonObject, readScenario, writeAnswer } from '../../app/contract/index.ts'
import { type Answer, type Outcome, type PlanFailure, plan, type Scenario } from '../../engine/index.ts'

/** A value of a scenario file. */
export type Json = string | number | boolean | null | readonly Json[] | { readonly [key: string]: Json }

/** A scenario file before it is text. */
export type File = { readonly [key: string]: Json }

/** Reads a file that is meant to be sound; a fault is a mistake of the test. */
export function scenarioOf(file: File): Scenario {
  const read = readScenario(JSON.stringify(file))
  if (!read.ok) throw new Error(`${JSON.stringify(read.failure.faults)}\n${JSON.stringify(file)}`)
  return read.value.scenario
}

/** What the engine makes of a file. */
export const outcomeOf = (file: File): Outcome<Answer, PlanFailure> => plan(scenarioOf(file))

/** The answer to a file; anything else is a failed test that shows the file. */
export function answerTo(file: File): Answer {
  const outcome = outcomeOf(file)
  if (!outcome.ok) throw new Error(`${JSON.stringify(outcome.failure)}\n${JSON.stringify(file)}`)
  return outcome.value
}

/** The answer as `plan --json` prints it. */
export function printed(file: File): JsonObject {
  const read = readScenario(JSON.stringify(file))
  if (!read.ok) throw new Error(`${JSON.stringify(read.failure.faults)}\n${JSON.stringify(file)}`)
  const outcome = plan(read.value.scenario)
  if (!outcome.ok) throw new Error(`${JSON.stringify(outcome.failure)}\n${JSON.stringify(file)}`)
  return writeAnswer(outcome.value, read.value)
}

/** A file with another question. */
export const asking = (file: File, ask: Json): File => ({ ...file, ask })

/** The paths of all numbers in a value that are not finite. */
export function notFinite(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [path]
  if (value instanceof Float64Array) return Array.from(value).flatMap((x, i) => notFinite(x, `${path}[${i}]`))
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, part]) => notFinite(part, `${path}.${key}`))
}

/** |a − b| against the larger of the two; 0 where both are 0. */
export function apart(a: number, b: number): number {
  const scale = Math.max(Math.abs(a), Math.abs(b))
  return scale === 0 ? 0 : Math.abs(a - b) / scale
}

/** Fifty grams of substrate a litre in a cubic metre, one of product from one of substrate. */
export const plainFeed: Json = {
  volume: '1 m3',
  substrate: { concentration: '50 g/L' },
  product: { massYield: 1, concentration: '0 g/L' },
}
