import { expect, test } from 'vitest'
import { filesUnder, sources, textOf, undocumentedExports } from './sources.ts'

const everyFile = ['engine', 'app', 'tests', 'samples'].flatMap(filesUnder)
const isText = (path: string): boolean => /\.(ts|mjs|vue|json|md|css|html)$/.test(path)

test('every source opens with or holds a docstring', () => {
  expect(sources.filter((path) => !textOf(path).includes('/**'))).toEqual([])
})

test('every exported value says what it does', () => {
  const silent = sources.flatMap((path) => undocumentedExports(path).map((line) => `${path}: ${line}`))
  expect(silent).toEqual([])
})

test('no source is longer than 260 lines', () => {
  const long = sources
    .map((path) => ({ path, lines: textOf(path).split('\n').length - 1 }))
    .filter(({ lines }) => lines > 260)
  expect(long).toEqual([])
})

test('files are named in kebab case', () => {
  const kebab = /^[a-z0-9]+(-[a-z0-9]+)*(\.test|\.config|\.d)?\.(ts|mjs|css|html)$/
  const component = /^[A-Z][A-Za-z0-9]*\.vue$|^use[A-Z][A-Za-z0-9]*\.ts$/
  const misnamed = everyFile
    .filter((path) => /\.(ts|mjs|css|html|vue)$/.test(path))
    .filter((path) => {
      const name = path.split('/').at(-1) ?? ''
      return !kebab.test(name) && !component.test(name)
    })
  expect(misnamed).toEqual([])
})

test('nothing under app or tests reaches outside the repository', () => {
  const outside = /\.\.\/shared\b/
  const reaching = everyFile.filter((path) => isText(path) && outside.test(textOf(path)))
  expect(reaching).toEqual([])
})
