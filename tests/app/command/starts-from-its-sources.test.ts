import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { soundScenario } from './bad-inputs.ts'
import { pathWithNode, type Ran, root, run, sample } from './running.ts'

const folders: string[] = []
const folder = (): string => {
  const made = mkdtempSync(join(tmpdir(), 'dosewright-copy-'))
  folders.push(made)
  return made
}

let copy = ''
beforeAll(() => {
  copy = folder()
  for (const part of ['engine', 'app', 'package.json'])
    cpSync(join(root, part), join(copy, part), { recursive: true })
  symlinkSync(join(root, 'node_modules'), join(copy, 'node_modules'))
})
afterAll(() => {
  for (const made of folders) rmSync(made, { recursive: true, force: true })
})

const start = (top: string, args: readonly string[], given: Parameters<typeof run>[2] = {}): Promise<Ran> =>
  run(process.execPath, [join(top, 'app/command/start.mjs'), ...args], given)

const edit = (path: string, change: (text: string) => string): (() => void) => {
  const full = join(copy, path)
  const before = readFileSync(full, 'utf8')
  const after = change(before)
  expect(after).not.toBe(before)
  writeFileSync(full, after)
  return () => writeFileSync(full, before)
}

test('npm run -s dosewright answers, with nothing else on standard output', async () => {
  const file = sample('lactose-cold-and-long')
  const npm = await run('npm', ['run', '-s', 'dosewright', '--', 'plan', file, '--json'], {
    env: { PATH: pathWithNode },
  })
  expect({ code: npm.code, stderr: npm.stderr }).toEqual({ code: 0, stderr: '' })
  expect(JSON.parse(npm.stdout)).toMatchObject({ format: 'dosewright-answer', version: 1, reachable: true })
})

test('the first answer comes within half a second of the call, the best of five', async () => {
  const times: number[] = []
  for (let n = 0; n < 5; n += 1) {
    const began = performance.now()
    const { code } = await start(root, ['plan', sample('starch-to-glucose')])
    times.push(performance.now() - began)
    expect(code).toBe(0)
  }
  expect(Math.min(...times)).toBeLessThan(500)
})

test('an edit of a source is followed by the next call', async () => {
  const time = async (): Promise<number> => {
    const { stdout } = await start(copy, ['plan', '-', '--json'], { input: soundScenario })
    return (JSON.parse(stdout) as { time: { value: number } }).time.value
  }
  const before = await time()
  const undo = edit('engine/kinetics/gas-constant.ts', (text) => text.replace('8.31446261815324', '8.5'))
  const edited = await time()
  undo()
  expect(edited).not.toBe(before)
  expect(await time()).toBe(before)
})

test('help and version load neither the engine nor the contract', async () => {
  const undo = edit('engine/index.ts', () => "throw new Error('loaded')\n")
  const undoContract = edit('app/contract/index.ts', () => "throw new Error('loaded')\n")
  const said = await Promise.all([
    start(copy, ['help']),
    start(copy, ['version']),
    start(copy, ['help', 'plan']),
  ])
  undo()
  undoContract()
  expect(said.map(({ code }) => code)).toEqual([0, 0, 0])
})

test('an internal failure is one sentence and exit code 1; the stack only on demand', async () => {
  const undo = edit('engine/plan.ts', (text) =>
    text.replace(
      /export (const|function) plan\b/,
      'export const plan = () => { throw new Error("a\\nb") }\nexport $1 planned',
    ),
  )
  const plain = await start(copy, ['plan', '-'], { input: soundScenario })
  const debug = await start(copy, ['plan', '-'], { input: soundScenario, env: { DOSEWRIGHT_DEBUG: '1' } })
  const stream = await start(copy, ['plan', '--stream'], { input: 'rubbish\n' })
  undo()
  expect({ code: plain.code, stdout: plain.stdout }).toEqual({ code: 1, stdout: '' })
  expect(plain.stderr).toMatch(/^dosewright: internal failure[^\n]*\n$/)
  expect(debug.stderr).toMatch(/\n {4}at /)
  expect(stream.code).toBe(0)
})

test('where the engine cannot, plan says why with exit code 1, and a stream says it on its line', async () => {
  const failing = "({ ok: false, failure: { kind: 'too-many-steps', time: 7200, taken: 100000 } }) as const"
  const undo = edit('engine/plan.ts', (text) =>
    text.replace(/export (const|function) plan\b/, `export const plan = () => ${failing}\nexport $1 planned`),
  )
  const alone = await start(copy, ['plan', '-', '--json'], { input: soundScenario })
  const line = `${JSON.stringify(JSON.parse(soundScenario))}\n`
  const stream = await start(copy, ['plan', '--stream'], { input: line })
  undo()
  expect({ code: alone.code, stdout: alone.stdout }).toEqual({ code: 1, stdout: '' })
  expect(alone.stderr).toMatch(/^[^\n]*steps[^\n]*\n$/)
  expect(stream.code).toBe(0)
  const { error } = JSON.parse(stream.stdout) as { error: { message: string; faults: unknown[] } }
  expect(error).toEqual({ message: alone.stderr.trimEnd(), faults: [] })
})

test('a Node that cannot run the sources is named in one line', async () => {
  const args = ['--no-strip-types', join(root, 'app/command/start.mjs'), 'version']
  const { code, stdout, stderr } = await run(process.execPath, args)
  expect({ code, stdout }).toEqual({ code: 1, stdout: '' })
  expect(stderr).toMatch(/^dosewright needs Node 22\.18 or newer[^\n]*\n$/)
})

test('without the sources, and inside node_modules, the built program runs', async () => {
  const bare = folder()
  const installed = join(folder(), 'node_modules', 'dosewright')
  for (const top of [bare, installed]) {
    mkdirSync(join(top, 'app/command'), { recursive: true })
    cpSync(join(root, 'app/command/start.mjs'), join(top, 'app/command/start.mjs'))
    cpSync(join(root, 'dist'), join(top, 'dist'), { recursive: true })
    cpSync(join(root, 'package.json'), join(top, 'package.json'))
  }
  cpSync(join(root, 'app/command/dosewright.ts'), join(installed, 'app/command/dosewright.ts'))
  for (const top of [bare, installed]) {
    const { code, stdout, stderr } = await start(top, ['plan', '-', '--json'], {
      input: soundScenario,
      cwd: top,
    })
    expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
    expect(JSON.parse(stdout)).toMatchObject({ reachable: true })
  }
})

test('it runs where no cache can be written', async () => {
  const env = { NODE_COMPILE_CACHE: join(root, 'package.json', 'no-folder') }
  const { code, stderr } = await start(root, ['plan', '-'], { input: soundScenario, env })
  expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
})
