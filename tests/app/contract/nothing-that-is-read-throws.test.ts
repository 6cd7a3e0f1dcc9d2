import fc from 'fast-check'
import { expect, test, vi } from 'vitest'
import { decodeScenario, readScenario } from '../../../app/contract/index.ts'
import { walkJson } from '../../../app/contract/json/walk.ts'
import { edited, type Json, phased, shortForm } from './scenarios.ts'

// A busy machine may need longer for thousands of files than for one.
vi.setConfig({ testTimeout: 60_000 })

const utf8 = new TextEncoder()
const sound = [JSON.stringify(shortForm()), JSON.stringify(phased(), null, 2)] as const

/** Cuts, doubles, or overwrites a piece of a text. */
const mutated = fc
  .record({
    text: fc.constantFrom(...sound),
    edits: fc.array(
      fc.record({
        at: fc.double({ min: 0, max: 1, noNaN: true }),
        length: fc.nat(12),
        put: fc.oneof(
          fc.string({ maxLength: 6, unit: 'binary' }),
          fc.constantFrom('"', '{', '}', '[', ']', ',', ':', '-', '1e999', 'null', '"__proto__":', '\\', '0'),
        ),
      }),
      { minLength: 1, maxLength: 4 },
    ),
  })
  .map(({ text, edits }) => {
    let at = text
    for (const edit of edits) {
      const place = Math.floor(edit.at * at.length)
      at = at.slice(0, place) + edit.put + at.slice(place + edit.length)
    }
    return at
  })

/** An outcome whose sentences are all our own. */
const isOutcome = (read: ReturnType<typeof readScenario>): boolean => {
  if (read.ok) return true
  const { faults } = read.failure
  const foreign = /Invalid|Expected|expected|received|Unrecognized|undefined|NaN [a-z]|\[object/
  return (
    faults.length > 0 &&
    faults.length <= 51 &&
    faults.every(({ message }) => message !== '' && !foreign.test(message.replace(/"[^"]*"/g, '')))
  )
}

test('random bytes', () => {
  fc.assert(
    fc.property(fc.uint8Array({ maxLength: 400 }), (bytes) => isOutcome(decodeScenario(bytes))),
    { numRuns: 2000 },
  )
})

test('sound bytes with some overwritten', () => {
  const property = fc.property(
    fc.constantFrom(...sound),
    fc.array(fc.tuple(fc.nat(), fc.nat(255)), { minLength: 1, maxLength: 6 }),
    (text, writes) => {
      const bytes = utf8.encode(text)
      for (const [at, byte] of writes) bytes[at % bytes.length] = byte
      return isOutcome(decodeScenario(bytes))
    },
  )
  fc.assert(property, { numRuns: 1500 })
})

test('sound text with pieces cut out and put in', () => {
  fc.assert(
    fc.property(mutated, (text) => isOutcome(readScenario(text))),
    { numRuns: 1500 },
  )
})

const paths = (value: Json, path = ''): string[] => {
  if (typeof value !== 'object' || value === null) return [path]
  const below = Array.isArray(value)
    ? value.flatMap((entry, n) => paths(entry, `${path}[${n}]`))
    : Object.entries(value).flatMap(([key, entry]) => paths(entry, path === '' ? key : `${path}.${key}`))
  return path === '' ? below : [path, ...below]
}

test('sound files with parts exchanged for anything', () => {
  const anything = fc.oneof(
    fc.jsonValue({ maxDepth: 3 }) as fc.Arbitrary<Json>,
    fc.constantFrom<Json>(
      '1 kg',
      '5 mmol/L',
      '1e308 mol/L',
      '1e-320 mmol/L',
      '-0 g/L',
      '20 degC',
      '1 h',
      0,
      -1,
      7,
    ),
  )
  for (const source of [shortForm(), phased()]) {
    const all = paths(source)
    const property = fc.property(fc.constantFrom(...all), fc.option(anything), (path, one) =>
      isOutcome(readScenario(JSON.stringify(edited(source, [path, one ?? undefined])))),
    )
    fc.assert(property, { numRuns: 1000 })
  }
})

test('the walk takes exactly what a JSON parser takes', () => {
  const parses = (text: string): boolean => {
    try {
      JSON.parse(text)
      return true
    } catch {
      return false
    }
  }
  const texts = fc.oneof(mutated, fc.json(), fc.string({ maxLength: 20 }))
  fc.assert(
    fc.property(texts, (text) => {
      const taken = walkJson(text).fault === undefined
      expect(taken).toBe(parses(text))
    }),
    { numRuns: 3000 },
  )
})

test('bytes that are no text in UTF-8 get their sentence', () => {
  const sentence = (bytes: Uint8Array): string => {
    const read = decodeScenario(bytes)
    return read.ok ? '' : read.failure.faults.map(({ path, message }) => `${path}: ${message}`).join('\n')
  }
  expect(sentence(new Uint8Array(5_000_001))).toBe('(file): is 5.0 MB long; a scenario is at most 5 MB')
  expect(sentence(new Uint8Array([0xff, 0xfe, 0x7b, 0]))).toBe('(file): is in UTF-16; save it in UTF-8')
  expect(sentence(new Uint8Array([0x7b, 0, 0x7d]))).toBe(
    '(file): holds bytes of value 0, so it is not a text in UTF-8',
  )
  expect(sentence(new Uint8Array([0x22, 0xc3, 0x28, 0x22]))).toBe(
    '(file): is not valid UTF-8; save it in UTF-8',
  )
  expect(sentence(utf8.encode('\ufeff{}'))).toBe(
    '(file): begins with a byte order mark; save it in UTF-8 without one',
  )
})

test('no key of a file reaches a prototype', () => {
  const text = JSON.stringify(shortForm()).replace('"title"', '"__proto__":{"polluted":true},"title"')
  expect(readScenario(text).ok).toBe(false)
  expect(({} as { polluted?: boolean }).polluted).toBeUndefined()
})
