import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { dosewright, root } from './running.ts'

const readme = readFileSync(join(root, 'README.md'), 'utf8')

/** Round-off differs between machines; everything else must be as printed. */
const withoutRoundOff = (text: string): string => text.replaceAll(/agree to \S+ of/g, 'agree to … of')

const examples = [...readme.matchAll(/```\n\$ npm run -s dosewright -- (.*)\n([\s\S]*?)```/g)].map(
  ([, call = '', output = '']) => ({ call, output }),
)

test('the readme shows a plan that is reached and one that is not', () => {
  expect(examples.map(({ call }) => call)).toEqual([
    'plan samples/lactose-warm-and-short.json',
    'plan samples/lactose-too-hot.json',
  ])
})

describe('an example prints what the program prints', () => {
  test.each(examples)('$call', async ({ call, output }) => {
    const { stdout } = await dosewright(call.split(' '))
    expect(withoutRoundOff(output)).toBe(withoutRoundOff(stdout))
  })
})

test('the scenario shown is the sample', () => {
  expect(readme).toContain(readFileSync(join(root, 'samples/lactose-warm-and-short.json'), 'utf8'))
})

test('every unit that the readme lists is read', async () => {
  const { unitOf, dimensionNames } = await import('../../../engine/index.ts')
  const [, table = ''] = readme.split('### Units')
  const listed = [...(table.split('## The answer')[0] ?? '').matchAll(/^\| [a-z, ]+\| (.*)\|$/gm)]
    .flatMap(([, cell = '']) =>
      [...cell.matchAll(/`([^`]+)`/g)].flatMap(([, words = '']) => words.split(' ')),
    )
    .filter(
      (symbol) =>
        !/^[A-Z]{3}\//.test(symbol) && !['U', 'kU', 'MU', 'nkat', 'ukat', 'mkat', 'kat'].includes(symbol),
    )
  expect(listed.length).toBeGreaterThan(50)
  const unknown = listed.filter((symbol) =>
    dimensionNames.every((name) => unitOf(name, symbol) === undefined),
  )
  expect(unknown).toEqual([])
})
