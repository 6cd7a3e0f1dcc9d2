import fc from 'fast-check'
import { expect, test } from 'vitest'
import { absurdScenario } from './absurd-scenarios.ts'
import { dosewright } from './running.ts'

const count = Number(process.env.DOSEWRIGHT_ABSURD ?? 200)
const seed = Number(process.env.DOSEWRIGHT_SEED ?? 20_261_201)

interface Line {
  readonly reachable?: boolean
  readonly error?: { readonly message: string; readonly faults: readonly unknown[] }
}

test(`${count} absurd but legal scenarios each get an answer or a sentence (seed ${seed})`, async () => {
  const scenarios = fc.sample(absurdScenario, { seed, numRuns: count })
  const input = scenarios.map((scenario) => `${JSON.stringify(scenario)}\n`).join('')
  const { code, stdout, stderr } = await dosewright(['plan', '--stream'], { input })
  expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
  const lines = stdout.split('\n').slice(0, -1)
  expect(lines.length).toBe(count)
  const strange = lines.flatMap((line, n) => {
    const { reachable, error } = JSON.parse(line) as Line
    const sound =
      error === undefined
        ? typeof reachable === 'boolean'
        : error.faults.length === 0 && /^[^\n]{10,300}$/.test(error.message)
    const leaking = /NaN|Infinity|undefined|internal failure|\n {4}at /.test(line)
    return sound && !leaking ? [] : [`${line.slice(0, 300)} from ${JSON.stringify(scenarios[n])}`]
  })
  expect(strange).toEqual([])
}, 300_000)
