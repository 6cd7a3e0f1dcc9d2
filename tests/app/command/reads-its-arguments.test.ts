import { describe, expect, test } from 'vitest'
import { readArguments } from '../../../app/command/arguments.ts'

const call = (...args: string[]): unknown => {
  const read = readArguments(args)
  return read.ok ? read.value : read.failure.sentence
}

test('each way to call a verb is understood', () => {
  expect(call('plan', 'a.json')).toEqual({ verb: 'plan', file: 'a.json', json: false })
  expect(call('plan', 'a.json', '--json')).toEqual({ verb: 'plan', file: 'a.json', json: true })
  expect(call('plan', '--json', '-')).toEqual({ verb: 'plan', file: '-', json: true })
  expect(call('--json', 'plan', 'a.json')).toEqual({ verb: 'plan', file: 'a.json', json: true })
  expect(call('plan', '--', '--odd-name.json')).toEqual({
    verb: 'plan',
    file: '--odd-name.json',
    json: false,
  })
  expect(call('plan', '--stream')).toEqual({ verb: 'plan-stream' })
  expect(call('plan', '--stream', '--json')).toEqual({ verb: 'plan-stream' })
  expect(call('schema')).toEqual({ verb: 'schema' })
  expect(call('version')).toEqual({ verb: 'version' })
  expect(call('--version')).toEqual({ verb: 'version' })
  expect(call('help')).toEqual({ verb: 'help', about: undefined })
  expect(call('-h')).toEqual({ verb: 'help', about: undefined })
  expect(call('help', 'plan')).toMatchObject({ verb: 'help', about: { name: 'plan' } })
  expect(call('plan', '--help')).toMatchObject({ verb: 'help', about: { name: 'plan' } })
})

const misuses: readonly { readonly args: readonly string[]; readonly says: string }[] = [
  { args: [], says: 'a verb is missing; what fits: plan, schema, help, version' },
  {
    args: ['paln', 'a.json'],
    says: 'paln: there is no such verb; what fits: plan, schema, help, version',
  },
  { args: ['quux'], says: 'quux: there is no such verb; what fits: plan, schema, help, version' },
  {
    args: ['plan', 'a.json', '--jsno'],
    says: '--jsno: there is no such flag of plan; what fits: --json, --stream, --help, --version',
  },
  {
    args: ['plan', 'a.json', '-j'],
    says: '-j: there is no such flag of plan; what fits: --json, --stream, --help, --version',
  },
  {
    args: ['schema', '--stream'],
    says: '--stream: there is no such flag of schema; what fits: --help, --version',
  },
  { args: ['plan', '--json=yes', 'a.json'], says: '--json: takes no value, found yes' },
  { args: ['plan'], says: 'plan: FILE is missing; a scenario file fits, - or --stream' },
  { args: ['plan', 'a.json', 'b.json'], says: 'b.json: plan takes one FILE' },
  {
    args: ['plan', '--stream', 'a.json'],
    says: 'a.json: plan --stream reads standard input and takes no FILE',
  },
  {
    args: ['help', 'pla'],
    says: 'pla: there is no such verb; what fits: plan, schema, help, version',
  },
  { args: ['help', 'plan', 'now'], says: 'now: help takes one verb' },
  { args: ['version', 'two'], says: 'two: version takes no more words' },
]

describe('what is wrong is named, with what fits; the nearest known word is added by the program', () => {
  test.each(misuses)('$args', ({ args, says }) => {
    expect(call(...args)).toBe(says)
  })
})
