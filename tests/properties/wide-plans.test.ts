/** What holds for any programme of ramps, jackets, doses, holds, feeds, pH steps and kill steps. */
import fc from 'fast-check'
import { expect, test, vi } from 'vitest'
import type { Answer } from '../../engine/index.ts'
import { answerTo, apart, asking, type File, type Json, notFinite, printed } from './asking.ts'
import { holds } from './holding.ts'
import { widePlan } from './wide-programmes.ts'
import { decades } from './wide-scenarios.ts'

vi.setConfig({ testTimeout: 180_000 })

const magnified = ({ precision }: Answer): number => Math.max(1, precision?.amplification ?? 1)
const hours = decades(-2, 2.5)

const trace = (file: File, at: readonly number[]) => {
  const { trace: columns } = answerTo(asking(file, { find: 'trace', at: at.map((h) => `${h} h`) }))
  if (!columns) throw new Error('a trace without columns')
  return columns
}

type Phase = { readonly [key: string]: Json }
const phasesOf = (file: File): readonly Phase[] =>
  (file.programme as { readonly phases: readonly Phase[] }).phases
const withPhases = (file: File, phases: readonly Phase[]): File => ({
  ...file,
  programme: { ...(file.programme as Phase), phases },
})
/** With every dose times a factor; a feed brings none in these. */
const dosed = (file: File, factor: number): File =>
  withPhases(
    file,
    phasesOf(file).map((phase) =>
      phase.phase === 'dose'
        ? { ...phase, amount: `${Number.parseFloat(String(phase.amount)) * factor} kg` }
        : phase,
    ),
  )
const waits = (file: File): boolean => phasesOf(file).some((phase) => phase.until !== undefined)
const begun = (file: File): number => Number((file.ask as { readonly conversion: number }).conversion)

test('every number of a plan is finite', () => {
  holds(
    widePlan({ feeds: true }),
    (file) => {
      expect(notFinite(printed(file))).toEqual([])
      expect(notFinite(printed(asking(file, { find: 'trace', at: ['0 h', '3 h', '300 h'] })))).toEqual([])
    },
    200,
  )
})

test('the two routes agree about a plan at constant volume', () => {
  holds(
    widePlan(),
    (file) => {
      const answer = answerTo(file)
      expect(answer.check.relativeDifference).not.toBeNull()
      // Stepping restarts at each of a dozen kinks; a target of a millionth hangs on the last digits of ln S.
      const early = answer.reachable ? Math.max(1, 0.01 / begun(file)) : 1
      expect(answer.check.relativeDifference).toBeLessThan(2e-6 * magnified(answer) * early)
    },
    600,
  )
})

test('the two methods agree about a plan with feeds', () => {
  holds(widePlan({ feeds: true }), (file) => {
    const answer = answerTo(file)
    const early = answer.reachable ? Math.max(1, 0.01 / begun(file)) : 1
    if (answer.check.relativeDifference === null)
      expect(answer.warnings.map(({ code }) => code)).toContain('check-failed')
    else expect(answer.check.relativeDifference).toBeLessThan(1e-5 * magnified(answer) * early)
  })
})

test('substrate, product and what is fed stay in balance', () => {
  holds(fc.tuple(widePlan({ feeds: true }), hours), ([file, h]) => {
    expect(answerTo(file).massBalance).toBeLessThan(1e-11)
    const columns = trace(file, [0, h, 1000])
    for (const column of [columns.substrate, columns.product, columns.enzyme, columns.volume])
      for (const value of column) expect(value).toBeGreaterThanOrEqual(0)
  })
})

test('the conversion of an irreversible reaction without feed stays between 0 and 1 and never falls', () => {
  holds(fc.tuple(widePlan({ irreversible: true }), hours), ([file, h]) => {
    const { conversion } = trace(file, [0, h / 10, h, 10 * h, 1000 * h])
    for (let i = 0; i < conversion.length; i++) {
      expect(conversion[i]).toBeGreaterThanOrEqual(0)
      expect(conversion[i]).toBeLessThanOrEqual(1)
      if (i > 0) expect(conversion[i]).toBeGreaterThanOrEqual((conversion[i - 1] ?? 0) - 1e-8)
    }
  })
})

test('more dose is never slower where no hold waits', () => {
  holds(fc.tuple(widePlan({ irreversible: true }), decades(0, 2), hours), ([file, factor, h]) => {
    fc.pre(!waits(file))
    const more = dosed(file, factor)
    const before = answerTo(file)
    const after = answerTo(more)
    if (before.reachable) {
      expect(after.reachable).toBe(true)
      expect(after.time).toBeLessThanOrEqual((before.time ?? 0) * (1 + 1e-7 * magnified(before)) + 1e-9)
    }
    const reached = trace(file, [h]).conversion[0] ?? 0
    expect(trace(more, [h]).conversion[0]).toBeGreaterThanOrEqual(reached - 1e-8)
  })
})

test('the ledger of a plan sums to its time', () => {
  holds(
    widePlan({ feeds: true }),
    (file) => {
      const { hours: ledger, time } = answerTo(file)
      fc.pre(ledger !== undefined)
      const lines = ledger?.lines.map((line) => line.time) ?? []
      const sum = lines.reduce((total, line) => total + line, 0)
      // Lines that take time and give it back round off on the scale of the largest of them.
      const scale = Math.max(time ?? 0, ...lines.map(Math.abs))
      expect(Math.abs(sum - (time ?? 0)) / scale).toBeLessThan(1e-12)
    },
    150,
  )
})

test('a wait split in two changes nothing', () => {
  holds(fc.tuple(widePlan({ feeds: true }), hours), ([file, h]) => {
    const split = phasesOf(file).flatMap((phase): readonly Phase[] => {
      if (phase.phase !== 'hold' || phase.for === undefined) return [phase]
      const half = `${Number.parseFloat(String(phase.for)) / 2} h`
      return [
        { phase: 'hold', for: half },
        { phase: 'hold', for: half },
      ]
    })
    const one = trace(file, [h])
    const two = trace(withPhases(file, split), [h])
    expect(apart(one.substrate[0] ?? 0, two.substrate[0] ?? 0)).toBeLessThan(1e-6)
    expect(two.temperature[0]).toBeCloseTo(one.temperature[0] ?? 0, 6)
  })
})

test('a dose split in two at one moment changes nothing', () => {
  holds(fc.tuple(widePlan({ feeds: true }), hours), ([file, h]) => {
    const split = phasesOf(file).flatMap((phase): readonly Phase[] => {
      if (phase.phase !== 'dose') return [phase]
      const half = { ...phase, amount: `${Number.parseFloat(String(phase.amount)) / 2} kg` }
      return [half, half]
    })
    const one = trace(file, [h])
    const two = trace(withPhases(file, split), [h])
    expect(apart(one.substrate[0] ?? 0, two.substrate[0] ?? 0)).toBeLessThan(1e-7)
  })
})

test('the state at a time does not hang on the other times asked for', () => {
  holds(
    fc.tuple(widePlan({ feeds: true }), hours, fc.array(hours, { maxLength: 4 })),
    ([file, h, others]) => {
      const alone = trace(file, [h])
      const among = trace(file, [...others, h])
      const i = others.length
      expect(apart(alone.substrate[0] ?? 0, among.substrate[i] ?? 0)).toBeLessThan(1e-6)
      expect(among.temperature[i]).toBeCloseTo(alone.temperature[0] ?? 0, 9)
      expect(among.volume[i]).toBe(alone.volume[0])
    },
  )
})
