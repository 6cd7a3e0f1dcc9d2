/**
 * `npm test`: types, lint and build as one check each, then every test of vitest. The last line is always
 * `N passed, N failed`, with `, N skipped` only where a test was skipped; the exit code is 0 only when nothing
 * failed.
 *
 * Plain JavaScript, because it starts under whatever Node npm finds first; the tools run on the Node of
 * node_modules.
 */
import { spawn } from 'node:child_process'
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { delimiter, join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = fileURLToPath(new URL('..', import.meta.url))
const installed = (path) => join(root, 'node_modules', path)
const ownNode = installed(process.platform === 'win32' ? 'node/bin/node.exe' : 'node/bin/node')
const node = existsSync(ownNode) ? ownNode : process.execPath
const env = { ...process.env, PATH: `${installed('.bin')}${delimiter}${process.env.PATH ?? ''}` }

const checks = [
  { name: 'types', tool: 'typescript/bin/tsc', args: ['-b'] },
  { name: 'lint', tool: '@biomejs/biome/bin/biome', args: ['check', '--error-on-warnings'] },
  { name: 'build', tool: 'vite/bin/vite.js', args: ['build', '--config', 'app/vite.config.ts'] },
]

const running = new Set()
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(signal, () => {
    for (const child of running) child.kill(signal)
  })
}

/** Runs one tool to its end and gives its exit code; a tool that cannot start counts as failed. */
const run = (tool, args, show) =>
  new Promise((resolve) => {
    const stdio = show === undefined ? 'inherit' : ['ignore', 'pipe', 'pipe']
    const child = spawn(node, [installed(tool), ...args], { cwd: root, env, stdio })
    running.add(child)
    child.stdout?.on('data', show)
    child.stderr?.on('data', show)
    child.on('error', (error) => {
      console.error(`${tool}: ${error.message}`)
      resolve(1)
    })
    child.on('close', (code) => {
      running.delete(child)
      resolve(code ?? 1)
    })
  })

/** Runs one check and prints what it said once it is done, so that checks can run side by side. */
const check = async ({ name, tool, args }) => {
  const said = []
  const code = await run(tool, args, (chunk) => said.push(chunk))
  process.stdout.write(Buffer.concat(said))
  console.log(`${code === 0 ? 'ok    ' : 'FAILED'} ${name}`)
  return code === 0
}

/** Counts from vitest's report; a file that did not load and an error outside any test count as one failure. */
const countTests = (report, code) => {
  const unloaded = report.testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'),
  ).length
  const failed = report.numFailedTests + unloaded
  return {
    passed: report.numPassedTests,
    failed: code !== 0 && failed === 0 ? 1 : failed,
    skipped: report.numPendingTests + (report.numTodoTests ?? 0),
  }
}

const vitest = async () => {
  const folder = mkdtempSync(join(tmpdir(), 'dosewright-tests-'))
  const file = join(folder, 'report.json')
  try {
    const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`]
    const code = await run('vitest/vitest.mjs', ['run', '--config', 'tests/vitest.config.ts', ...reporters])
    return countTests(JSON.parse(readFileSync(file, 'utf8')), code)
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}

const total = { passed: 0, failed: 0, skipped: 0 }
try {
  for (const ok of await Promise.all(checks.map(check))) total[ok ? 'passed' : 'failed'] += 1
  const counted = await vitest()
  for (const key of Object.keys(total)) total[key] += counted[key]
} catch (error) {
  console.error(`The tests could not be counted: ${error.message}`)
  total.failed += 1
}
const skipped = total.skipped > 0 ? `, ${total.skipped} skipped` : ''
process.exitCode = total.failed === 0 ? 0 : 1
console.log(`${total.passed} passed, ${total.failed} failed${skipped}`)
