/** The best temperature is not beaten, and what a remedy promises comes true. */
import fc from 'fast-check'
import { expect, test, vi } from 'vitest'
import type { Answer, Remedy } from '../../engine/index.ts'
import { answerTo, apart, asking, type File, type Json } from './asking.ts'
import { holds } from './holding.ts'
import { widePlan } from './wide-programmes.ts'
import { decades, fileOf, type Wide, wide } from './wide-scenarios.ts'

vi.setConfig({ testTimeout: 180_000 })

const samples = 200
const low = 5
const high = 95
const between: Json = [`${low} degC`, `${high} degC`]
const temperatures = Array.from({ length: samples }, (_, i) => low + ((high - low) * (i + 0.5)) / samples)

/** One value of one dose of a short form, or of each in a programme, replaced. */
const at = (w: Wide, T: number): File => fileOf({ ...w, T })

test('no sampled temperature is quicker than the best one', () => {
  holds(
    wide({ separable: true }),
    (w) => {
      const ask: Json = { find: 'temperature', best: 'time', conversion: w.conversion, between }
      const best = answerTo(asking(fileOf(w), ask))
      fc.pre(best.reachable)
      for (const T of temperatures) {
        const { time = Number.POSITIVE_INFINITY } = answerTo(at(w, T))
        expect(time).toBeGreaterThanOrEqual((best.time ?? 0) * (1 - 1e-9))
      }
    },
    40,
  )
})

test('no sampled temperature converts more than the best one', () => {
  holds(
    fc.tuple(wide({ separable: true, irreversible: true }), decades(-1, 2)),
    ([w, h]) => {
      const ask: Json = { find: 'temperature', best: 'conversion', within: `${h} h`, between }
      const best = answerTo(asking(fileOf(w), ask))
      for (const T of temperatures) {
        const { trace } = answerTo(asking(at(w, T), { find: 'trace', at: [`${h} h`] }))
        expect(trace?.conversion[0]).toBeLessThanOrEqual((best.conversion ?? 0) * (1 + 1e-9) + 1e-15)
      }
    },
    40,
  )
})

test('the best temperature takes the time it says', () => {
  holds(
    wide({ separable: true }),
    (w) => {
      const ask: Json = { find: 'temperature', best: 'time', conversion: w.conversion, between }
      const best = answerTo(asking(fileOf(w), ask))
      fc.pre(best.reachable && best.temperature !== undefined)
      const there = answerTo(at(w, Number(((best.temperature ?? 0) - 273.15).toPrecision(15))))
      expect(apart(there.time ?? 0, best.time ?? 0)).toBeLessThan(1e-9)
    },
    100,
  )
})

/** The file changed as a remedy says, made here from the file alone. */
function changed(file: File, remedy: Remedy): File | undefined {
  const programme = file.programme as { readonly [key: string]: Json }
  const phases = programme.phases as readonly { readonly [key: string]: Json }[] | undefined
  const kelvin = 'temperature' in remedy ? `${remedy.temperature} K` : ''
  switch (remedy.kind) {
    case 'more-dose': {
      if (!phases) return { ...file, programme: { ...programme, dose: `${remedy.dose} kg` } }
      const amounts = phases.map((phase) => Number.parseFloat(String(phase.amount ?? 0)))
      const scale = remedy.dose / amounts.reduce((sum, amount) => sum + amount, 0)
      const more = phases.map((phase, i) =>
        phase.phase === 'dose' ? { ...phase, amount: `${(amounts[i] ?? 0) * scale} kg` } : phase,
      )
      return { ...file, programme: { ...programme, phases: more } }
    }
    case 'cooler':
    case 'warmer':
      return phases ? undefined : { ...file, programme: { ...programme, temperature: kelvin } }
    case 'staged': {
      const { temperature, pH } = programme as { readonly temperature: Json; readonly pH: Json }
      const staged = Array.from({ length: remedy.doses }, (_, n): readonly Json[] => [
        { phase: 'dose', amount: `${remedy.each} kg` },
        { phase: 'hold', for: `${n + 1 < remedy.doses ? remedy.every : 100 * remedy.every} s` },
      ])
      return { ...file, programme: { start: { temperature, pH }, phases: staged.flat() } }
    }
    case 'sooner': {
      if (!phases) return undefined
      const sum = phases.reduce(
        (total, phase) => total + (phase.phase === 'dose' ? Number.parseFloat(String(phase.amount)) : 0),
        0,
      )
      const rest = phases.filter((phase) => phase.phase !== 'dose')
      return {
        ...file,
        programme: { ...programme, phases: [{ phase: 'dose', amount: `${sum} kg` }, ...rest] },
      }
    }
    default:
      return undefined
  }
}

function keepsItsRemedies(file: File, answer: Answer): number {
  let tried = 0
  for (const remedy of answer.remedies ?? []) {
    const better = changed(file, remedy)
    if (!better) continue
    tried++
    const after = answerTo(better)
    expect(after.reachable).toBe(true)
    const factor = Math.max(1, after.precision?.amplification ?? 1)
    expect(apart(after.time ?? 0, remedy.time)).toBeLessThan(1e-6 * factor)
  }
  return tried
}

test('out of reach means that the reaction comes to rest before, and each remedy gets there', () => {
  let tried = 0
  holds(
    wide(),
    (w) => {
      const answer = answerTo(fileOf(w))
      fc.pre(!answer.reachable)
      expect(answer.limitingConversion).toBeLessThan(w.conversion * (1 + 1e-9))
      tried += keepsItsRemedies(fileOf(w), answer)
    },
    600,
  )
  expect(tried).toBeGreaterThan(50)
})

test('each remedy of a programme gets there', () => {
  let tried = 0
  holds(
    widePlan(),
    (file) => {
      const answer = answerTo(file)
      fc.pre(!answer.reachable)
      tried += keepsItsRemedies(file, answer)
    },
    200,
  )
  expect(tried).toBeGreaterThan(50)
})
