#!/usr/bin/env node
/**
 * Starts the command line: from the sources where they stand, so that a later edit is followed without a
 * build, and otherwise from the built program. Node strips the types of the sources itself, but not of files
 * inside node_modules.
 *
 * Plain JavaScript without static imports of ours, because it must run, and say what it needs, on any Node.
 */
import { existsSync } from 'node:fs'
import module from 'node:module'

const sources = new URL('dosewright.ts', import.meta.url)
const built = new URL('../../dist/node/dosewright.js', import.meta.url)
const fromSources = existsSync(sources) && !import.meta.url.includes('/node_modules/')

if (fromSources && !process.features.typescript) {
  console.error(
    `dosewright needs Node 22.18 or newer to run from its sources; this is Node ${process.versions.node}` +
      ' (npm run dosewright takes the right one from node_modules)',
  )
  process.exitCode = 1
} else if (!fromSources && !existsSync(built)) {
  console.error('dosewright is not built here: npm run build writes dist/node/dosewright.js')
  process.exitCode = 1
} else {
  // Where the cache cannot be written, this reports so in its result and everything runs without it.
  module.enableCompileCache?.()
  await (fromSources ? import('./dosewright.ts') : import('../../dist/node/dosewright.js'))
}
