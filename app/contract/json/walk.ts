/**
 * Walks a JSON text once, without recursion, before anything builds values from it: whether it is strict JSON,
 * how deep it nests, and which keys stand twice.
 *
 * Shapes   text; nothing where it is sound, else the one place where reading stopped, and every key given twice.
 * Reason   a parser that recurses falls over on a hundred thousand brackets, and one that builds objects keeps
 *          the last of two equal keys without a word.
 */
import type { PathStep } from '../fault.ts'
import { endOfNumber, endOfString, endOfWord, type SyntaxFault, skipSpace, strange } from './tokens.ts'

/** The most levels of objects and lists in one another. */
export const deepestNesting = 64

export interface Walked {
  readonly fault?: SyntaxFault
  readonly repeated: readonly (readonly PathStep[])[]
}

/** Hears each value, its path and where it begins (for a key's value, where the key begins). */
export type Visitor = (path: readonly PathStep[], at: number) => void

/** Walks a text, and tells a visitor of each value if there is one. */
export const walkJson = (text: string, visit?: Visitor): Walked => {
  const repeated: (readonly PathStep[])[] = []
  const stop = (at: number, message: string): Walked => ({ fault: { at, message }, repeated })
  const path: PathStep[] = []
  const seen: (Set<string> | undefined)[] = []
  let at = skipSpace(text, 0)
  let key = -1

  for (;;) {
    // A value begins here.
    visit?.(path, key === -1 ? at : key)
    key = -1
    const c = text.charCodeAt(at)
    let open = false
    if (c === 0x7b || c === 0x5b) {
      if (seen.length === deepestNesting) return stop(at, `nests deeper than ${deepestNesting} levels`)
      const close = c === 0x7b ? 0x7d : 0x5d
      seen.push(c === 0x7b ? new Set() : undefined)
      at = skipSpace(text, at + 1)
      open = text.charCodeAt(at) !== close
      if (open) path.push(c === 0x7b ? '' : 0)
      else {
        seen.pop()
        at++
      }
    } else {
      const end =
        c === 0x22 ? endOfString(text, at) : isNumeric(c) ? endOfNumber(text, at) : endOfWord(text, at)
      if (typeof end !== 'number') return { fault: end, repeated }
      at = end
    }

    // After a value: close what ends here, then find where the next value begins.
    while (!open) {
      at = skipSpace(text, at)
      if (seen.length === 0) {
        return at === text.length ? { repeated } : stop(at, 'something follows the end of the JSON value')
      }
      const mark = text.charCodeAt(at)
      const object = seen.at(-1) !== undefined
      if (mark === 0x2c) {
        at = skipSpace(text, at + 1)
        const after = text.charCodeAt(at)
        if (after === 0x7d || after === 0x5d)
          return stop(at, 'a comma stands before the closing bracket; remove the comma')
        const last = path.at(-1)
        if (typeof last === 'number') path[path.length - 1] = last + 1
        open = true
      } else if (mark === (object ? 0x7d : 0x5d)) {
        seen.pop()
        path.pop()
        at++
      } else return stop(at, afterValue(text, at, object))
    }

    const keys = seen.at(-1)
    if (keys === undefined) continue
    if (text.charCodeAt(at) !== 0x22) return stop(at, keyFault(text, at))
    const end = endOfString(text, at)
    if (typeof end !== 'number') return { fault: end, repeated }
    const written = text.slice(at + 1, end - 1)
    const name = written.includes('\\') ? (JSON.parse(`"${written}"`) as string) : written
    path[path.length - 1] = name
    if (keys.has(name)) {
      if (repeated.length < 1000) repeated.push([...path])
    } else keys.add(name)
    key = at
    at = skipSpace(text, end)
    if (text.charCodeAt(at) !== 0x3a)
      return stop(at, at >= text.length ? strange(text, at) : 'a colon is due after the key')
    at = skipSpace(text, at + 1)
  }
}

const isNumeric = (c: number): boolean => (c >= 0x30 && c <= 0x39) || c === 0x2d || c === 0x2b || c === 0x2e

const afterValue = (text: string, at: number, object: boolean): string => {
  if (at >= text.length) return `the file ends before it is complete; a ${object ? '}' : ']'} is due`
  const c = text.charAt(at)
  if (c === '/' || c === "'") return strange(text, at)
  if (c === '}' || c === ']') return `found ${c} where ${object ? '}' : ']'} is due`
  return `a comma or ${object ? '}' : ']'} is due here`
}

const keyFault = (text: string, at: number): string => {
  const c = text.charAt(at)
  if (c === '' || c === '/') return strange(text, at)
  return 'a key in double quotation marks is due here'
}
