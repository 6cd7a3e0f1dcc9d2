import { expect, test } from 'vitest'
import { roomOf, rooms } from './rooms.ts'
import { importsOf, resolved, sources } from './sources.ts'

const isConfiguration = (path: string): boolean => /^app\/[a-z]+\.config\.ts$/.test(path)
const program = sources.filter((path) => !isConfiguration(path))
const isOfTheHouse = (target: string): boolean => /^(engine|app)\//.test(target)

const complaint = (path: string, specifier: string): string[] => {
  const from = roomOf(path)
  const room = from === undefined ? undefined : rooms[from]
  if (from === undefined || room === undefined) return []
  const target = resolved(path, specifier)
  if (isOfTheHouse(target)) {
    const to = roomOf(target)
    return to === from || (to !== undefined && room.rooms.includes(to))
      ? []
      : [`${path} (${from}) imports ${target} (${to ?? 'no room'})`]
  }
  const allowed = (room.packages ?? []).some(
    (name) => target === name || (name.endsWith(':') && target.startsWith(name)),
  )
  return allowed ? [] : [`${path} (${from}) imports ${target}`]
}

test('every source lives in a room of the table', () => {
  expect(program.filter((path) => roomOf(path) === undefined)).toEqual([])
})

test('every import stays within the table', () => {
  expect(program.flatMap((path) => importsOf(path).flatMap((name) => complaint(path, name)))).toEqual([])
})

test('the engine imports neither builtins nor the app', () => {
  const engine = program.filter((path) => path.startsWith('engine/'))
  const foreign = engine.flatMap((path) =>
    importsOf(path)
      .map((name) => resolved(path, name))
      .filter((target) => target.startsWith('node:') || target.startsWith('app/'))
      .map((target) => `${path} imports ${target}`),
  )
  expect(foreign).toEqual([])
})

test('a relative import names its file with the extension', () => {
  const bare = sources.flatMap((path) =>
    importsOf(path)
      .filter((name) => name.startsWith('.') && !/\.(ts|mjs|js|vue|css|json)$/.test(name))
      .map((name) => `${path} imports ${name}`),
  )
  expect(bare).toEqual([])
})

test('the table itself refuses what it should', () => {
  expect(complaint('engine/units/quantity.ts', '../kinetics/arrhenius.ts')).not.toEqual([])
  expect(complaint('engine/kinetics/arrhenius.ts', '../integrate/method.ts')).not.toEqual([])
  expect(complaint('engine/kinetics/arrhenius.ts', '../numeric/roots.ts')).not.toEqual([])
  expect(complaint('engine/solve/balance.ts', '../cost/enzyme.ts')).not.toEqual([])
  expect(complaint('engine/solve/balance.ts', 'zod')).not.toEqual([])
  expect(complaint('app/contract/index.ts', '../../engine/solve/balance.ts')).not.toEqual([])
  expect(complaint('app/contract/index.ts', 'node:fs')).not.toEqual([])
  expect(complaint('app/command/verbs.ts', '../../engine/index.ts')).toEqual([])
})
