/**
 * Reads a scenario file: bytes or text in, the engine's scenario or every fault of the file out.
 *
 * Shapes   `source` is the file's JSON value as given, for echoing the ask.
 * Fails    bad-input with faults in the order of the file; never throws, whatever the bytes.
 * Limits   5 MB, 64 levels of nesting, 1000 phases, a million times of a trace.
 */
import { failed, type Outcome, type Scenario, success } from '../../engine/index.ts'
import { scenarioFile } from './definition/scenario-file.ts'
import { type BadInput, type Fault, wholeFile } from './fault.ts'
import { lineAndColumn } from './json/places.ts'
import { walkJson } from './json/walk.ts'
import { listFaults, type PlacedFault } from './list-faults.ts'
import { part } from './rules/view.ts'
import { toScenario } from './to-scenario.ts'
import { mostKeys } from './words/key-words.ts'

export interface ReadScenario {
  readonly scenario: Scenario
  readonly source: unknown
}

/** The most bytes of a file. */
export const largestFile = 5_000_000
/** The most phases of a programme. */
export const mostPhases = 1000

/** Reads the bytes of a file. */
export const decodeScenario = (bytes: Uint8Array): Outcome<ReadScenario, BadInput> => {
  if (bytes.length > largestFile) return bad([whole(tooLarge(bytes.length))])
  if ((bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff)) {
    return bad([whole('is in UTF-16; save it in UTF-8')])
  }
  if (bytes.includes(0)) return bad([whole('holds bytes of value 0, so it is not a text in UTF-8')])
  let text: string
  try {
    text = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes)
  } catch {
    return bad([whole('is not valid UTF-8; save it in UTF-8')])
  }
  return readScenario(text)
}

/** Reads the text of a file. */
export const readScenario = (text: string): Outcome<ReadScenario, BadInput> => {
  if (text.length > largestFile) return bad([whole(tooLarge(text.length))])
  if (text.charCodeAt(0) === 0xfeff) {
    return bad([whole('begins with a byte order mark; save it in UTF-8 without one')])
  }
  if (text.trim() === '') return bad([whole('is empty; a scenario is a JSON object')])
  const walked = walkJson(text)
  const repeated = walked.repeated.map(
    (path): PlacedFault => ({ path, message: 'the key is given more than once; keep one of them' }),
  )
  if (walked.fault !== undefined) {
    const { at, message } = walked.fault
    return bad([...listFaults(text, repeated), whole(`${lineAndColumn(text, at)}: ${message}`)])
  }
  const source: unknown = JSON.parse(text)
  const crowd = crowded(source)
  if (crowd !== undefined) return bad(listFaults(text, [...repeated, crowd]))
  const read = scenarioFile.safeParse(source)
  if (read.success && repeated.length === 0) return success({ scenario: toScenario(read.data), source })
  const issues: readonly Issue[] = read.error?.issues ?? []
  const unlisted = issues.reduce((sum, issue) => sum + Math.max(0, (issue.keys?.length ?? 0) - mostKeys), 0)
  return bad(listFaults(text, [...repeated, ...issues.flatMap(placed)], unlisted))
}

/** A list too long to be a batch's; said before each of its entries is looked at. */
const crowded = (source: unknown): PlacedFault | undefined =>
  [
    ['programme', 'phases'],
    ['enzyme', 'inactivation', 'series'],
  ]
    .map((path) => ({ path, list: part(source, ...path) }))
    .flatMap(({ path, list }) =>
      Array.isArray(list) && list.length > mostPhases
        ? [{ path, message: `found a list of ${list.length}; at most ${mostPhases} entries are read` }]
        : [],
    )[0]

interface Issue {
  readonly code: string
  readonly path: readonly PropertyKey[]
  readonly message: string
  /** Of unknown keys, which come as one issue on what holds them; messages are one a line. */
  readonly keys?: readonly string[]
}

/** Each unknown key is named by its own path. */
const placed = (issue: Issue): readonly PlacedFault[] => {
  const path = issue.path.map((step) => (typeof step === 'symbol' ? String(step) : step))
  if (issue.keys === undefined) return [{ path, message: issue.message }]
  const messages = issue.message.split('\n')
  return issue.keys
    .slice(0, mostKeys)
    .map((key, n) => ({ path: [...path, key], message: messages[n] ?? 'the key is not known here' }))
}

const whole = (message: string): Fault => ({ path: wholeFile, message })

const bad = (faults: readonly Fault[]): { readonly ok: false; readonly failure: BadInput } =>
  failed({ kind: 'bad-input', faults })

const tooLarge = (size: number): string =>
  `is ${(size / 1e6).toFixed(1)} MB long; a scenario is at most ${largestFile / 1e6} MB`

/** Part of every runtime this meets; the room's types know neither Node nor the page. */
declare const TextDecoder: new (
  label: string,
  options: { readonly fatal: boolean; readonly ignoreBOM: boolean },
) => { decode(bytes: Uint8Array): string }
