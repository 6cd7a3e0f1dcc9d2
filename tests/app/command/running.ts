/** Runs the command line as a process of its own and gathers what it says. */
import { type SpawnOptions, spawn } from 'node:child_process'
import { dirname, join } from 'node:path'
import { Readable, type Writable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import { fileURLToPath } from 'node:url'
import { builtProgram } from './built.ts'

/** The top of the repository. */
export const root = fileURLToPath(new URL('../../..', import.meta.url))

/** A sample scenario by its name. */
export const sample = (name: string): string => join(root, 'samples', `${name}.json`)

/** What a process said and how it ended. */
export interface Ran {
  readonly code: number | null
  readonly stdout: string
  readonly stderr: string
}

interface Given {
  readonly input?: string | Uint8Array | AsyncIterable<Uint8Array | string>
  readonly cwd?: string
  readonly env?: NodeJS.ProcessEnv
}

/** Runs any program to its end, feeding it the input with back-pressure. */
export const run = async (program: string, args: readonly string[], given: Given = {}): Promise<Ran> => {
  const options: SpawnOptions = {
    cwd: given.cwd ?? root,
    env: { ...process.env, ...given.env },
    stdio: 'pipe',
  }
  const child = spawn(program, args, options)
  const stdout: Buffer[] = []
  const stderr: Buffer[] = []
  child.stdout?.on('data', (chunk: Buffer) => stdout.push(chunk))
  child.stderr?.on('data', (chunk: Buffer) => stderr.push(chunk))
  const ended = new Promise<number | null>((resolve, reject) => {
    child.on('error', reject)
    child.on('close', resolve)
  })
  await feed(child.stdin, given.input ?? '')
  const code = await ended
  return { code, stdout: Buffer.concat(stdout).toString(), stderr: Buffer.concat(stderr).toString() }
}

const feed = async (stdin: Writable | null, input: NonNullable<Given['input']>): Promise<void> => {
  if (stdin === null) return
  const chunks = typeof input === 'string' || input instanceof Uint8Array ? [input] : input
  // A program that refuses its input early closes the pipe; what it says then is what the test is about.
  await pipeline(Readable.from(chunks, { objectMode: false }), stdin).catch(() => {})
}

/** Runs the built program. */
export const dosewright = (args: readonly string[], given: Given = {}): Promise<Ran> =>
  run(process.execPath, [builtProgram, ...args], given)

/** The folder of the Node that runs the tests, first on the path: what npm would choose. */
export const pathWithNode = `${dirname(process.execPath)}:${process.env.PATH ?? ''}`
