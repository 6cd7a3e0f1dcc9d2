/**
 * Makes sure that the built program is no older than the sources before a test runs it. `npm test` has just
 * built it; a single test run by hand has not.
 */
import { readdirSync, rmSync, statSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { build } from 'vite'

const root = fileURLToPath(new URL('../../..', import.meta.url))

/** The built command line. */
export const builtProgram = join(root, 'dist/node/dosewright.js')

const modified = (path: string): number => statSync(path, { throwIfNoEntry: false })?.mtimeMs ?? 0

const newestSource = (): number =>
  ['engine', 'app', 'package-lock.json']
    .map((path) => join(root, path))
    .flatMap((path) =>
      statSync(path).isDirectory()
        ? readdirSync(path, { recursive: true, encoding: 'utf8' }).map((name) => join(path, name))
        : [path],
    )
    .reduce((newest, path) => Math.max(newest, modified(path)), 0)

/**
 * Builds when a source is newer than the built program. Where that fails, the old one goes, so that tests that
 * need the program fail and all others run.
 */
export default async function setup(): Promise<void> {
  if (modified(builtProgram) >= newestSource()) return
  try {
    await build({ configFile: join(root, 'app/vite.config.ts') })
  } catch (error) {
    rmSync(dirname(builtProgram), { recursive: true, force: true })
    console.error('The command line could not be built:', error instanceof Error ? error.message : error)
  }
}
