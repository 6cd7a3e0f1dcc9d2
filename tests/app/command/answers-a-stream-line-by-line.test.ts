import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { soundScenario } from './bad-inputs.ts'
import { dosewright, run, sample } from './running.ts'

interface AnswerLine {
  readonly reachable?: boolean
  readonly time?: { readonly value: number; readonly unit: string }
  readonly error?: {
    readonly message: string
    readonly faults: readonly { readonly path: string; readonly message: string }[]
  }
}

const compact = JSON.stringify(JSON.parse(soundScenario))

/** The sound scenario with another dose, so that every line has an answer of its own. */
const dosed = (kg: number): string => compact.replace('"3.5 kg"', `"${kg} kg"`)

const stream = async (input: string | Uint8Array): Promise<AnswerLine[]> => {
  const { code, stdout, stderr } = await dosewright(['plan', '--stream'], { input })
  expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
  return stdout
    .split('\n')
    .slice(0, -1)
    .map((line) => JSON.parse(line) as AnswerLine)
}

const single = async (text: string): Promise<unknown> =>
  JSON.parse((await dosewright(['plan', '-', '--json'], { input: text })).stdout)

test('one answer a line, in order, each the one that plan --json gives', async () => {
  const doses = [3, 30, 4, 40, 5, 50]
  const answers = await stream(doses.map((kg) => `${dosed(kg)}\n`).join(''))
  expect(answers).toEqual(await Promise.all(doses.map((kg) => single(dosed(kg)))))
  expect(new Set(answers.map((answer) => answer.time?.value)).size).toBe(doses.length)
})

test('every ask of the samples can stand in a stream', async () => {
  const names = ['lactose-cold-and-long', 'lactose-too-hot', 'starch-to-glucose', 'permeate-fed-batch']
  const texts = names.map((name) => readFileSync(sample(name), 'utf8'))
  const lines = texts.map((text) => `${JSON.stringify(JSON.parse(text))}\n`)
  expect(await stream(lines.join(''))).toEqual(await Promise.all(texts.map(single)))
})

test('CRLF, a last line without its end and a line cut by chunks change nothing', async () => {
  const lines = [dosed(3), dosed(4), dosed(5)]
  const plain = await stream(`${lines.join('\n')}\n`)
  expect(await stream(lines.join('\r\n'))).toEqual(plain)
  const bytes = Buffer.from(`${lines.join('\n')}\n`)
  const pieces = async function* (): AsyncGenerator<Uint8Array> {
    for (let at = 0; at < bytes.length; at += 97) {
      yield bytes.subarray(at, at + 97)
      await new Promise((resolve) => setImmediate(resolve))
    }
  }
  const cut = await dosewright(['plan', '--stream'], { input: pieces() })
  expect(
    cut.stdout
      .split('\n')
      .slice(0, -1)
      .map((line) => JSON.parse(line)),
  ).toEqual(plain)
})

test('nothing in, nothing out', async () => {
  expect(await stream('')).toEqual([])
})

describe('a rubbish line gives an error and harms no other', () => {
  const rubbish: readonly {
    readonly what: string
    readonly line: string | Uint8Array
    readonly path: string
  }[] = [
    { what: 'no JSON', line: 'dose 3 kg', path: '(file)' },
    { what: 'a blank line', line: '', path: '(file)' },
    { what: 'bytes that are no text', line: Uint8Array.of(0xff, 0xfe, 0x80, 0x00, 0x01), path: '(file)' },
    { what: 'deep nesting', line: '['.repeat(100_000), path: '(file)' },
    { what: 'a wrong unit', line: compact.replace('"12 m3"', '"12 kg"'), path: 'feed.volume' },
    {
      what: '__proto__',
      line: compact.replace('"ask":{', '"ask":{"__proto__":{"reachable":1},'),
      path: 'ask.__proto__',
    },
    { what: '50 MB', line: Buffer.alloc(50_000_000, 'x'), path: '(file)' },
  ]
  test.each(rubbish)('$what', async ({ line, path }) => {
    const input = Buffer.concat([`${dosed(3)}\n`, line, `\n${dosed(4)}\n`].map((part) => Buffer.from(part)))
    const [before, error, after, ...more] = await stream(input)
    expect([before, after, more]).toEqual([await single(dosed(3)), await single(dosed(4)), []])
    expect(error?.error?.faults.map((fault) => fault.path)).toEqual([path])
    expect(error?.error?.message).toContain(error?.error?.faults[0]?.message)
  })
})

/**
 * Says the largest memory on standard error at the end. Read from /proc, because the figure of `resourceUsage`
 * starts from the memory of the process that started it.
 */
const report = `data:text/javascript,${encodeURIComponent(`
  import { readFileSync } from 'node:fs'
  process.on('exit', () => process.stderr.write(/VmHWM:\\s+(\\d+)/.exec(readFileSync('/proc/self/status', 'utf8'))[1]))
`)}`

test.skipIf(process.platform !== 'linux')(
  'memory stays the same however many lines there are',
  async () => {
    const lines = async function* (count: number): AsyncGenerator<string> {
      for (let n = 0; n < count; n += 100) {
        yield Array.from({ length: 100 }, (_, i) => `${dosed(3 + ((n + i) % 1000) / 100)}\n`).join('')
      }
    }
    const megabytes = async (count: number): Promise<number> => {
      const { builtProgram } = await import('./built.ts')
      const { code, stdout, stderr } = await run(
        process.execPath,
        ['--import', report, builtProgram, 'plan', '--stream'],
        { input: lines(count) },
      )
      expect(code).toBe(0)
      expect(stdout.split('\n').length - 1).toBe(count)
      return Number(stderr) / 1024
    }
    const few = await megabytes(2000)
    const many = await megabytes(20_000)
    expect(many).toBeLessThan(150)
    expect(many - few).toBeLessThan(40)
  },
  120_000,
)

const parallel = await run('parallel', ['--version']).then(
  ({ stdout }) => stdout.startsWith('GNU parallel'),
  () => false,
)

/** The answers of blocks of lines, each answered by a process of its own: by GNU parallel where it is installed. */
const inBlocks = async (lines: readonly string[], size: number): Promise<string> => {
  if (parallel) {
    const { builtProgram } = await import('./built.ts')
    const job = `${process.execPath} ${builtProgram} plan --stream`
    const split = await run('parallel', ['--pipe', '--keep-order', '-L', `${size}`, job], {
      input: `${lines.join('\n')}\n`,
    })
    expect(split.code).toBe(0)
    return split.stdout
  }
  const blocks = Array.from({ length: Math.ceil(lines.length / size) }, (_, n) =>
    lines.slice(n * size, (n + 1) * size),
  )
  const answers = await Promise.all(
    blocks.map((block) => dosewright(['plan', '--stream'], { input: `${block.join('\n')}\n` })),
  )
  return answers.map(({ stdout }) => stdout).join('')
}

test('split over processes it gives the same answers in the same order', async () => {
  const lines = Array.from({ length: 900 }, (_, n) => (n % 90 === 7 ? 'rubbish' : dosed(3 + n / 100)))
  const whole = await dosewright(['plan', '--stream'], { input: `${lines.join('\n')}\n` })
  expect(await inBlocks(lines, 100)).toBe(whole.stdout)
}, 120_000)
