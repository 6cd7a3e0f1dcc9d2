/** What holds for any batch under constant conditions, over physically wide random scenarios. */
import fc from 'fast-check'
import { expect, test, vi } from 'vitest'
import type { Answer } from '../../engine/index.ts'
import { answerTo, apart, asking, type File, notFinite, printed } from './asking.ts'
import { holds } from './holding.ts'
import { between, decades, fileOf, type Wide, wide } from './wide-scenarios.ts'

vi.setConfig({ testTimeout: 180_000 })

/** How many times an error of the constants, and so of the stepping, is magnified in a time. */
const magnified = ({ precision }: Answer): number => Math.max(1, precision?.amplification ?? 1)

/** The conversion where the reaction stands still; 1 for an irreversible one, below 0 where product is too much. */
const equilibrium = ({ S0, P0, massYield, Keq }: Wide): number =>
  Keq === undefined ? 1 : (S0 - P0 / Keq) / (S0 * (1 + massYield / Keq))

const trace = (file: File, hours: readonly number[]) => {
  const { trace: columns } = answerTo(asking(file, { find: 'trace', at: hours.map((h) => `${h} h`) }))
  if (!columns) throw new Error('a trace without columns')
  return columns
}

const hours = decades(-3, 3)

test('every number of an answer is finite', () => {
  holds(wide(), (w) => {
    expect(notFinite(printed(fileOf(w)))).toEqual([])
    expect(notFinite(printed(asking(fileOf(w), { find: 'trace', at: ['0 h', '1 h', '1000 h'] })))).toEqual([])
  })
})

test('stepping agrees with the answer about time and limiting conversion', () => {
  holds(
    wide(),
    (w) => {
      const answer = answerTo(fileOf(w))
      expect(answer.check.relativeDifference).not.toBeNull()
      expect(answer.check.relativeDifference).toBeLessThan(1e-6 * magnified(answer))
    },
    600,
  )
})

test('stepping agrees with the answer about the course of a batch', () => {
  holds(fc.tuple(wide(), fc.array(hours, { minLength: 1, maxLength: 5 })), ([w, at]) => {
    const { check } = answerTo(asking(fileOf(w), { find: 'trace', at: at.map((h) => `${h} h`) }))
    expect(check.relativeDifference).toBeLessThan(1e-5)
  })
})

test('substrate and product stay in balance', () => {
  holds(fc.tuple(wide(), hours), ([w, h]) => {
    expect(answerTo(fileOf(w)).massBalance).toBeLessThan(1e-12)
    const columns = trace(fileOf(w), [0, h, 10 * h])
    const charged = w.massYield * w.S0 + w.P0
    for (let i = 0; i < 3; i++) {
      const present = w.massYield * (columns.substrate[i] ?? 0) + (columns.product[i] ?? 0)
      expect(apart(present, charged)).toBeLessThan(1e-12)
    }
  })
})

test('the conversion stays between 0 and its equilibrium and never falls', () => {
  holds(fc.tuple(wide(), hours), ([w, h]) => {
    fc.pre(equilibrium(w) > 0)
    const { conversion } = trace(fileOf(w), [0, h / 100, h, 100 * h])
    for (let i = 0; i < 4; i++) {
      expect(conversion[i]).toBeGreaterThanOrEqual(0)
      expect(conversion[i]).toBeLessThanOrEqual(equilibrium(w) + 1e-9)
      if (i > 0) expect(conversion[i]).toBeGreaterThanOrEqual((conversion[i - 1] ?? 0) - 1e-9)
    }
  })
})

test('more dose is never slower and never reaches less', () => {
  holds(fc.tuple(wide(), decades(0, 3), hours), ([w, factor, h]) => {
    fc.pre(equilibrium(w) > 0)
    const more = { ...w, dose: w.dose * factor }
    const before = answerTo(fileOf(w))
    const after = answerTo(fileOf(more))
    if (before.reachable) {
      expect(after.reachable).toBe(true)
      expect(after.time).toBeLessThanOrEqual((before.time ?? 0) * (1 + 1e-8 * magnified(before)))
    } else
      expect(after.limitingConversion ?? 1).toBeGreaterThanOrEqual((before.limitingConversion ?? 0) - 1e-8)
    const early = trace(fileOf(w), [h]).conversion[0] ?? 0
    expect(trace(fileOf(more), [h]).conversion[0]).toBeGreaterThanOrEqual(early - 1e-8)
  })
})

test('twice a stable enzyme takes half the time', () => {
  holds(wide({ stable: true }), (w) => {
    const once = answerTo(fileOf(w))
    fc.pre(once.reachable)
    const twice = answerTo(fileOf({ ...w, dose: 2 * w.dose }))
    expect(apart(2 * (twice.time ?? 0), once.time ?? 0)).toBeLessThan(1e-12)
  })
})

test('a higher target takes longer', () => {
  holds(fc.tuple(wide(), between(0.001, 0.9)), ([w, share]) => {
    const far = answerTo(fileOf(w))
    fc.pre(far.reachable)
    const near = answerTo(fileOf({ ...w, conversion: share * w.conversion }))
    expect(near.reachable).toBe(true)
    expect(near.time).toBeLessThan(far.time ?? 0)
  })
})

test('the batch has its target conversion at the time answered', () => {
  holds(wide(), (w) => {
    const answer = answerTo(fileOf(w))
    fc.pre(answer.reachable && (answer.time ?? 0) > 1e-3)
    const { substrate } = trace(fileOf(w), [(answer.time ?? 0) / 3600])
    const left = w.S0 * (1 - w.conversion)
    // The unconverted part has the digits late in a batch, the converted part early.
    const off = Math.min(apart(substrate[0] ?? 0, left), apart(w.S0 - (substrate[0] ?? 0), w.S0 - left))
    expect(off).toBeLessThan(1e-7)
  })
})

test('the dose for a time takes that time', () => {
  holds(fc.tuple(wide(), hours), ([w, h]) => {
    const file = asking(fileOf(w), { find: 'dose', conversion: w.conversion, within: `${h} h` })
    const answer = answerTo(file)
    fc.pre(answer.reachable && (answer.dose ?? 0) > 0)
    // Stepping knows the substrate; of an early target it knows as much less as that is smaller.
    expect(answer.check.relativeDifference).toBeLessThan(1e-6 * Math.max(1, 0.01 / w.conversion))
    const back = answerTo(fileOf({ ...w, dose: answer.dose ?? 0 }))
    // At the edge of reachability a rounding of the dose decides.
    fc.pre(magnified(back) < 1e3)
    const early = Math.max(1, 0.01 / w.conversion)
    if (back.reachable) expect(apart((back.time ?? 0) / 3600, h)).toBeLessThan(1e-8 * magnified(back) * early)
    else expect((back.limitingConversion ?? 0) / w.conversion).toBeGreaterThan(1 - 1e-6)
  })
})

test('less than the least dose never gets there, a little more does', () => {
  holds(wide(), (w) => {
    const { leastDose } = answerTo(fileOf(w))
    // With next to none of what is charged, the target is reached after the end of time.
    fc.pre(leastDose !== undefined && leastDose > 1e-9 * w.dose)
    const least = leastDose ?? 0
    expect(answerTo(fileOf({ ...w, dose: least * 1.001 })).reachable).toBe(true)
    expect(answerTo(fileOf({ ...w, dose: least * 0.999 })).reachable).toBe(false)
  })
})

test('the ledger of hours sums to the time', () => {
  holds(wide(), (w) => {
    const { hours: ledger, time } = answerTo(fileOf(w))
    fc.pre(ledger !== undefined)
    const lines = ledger?.lines.map((line) => line.time) ?? []
    const sum = lines.reduce((total, line) => total + line, 0)
    // Lines that take time and give it back round off on the scale of the largest of them.
    const scale = Math.max(time ?? 0, ...lines.map(Math.abs))
    expect(Math.abs(sum - (time ?? 0)) / scale).toBeLessThan(1e-12)
    expect(ledger?.total).toBe(time)
  })
})

test('the state at a time does not hang on the other times asked for', () => {
  holds(fc.tuple(wide(), hours, fc.array(hours, { maxLength: 4 })), ([w, h, others]) => {
    const alone = trace(fileOf(w), [h])
    const among = trace(fileOf(w), [...others, h])
    const i = others.length
    expect(apart(alone.substrate[0] ?? 0, among.substrate[i] ?? 0)).toBeLessThan(1e-8)
    expect(Math.abs((alone.conversion[0] ?? 0) - (among.conversion[i] ?? 0))).toBeLessThan(1e-9)
    expect(apart(alone.enzyme[0] ?? 0, among.enzyme[i] ?? 0)).toBeLessThan(1e-7)
    expect(among.temperature[i]).toBe(alone.temperature[0])
  })
})

test('everything scaled by one factor takes the same time', () => {
  holds(fc.tuple(wide(), decades(-3, 3)), ([w, factor]) => {
    const scaled = <T extends number | undefined>(K: T): T => (K === undefined ? K : K * factor) as T
    const larger = {
      ...w,
      S0: scaled(w.S0),
      P0: scaled(w.P0),
      Km: scaled(w.Km),
      dose: scaled(w.dose),
      ...(w.Kic !== undefined && { Kic: scaled(w.Kic) }),
      ...(w.Kiu !== undefined && { Kiu: scaled(w.Kiu) }),
      ...(w.Ksi !== undefined && { Ksi: scaled(w.Ksi) }),
      ...(w.loss && {
        loss: { ...w.loss, ...(w.loss.Kp !== undefined && { Kp: scaled(w.loss.Kp) }) },
      }),
    }
    const one = answerTo(fileOf(w))
    const other = answerTo(fileOf(larger))
    fc.pre(magnified(one) < 1e6)
    expect(other.reachable).toBe(one.reachable)
    if (one.reachable) expect(apart(one.time ?? 0, other.time ?? 0)).toBeLessThan(1e-8 * magnified(one))
    else expect(Math.abs((one.limitingConversion ?? 0) - (other.limitingConversion ?? 0))).toBeLessThan(1e-8)
  })
})
