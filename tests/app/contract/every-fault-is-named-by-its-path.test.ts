import { expect, test, vi } from 'vitest'
import { readScenario } from '../../../app/contract/index.ts'
import { badInputs } from './bad-inputs.ts'
import { edited, phased, shortForm } from './scenarios.ts'

vi.setConfig({ testTimeout: 60_000 })

const faultLines = (text: string): readonly string[] => {
  const read = readScenario(text)
  return read.ok ? [] : read.failure.faults.map(({ path, message }) => `${path}: ${message}`)
}

test.each(badInputs)('%s', (_, text, faults) => {
  expect(faultLines(text)).toEqual(faults)
})

test('every line stays on its line and holds no control character', () => {
  for (const [, text] of badInputs) {
    // biome-ignore lint/suspicious/noControlCharactersInRegex: the very thing looked for
    for (const line of faultLines(text)) expect(line).not.toMatch(/[\u0000-\u001f\u007f-\u009f]/)
  }
})

test('more faults than a person can use are counted instead of listed', () => {
  const at = Array.from({ length: 1000 }, () => ({ phase: 'dose', amount: '0 kg' }))
  const lines = faultLines(JSON.stringify(edited(phased(), ['programme.phases', at])))
  expect(lines).toHaveLength(51)
  expect(lines.at(-1)).toBe('(file): and 950 more')
})

test('hundreds of thousands of wrong entries give a few lines', () => {
  const many = (path: string, list: unknown[]): readonly string[] =>
    faultLines(JSON.stringify(edited(shortForm(), [path, list as never])))
  const ones = Array.from({ length: 400_000 }, () => 1)
  expect(many('enzyme.inactivation.series', ones)).toEqual([
    'enzyme.inactivation.series: found a list of 400000; at most 1000 entries are read',
  ])
  const asked = faultLines(JSON.stringify(edited(shortForm(), ['ask', { find: 'trace', at: ones }])))
  expect(asked[0]).toBe('ask.at: 400000 of 400000 entries are not times; the first are named')
  expect(asked).toHaveLength(21)
})

test('a million times of a trace are the most', () => {
  const text = (count: number): string =>
    JSON.stringify(
      edited(shortForm(), ['ask', { find: 'trace', at: Array.from({ length: count }, () => '1') }]),
    )
  expect(faultLines(text(1_000_001))).toEqual(['ask.at: found 1000001 times; a trace has at most 1000000'])
})
