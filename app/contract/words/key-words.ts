/** Sentences for keys that are unknown or belong to a later version. */
import { nearest } from '../../../engine/index.ts'
import { visible } from '../fault.ts'

/** The most unknown keys of one object that are named one by one. */
export const mostKeys = 100

/** Why keys may not stand in an object with these known ones, one line for each key. */
export const unknownKeySentences = (keys: readonly string[], known: readonly string[]): string =>
  keys
    .slice(0, mostKeys)
    .map((key) => unknownKeySentence(key, known))
    .join('\n')

/** Why a key may not stand in an object with these known ones. */
const unknownKeySentence = (key: string, known: readonly string[]): string => {
  const later = known.includes('find') && Object.hasOwn(laterKeys, key) ? laterKeys[key] : undefined
  if (later !== undefined) return later
  const near = nearest(key, known)
  const offer = near === undefined ? `known here: ${known.join(', ')}` : `the nearest known one is "${near}"`
  return `the key "${visible(key)}" is not known here; ${offer}`
}

const laterKeys: Readonly<Record<string, string>> = {
  confidence:
    'this version does not answer with a confidence; without "confidence" it answers the dose for the stated constants',
  temperatures:
    'this version does not answer over a range of temperatures and doses; it answers "find": "temperature" with "between"',
}
