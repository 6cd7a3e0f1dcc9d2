import { spawn } from 'node:child_process'
import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { builtProgram } from './built.ts'
import { dosewright, root, sample } from './running.ts'

interface Answer {
  readonly format: string
  readonly version: number
  readonly ask: unknown
  readonly reachable: boolean
  readonly dose?: { readonly value: number; readonly unit: string }
  readonly leastDose?: { readonly value: number; readonly unit: string }
  readonly limitingConversion?: number
  readonly check: { readonly method: string; readonly relativeDifference: number }
  readonly warnings: readonly { readonly code: string; readonly message: string }[]
}

const answerOf = async (name: string): Promise<Answer> => {
  const { code, stdout, stderr } = await dosewright(['plan', sample(name), '--json'])
  expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
  return JSON.parse(stdout) as Answer
}

const names = readdirSync(join(root, 'samples'))
  .filter((name) => name.endsWith('.json'))
  .map((name) => name.replace('.json', ''))

test('there are samples, and each says that its plant is invented', () => {
  expect(names.length).toBeGreaterThanOrEqual(4)
  const notes = readFileSync(join(root, 'samples/README.md'), 'utf8')
  for (const name of names) {
    const { title } = JSON.parse(readFileSync(sample(name), 'utf8')) as { title: string }
    expect(title).toMatch(/^Invented plant: /)
    expect(notes).toContain(`${name}.json`)
  }
})

describe('each sample is answered', () => {
  test.each(names)('%s in words', async (name) => {
    const { code, stdout, stderr } = await dosewright(['plan', sample(name)])
    expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
    expect(stdout).toMatch(/\S\n$/)
    expect(stdout).not.toMatch(/NaN|undefined|Infinity|\[object/)
  })

  test.each(names)('%s as JSON, with a check by another route', async (name) => {
    const answer = await answerOf(name)
    expect(answer).toMatchObject({ format: 'dosewright-answer', version: 1 })
    expect(answer.ask).toEqual((JSON.parse(readFileSync(sample(name), 'utf8')) as { ask: unknown }).ask)
    expect(answer.check.relativeDifference).toBeLessThan(1e-6)
    expect(Array.isArray(answer.warnings)).toBe(true)
  })
})

/**
 * The lactose samples by hand: enzyme-time I = Km(1 + yS0/Kic)·ln(1/(1−X)) + (1 − yKm/Kic)·S0·X, the supply
 * k·E0·(1 − exp(−kd·t))/kd; pH is the reference's, so it drops out.
 */
const byHand = (celsius: number, hours: number): { dose: number; leastDose: number } => {
  const [S0, y, Km, Kic, X, volume, R] = [47, 0.5263, 12, 6, 0.9, 12, 8.31446261815324]
  const T = celsius + 273.15
  const k = 60 * Math.exp((-42_000 / R) * (1 / T - 1 / 311.15))
  const kd = 0.09 * Math.exp((-240_000 / R) * (1 / T - 1 / 313.15))
  const need = Km * (1 + (y * S0) / Kic) * Math.log(1 / (1 - X)) + (1 - (y * Km) / Kic) * S0 * X
  return { dose: (volume * need * kd) / (k * -Math.expm1(-kd * hours)), leastDose: (volume * need * kd) / k }
}

const relative = (value: number | undefined, expected: number): number =>
  Math.abs((value ?? Number.NaN) - expected) / expected

test.each([
  { name: 'lactose-cold-and-long', celsius: 6, hours: 20 },
  { name: 'lactose-warm-and-short', celsius: 38, hours: 3 },
])('$name asks for the dose of the closed form', async ({ name, celsius, hours }) => {
  const { dose, reachable } = await answerOf(name)
  expect(reachable).toBe(true)
  expect(dose?.unit).toBe('kg')
  expect(relative(dose?.value, byHand(celsius, hours).dose)).toBeLessThan(1e-9)
})

test('the hot plan is answered with what it can reach and what it would take', async () => {
  const answer = await answerOf('lactose-too-hot')
  expect(answer.reachable).toBe(false)
  expect(answer.limitingConversion).toBeGreaterThan(0)
  expect(answer.limitingConversion).toBeLessThan(0.9)
  expect(relative(answer.leastDose?.value, byHand(52, 3).leastDose)).toBeLessThan(1e-9)
})

test('a scenario on standard input is answered like a file', async () => {
  const path = sample('starch-to-glucose')
  const piped = await dosewright(['plan', '-', '--json'], { input: readFileSync(path) })
  expect(piped).toEqual(await dosewright(['plan', path, '--json']))
})

test('schema prints a JSON Schema', async () => {
  const { code, stdout, stderr } = await dosewright(['schema'])
  expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
  expect(JSON.parse(stdout)).toMatchObject({
    $schema: expect.stringContaining('json-schema.org'),
    type: 'object',
  })
})

test('help and version say what they should on standard output', async () => {
  const { version } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as { version: string }
  for (const args of [['version'], ['--version']]) {
    expect(await dosewright(args)).toEqual({ code: 0, stdout: `dosewright ${version}\n`, stderr: '' })
  }
  for (const args of [['help'], ['--help'], ['-h']]) {
    const { code, stdout, stderr } = await dosewright(args)
    expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
    for (const verb of ['plan', 'schema', 'help', 'version']) expect(stdout).toContain(`dosewright ${verb}`)
  }
  expect((await dosewright(['help', 'plan'])).stdout).toContain('--stream')
  expect(await dosewright(['plan', '--help'])).toEqual(await dosewright(['help', 'plan']))
})

test('a reader that goes away ends the program quietly', async () => {
  const line = `${JSON.stringify(JSON.parse(readFileSync(sample('lactose-cold-and-long'), 'utf8')))}\n`
  const child = spawn(process.execPath, [builtProgram, 'plan', '--stream'], { stdio: 'pipe' })
  let stderr = ''
  child.stderr.on('data', (chunk: Buffer) => {
    stderr += chunk.toString()
  })
  child.stdin.on('error', () => {})
  child.stdout.once('data', () => child.stdout.destroy())
  const pour = (): void => {
    while (child.stdin.writable && child.stdin.write(line.repeat(50))) {}
    if (child.stdin.writable) child.stdin.once('drain', pour)
  }
  pour()
  const code = await new Promise((resolve) => child.on('close', resolve))
  expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
})
