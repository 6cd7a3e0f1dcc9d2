import { readdirSync } from 'node:fs'
import { expect, test } from 'vitest'
import { root, textOf } from './sources.ts'

const agreed = new Set([
  'package.json',
  'package-lock.json',
  'tsconfig.json',
  'electron-builder.yml',
  'README.md',
  'DEVELOPERS.md',
  'LICENSE',
  'LICENSE.md',
  'engine',
  'app',
  'tests',
  'samples',
])
const made = new Set(['node_modules', 'dist', 'coverage'])

test('the top level holds only the agreed names', () => {
  const names = readdirSync(root).filter((name) => !name.startsWith('.') && !made.has(name))
  expect(names.filter((name) => !agreed.has(name))).toEqual([])
})

test('every package is pinned to one version', () => {
  const { dependencies = {}, devDependencies = {} } = JSON.parse(textOf('package.json')) as Record<
    string,
    Record<string, string>
  >
  const versions = Object.entries({ ...dependencies, ...devDependencies })
  expect(versions.length).toBeGreaterThan(0)
  expect(versions.filter(([, version]) => !/^\d+\.\d+\.\d+$/.test(version))).toEqual([])
})

test('the lock names no host to fetch from', () => {
  expect(textOf('package-lock.json')).not.toMatch(/"resolved":|https?:\/\/[^"]*\.tgz/)
})

test('no install script runs that is not allowed by name', () => {
  const { allowScripts } = JSON.parse(textOf('package.json')) as { allowScripts?: Record<string, boolean> }
  const { packages } = JSON.parse(textOf('package-lock.json')) as {
    packages: Record<string, { hasInstallScript?: boolean }>
  }
  const scripted = Object.entries(packages)
    .filter(([, entry]) => entry.hasInstallScript)
    .map(([path]) => path.replace(/^.*node_modules\//, ''))
  expect(scripted.filter((name) => allowScripts?.[name] === undefined)).toEqual([])
})
