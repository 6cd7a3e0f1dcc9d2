import fc from 'fast-check'
import { expect, test } from 'vitest'
import { type Line, lineSplitter } from '../../../app/command/line-splitter.ts'

const splitAll = (chunks: readonly Buffer[], longest = 1000): Line[] => {
  const splitter = lineSplitter(longest)
  return [...chunks.flatMap((chunk) => [...splitter.push(chunk)]), ...splitter.end()]
}

const texts = (lines: readonly Line[]): string[] => lines.map((line) => line.toString('utf8'))

test('lines end at LF or CRLF, and the last one needs no line end', () => {
  expect(texts(splitAll([Buffer.from('a\nb\r\n\n\r\nlast')]))).toEqual(['a', 'b', '', '', 'last'])
  expect(texts(splitAll([Buffer.from('a\n')]))).toEqual(['a'])
  expect(texts(splitAll([]))).toEqual([])
})

test('where the chunks are cut does not matter', () => {
  fc.assert(
    fc.property(
      fc.array(fc.string({ unit: 'grapheme', maxLength: 8 }).map((text) => text.replaceAll(/[\r\n]/g, ''))),
      fc.array(fc.nat({ max: 12 })),
      fc.constantFrom('\n', '\r\n'),
      (lines, sizes, lineEnd) => {
        const whole = Buffer.from(lines.map((line) => line + lineEnd).join(''))
        const chunks: Buffer[] = []
        let from = 0
        for (const size of sizes) {
          chunks.push(whole.subarray(from, from + size))
          from += size
        }
        chunks.push(whole.subarray(from))
        expect(texts(splitAll(chunks))).toEqual(lines)
      },
    ),
  )
})

test('a line that is too long is named once, kept nowhere and harms no other', () => {
  const long = Array.from({ length: 100 }, () => Buffer.alloc(50, 'x'))
  expect(splitAll([Buffer.from('a\n'), ...long, Buffer.from('\nb\n')]).map(String)).toEqual([
    'a',
    'too-long',
    'b',
  ])
  expect(splitAll([...long])).toEqual(['too-long'])
})

test('bytes that are no text stay in their line', () => {
  const lines = splitAll([Buffer.from([0xff, 0x0a, 0xe2, 0x82]), Buffer.from([0xac, 0x0a])])
  expect(lines[0]).toEqual(Buffer.from([0xff]))
  expect(texts(lines.slice(1))).toEqual(['€'])
})
