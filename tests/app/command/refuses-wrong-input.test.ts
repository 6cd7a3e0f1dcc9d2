import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, test } from 'vitest'
import { soundScenario } from './bad-inputs.ts'
import { badKeys } from './bad-keys.ts'
import { badTexts } from './bad-texts.ts'
import { badValues } from './bad-values.ts'
import { dosewright } from './running.ts'

const badInputs = [...badTexts, ...badValues, ...badKeys]

const folder = mkdtempSync(join(tmpdir(), 'dosewright-wrong-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

const file = (name: string, content: string | Uint8Array): string => {
  const path = join(folder, name)
  writeFileSync(path, content)
  return path
}

const refused = (...lines: string[]): unknown => ({
  code: 2,
  stdout: '',
  stderr: lines.map((line) => `${line}\n`).join(''),
})

test('the scenario that the wrong ones are made from is sound', async () => {
  expect(await dosewright(['plan', '-'], { input: soundScenario })).toMatchObject({ code: 0, stderr: '' })
})

test('the table holds at least forty inputs, each with its lines', () => {
  expect(badInputs.length).toBeGreaterThanOrEqual(40)
  expect(badInputs.filter(({ lines }) => lines.length === 0)).toEqual([])
})

describe('each wrong input is named on standard error, with exit code 2 and nothing on standard output', () => {
  test.concurrent.each(badInputs)('$what', async ({ what, input, lines }) => {
    const path = file(`${what.replaceAll(/\W+/g, '-')}.json`, input)
    expect(await dosewright(['plan', path, '--json'])).toEqual(refused(...lines))
  })
})

test('standard input is refused like a file', async () => {
  expect(await dosewright(['plan', '-'], { input: '' })).toEqual(
    refused('(file): is empty; a scenario is a JSON object'),
  )
})

test('50 MB are refused without being read to their end', async () => {
  const path = file('large.json', Buffer.alloc(50_000_000, ' '))
  const sentence = 'is longer than 5 MB, the most that a scenario may be'
  expect(await dosewright(['plan', path])).toEqual(refused(`${path}: ${sentence}`))
  const endless = async function* (): AsyncGenerator<Uint8Array> {
    for (;;) yield Buffer.alloc(1_000_000, ' ')
  }
  expect(await dosewright(['plan', '-'], { input: endless() })).toEqual(
    refused(`standard input: ${sentence}`),
  )
})

test('a file that is not there, a folder and a name that cannot be one are named', async () => {
  const missing = join(folder, 'none.json')
  expect(await dosewright(['plan', missing])).toEqual(refused(`${missing}: there is no such file`))
  expect(await dosewright(['plan', folder])).toEqual(refused(`${folder}: is a folder; a scenario file fits`))
  const below = join(file('a.json', '{}'), 'b.json')
  expect(await dosewright(['plan', below])).toEqual(refused(`${below}: there is no such file`))
  const long = 'a'.repeat(400)
  expect(await dosewright(['plan', long])).toEqual(refused(`${long}: the name is too long for a file`))
  expect(await dosewright(['plan', ''])).toEqual(refused(': there is no such file'))
})

describe('an unknown verb or flag is named, with the nearest known one and what fits', () => {
  const verbs = 'what fits: plan, schema, help, version'
  const flags = 'what fits: --json, --stream, --help, --version'
  const calls: readonly { readonly args: readonly string[]; readonly line: string }[] = [
    { args: ['paln', 'x.json'], line: `paln: there is no such verb; ${verbs}; the nearest is plan` },
    { args: ['quux'], line: `quux: there is no such verb; ${verbs}` },
    { args: ['x\ny'], line: `x\\u000ay: there is no such verb; ${verbs}` },
    {
      args: ['plan', 'x.json', '--jsn'],
      line: `--jsn: there is no such flag of plan; ${flags}; the nearest is --json`,
    },
    {
      args: ['plan', '--steam'],
      line: `--steam: there is no such flag of plan; ${flags}; the nearest is --stream`,
    },
    { args: [], line: `a verb is missing; ${verbs}` },
    { args: ['plan'], line: 'plan: FILE is missing; a scenario file fits, - or --stream' },
    { args: ['help', 'shema'], line: `shema: there is no such verb; ${verbs}; the nearest is schema` },
  ]
  test.each(calls)('$args', async ({ args, line }) => {
    expect(await dosewright(args)).toEqual(refused(line))
  })
})
