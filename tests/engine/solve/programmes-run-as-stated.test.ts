import { describe, expect, test } from 'vitest'
import { type Answer, plan } from '../../../engine/index.ts'
import type { Ask, Enzyme, Phase, Scenario } from '../../../engine/scenario.ts'
import {
  celsius,
  gramsPerLitre,
  hours,
  kilojoulesPerMole,
  minutes,
  perHour,
  quantity,
} from '../../../engine/units/quantity.ts'

const enzyme: Enzyme = {
  rate: {
    specificRate: quantity(90 / 3600),
    reference: { temperature: celsius(40), pH: 6.7 },
    Km: gramsPerLitre(8),
    Kic: gramsPerLitre(6),
  },
  temperature: { Ea: kilojoulesPerMole(45) },
  pH: { pKa1: 5.4, pKa2: 8 },
  inactivation: { steps: [{ kd: perHour(0.08), at: celsius(40), Ea: kilojoulesPerMole(230) }] },
}

const scenario = (phases: readonly Phase[], ask: Ask, more: Partial<Scenario> = {}): Scenario => ({
  feed: {
    volume: quantity(10),
    substrate: { concentration: gramsPerLitre(45) },
    product: { massYield: 0.5263, concentration: gramsPerLitre(0) },
  },
  enzyme,
  programme: { kind: 'phases', start: { temperature: celsius(10), pH: 6.7 }, phases, countDoseVolume: false },
  ask,
  ...more,
})

const answer = (of: Scenario): Answer => {
  const outcome = plan(of)
  if (!outcome.ok) throw new Error(outcome.failure.kind)
  return outcome.value
}

const trace = (phases: readonly Phase[], at: readonly number[], more: Partial<Scenario> = {}) => {
  const found = answer(scenario(phases, { find: 'trace', at: at.map((t) => quantity(t)) }, more)).trace
  if (!found) throw new Error('no trace')
  return found
}

const dose = (kg: number): Phase => ({ phase: 'dose', amount: quantity(kg) })
const hold = (h: number): Phase => ({ phase: 'hold', for: hours(h) })

describe('temperature', () => {
  test('rises along a ramp and stays at the set point', () => {
    const { temperature } = trace(
      [dose(3), { phase: 'heat', to: celsius(40), ramp: quantity(0.5 / 60) }, hold(1)],
      [0, 1800, 3600, 5000],
    )
    expect([...temperature].map((T) => T - 273.15)).toEqual([10, 25, 40, 40].map((T) => expect.closeTo(T, 9)))
  })

  test('approaches a jacket by its first-order law (closed form)', () => {
    // T = 60 − 50·e^(−t/30 min) from 10 °C; 40 °C is reached at 30 min·ln(50/20).
    const heat: Phase = {
      phase: 'heat',
      to: celsius(40),
      jacket: { temperature: celsius(60), timeConstant: minutes(30) },
    }
    const reached = 1800 * Math.log(50 / 20)
    const { temperature } = trace([dose(3), heat, hold(1)], [600, reached, reached + 600])
    expect((temperature[0] as number) - 273.15).toBeCloseTo(60 - 50 * Math.exp(-600 / 1800), 9)
    expect((temperature[1] as number) - 273.15).toBeCloseTo(40, 9)
    expect((temperature[2] as number) - 273.15).toBeCloseTo(40, 9)
  })

  test('follows the ramp until the jacket is slower than it', () => {
    // 1 K/min until the jacket’s own pace (60 − T)/30 min falls to it, at 30 °C after 20 min.
    const heat: Phase = {
      phase: 'heat',
      to: celsius(50),
      ramp: quantity(1 / 60),
      jacket: { temperature: celsius(60), timeConstant: minutes(30) },
    }
    const { temperature } = trace([dose(3), heat], [600, 1200, 1200 + 1800])
    expect((temperature[0] as number) - 273.15).toBeCloseTo(20, 9)
    expect((temperature[1] as number) - 273.15).toBeCloseTo(30, 9)
    expect((temperature[2] as number) - 273.15).toBeCloseTo(60 - 30 * Math.exp(-1), 9)
  })
})

describe('a moment', () => {
  const phases = [dose(2), { phase: 'heat', to: celsius(40) } as Phase, hold(1), dose(1), hold(2)]

  test('of a dose shows the state after it, within a microsecond too', () => {
    const { enzyme: E } = trace(phases, [0, 3600 - 0.5e-6, 3600, 3600 + 0.5e-6])
    expect(E[0]).toBeCloseTo(0.2, 12)
    expect(E[1]).toBeCloseTo(E[2] as number, 9)
    expect(E[3]).toBeCloseTo(E[2] as number, 9)
    expect((E[2] as number) - 0.2 * Math.exp(-0.08)).toBeCloseTo(0.1, 12)
  })

  test('after the last phase has its conditions going on', () => {
    const { enzyme: E } = trace(phases, [3 * 3600, 7 * 3600])
    expect((E[1] as number) / (E[0] as number)).toBeCloseTo(Math.exp(-0.08 * 4), 12)
  })

  test('is answered in the order asked, twice if asked twice', () => {
    const sorted = trace(phases, [0, 3600, 7200])
    const asked = trace(phases, [7200, 0, 3600, 7200])
    const substrates = [sorted.substrate[2], sorted.substrate[0], sorted.substrate[1], sorted.substrate[2]]
    expect([...asked.substrate]).toEqual(substrates.map((S) => expect.closeTo(S as number, 9)))
  })
})

describe('a hold until a conversion', () => {
  const until = (conversion: number, atMost: number): Phase => ({
    phase: 'hold',
    until: { conversion },
    atMost: hours(atMost),
  })
  const warm: Phase = { phase: 'heat', to: celsius(40) }

  test('ends when it is reached, and what follows comes earlier', () => {
    const reached = answer(scenario([dose(3), warm, hold(24)], { find: 'time', conversion: 0.8 }))
      .time as number
    const { conversion, temperature } = trace(
      [dose(3), warm, until(0.8, 24), { phase: 'cool', to: celsius(5) }],
      [reached - 60, reached + 60],
    )
    expect(conversion[0]).toBeLessThan(0.8)
    expect(conversion[1]).toBeGreaterThan(0.8)
    expect(temperature[0]).toBeCloseTo(313.15, 9)
    expect(temperature[1]).toBeCloseTo(278.15, 9)
  })

  test('ends at its limit when the conversion does not come', () => {
    const { temperature } = trace(
      [dose(3), warm, until(0.99, 0.5), { phase: 'cool', to: celsius(5) }],
      [1799, 1801],
    )
    expect([...temperature]).toEqual([expect.closeTo(313.15, 9), expect.closeTo(278.15, 9)])
  })

  test('lets the dose be found that just makes it by the end', () => {
    const phases = [dose(1), warm, until(0.9, 4), { phase: 'cool', to: celsius(5) } as Phase]
    const found = answer(scenario(phases, { find: 'dose', conversion: 0.9, within: hours(4) }))
    const plain = answer(
      scenario([dose(1), warm, hold(4)], { find: 'dose', conversion: 0.9, within: hours(4) }),
    )
    expect((found.dose as number) / (plain.dose as number)).toBeCloseTo(1, 9)
  })
})

describe('the volume of a dose', () => {
  test('dilutes what is in the vessel when it is to be counted (mass balance)', () => {
    const counted = trace([dose(115), hold(1)], [0], {
      enzyme: { ...enzyme, density: quantity(1150) },
      programme: {
        kind: 'phases',
        start: { temperature: celsius(10), pH: 6.7 },
        phases: [dose(115), hold(1)],
        countDoseVolume: true,
      },
    })
    expect(counted.volume[0]).toBeCloseTo(10.1, 12)
    expect(counted.substrate[0]).toBeCloseTo(450 / 10.1, 10)
    expect(counted.enzyme[0]).toBeCloseTo(115 / 10.1, 10)
  })
})

describe('a pH adjustment', () => {
  test('changes the rate by the ratio of the bell, and back', () => {
    const bell = (pH: number): number => 1 / (1 + 10 ** (5.4 - pH) + 10 ** (pH - 8))
    const stable: Partial<Scenario> = {
      enzyme: {
        ...enzyme,
        inactivation: { steps: [{ kd: perHour(0), at: celsius(40), Ea: kilojoulesPerMole(0) }] },
      },
    }
    const at = (phases: readonly Phase[]): number =>
      answer(scenario(phases, { find: 'time', conversion: 0.5 }, stable)).time as number
    const plain = at([dose(3), hold(400)])
    const acid = at([{ phase: 'adjust', pH: 4.5 }, dose(3), hold(4000)])
    expect(acid / plain).toBeCloseTo(bell(6.7) / bell(4.5), 9)
    const back = at([{ phase: 'adjust', pH: 4.5 }, { phase: 'adjust', pH: 6.7 }, dose(3), hold(400)])
    expect(back / plain).toBeCloseTo(1, 12)
  })
})

describe('a kill step', () => {
  test('leaves what first-order inactivation leaves at its temperature (closed form)', () => {
    const kill: Phase = { phase: 'inactivate', to: celsius(60), hold: minutes(10) }
    const { killStep } = answer(scenario([dose(3), hold(1), kill], { find: 'time', conversion: 0.01 }))
    const R = 8.31446261815324
    const kd = 0.08 * Math.exp((-230000 / R) * (1 / 333.15 - 1 / 313.15))
    expect(killStep?.logReduction).toBeCloseTo((kd / 6) * Math.LOG10E, 9)
  })
})

describe('the hours', () => {
  test('of a staged, heated programme sum to the time', () => {
    const { hours: ledger, time } = answer(
      scenario(
        [dose(2), { phase: 'heat', to: celsius(40), ramp: quantity(0.5 / 60) }, hold(1), dose(1.5), hold(20)],
        { find: 'time', conversion: 0.9 },
      ),
    )
    const sum = ledger?.lines.reduce((total, line) => total + line.time, 0) ?? 0
    expect(Math.abs(sum / (time as number) - 1)).toBeLessThan(1e-13)
    const of = (cause: string): number => ledger?.lines.find((line) => line.cause === cause)?.time ?? 0
    expect(of('heating')).toBeGreaterThan(0)
    expect(of('staging')).toBeGreaterThan(0)
  })

  test('name the terms of the integrated law (closed form)', () => {
    const { hours: ledger } = answer({
      ...scenario([], { find: 'time', conversion: 0.9 }),
      programme: {
        kind: 'constant',
        temperature: celsius(40),
        pH: 6.7,
        dose: quantity(3),
        countDoseVolume: false,
      },
    })
    const of = (cause: string): number =>
      ledger?.lines.find((line) => line.cause === cause)?.time ?? Number.NaN
    const supply = (90 / 3600) * 0.3
    expect(of('saturated') * supply).toBeCloseTo(45 * 0.9, 9)
    expect(of('substrate-short') * supply).toBeCloseTo(8 * Math.log(10), 9)
    expect(of('product-inhibition') * supply).toBeCloseTo((8 / 6) * 0.5263 * 45 * (Math.log(10) - 0.9), 9)
    expect(of('pH')).toBeCloseTo(0, 9)
  })
})

test('costs are enzyme and vessel time with turnaround', () => {
  const { cost, time } = answer(
    scenario(
      [dose(3), { phase: 'heat', to: celsius(40) }, hold(20)],
      { find: 'time', conversion: 0.8 },
      {
        costs: { currency: 'EUR', enzyme: 30, vessel: 85 / 3600, turnaround: minutes(90) },
      },
    ),
  )
  expect(cost?.value).toBeCloseTo(30 * 3 + 85 * ((time as number) / 3600 + 1.5), 9)
})

test('after a kill step the conversion stays where it was (first-order loss to nothing)', () => {
  const phases: Phase[] = [
    dose(3),
    { phase: 'heat', to: celsius(40) },
    hold(3),
    { phase: 'inactivate', to: celsius(90), ramp: quantity(1 / 60), hold: minutes(10) },
    { phase: 'cool', to: celsius(8), ramp: quantity(1 / 60) },
  ]
  const { conversion, product } = trace(phases, [3 * 3600, 4 * 3600, 5 * 3600, 9 * 3600])
  expect(conversion[1]).toBeGreaterThan(conversion[0] as number)
  expect(conversion[2]).toBe(conversion[1])
  expect(conversion[3]).toBe(conversion[1])
  expect(product[3]).toBeCloseTo(0.5263 * 45 * (conversion[1] as number), 9)
})

describe('near the edge of reachability', () => {
  const R = 8.31446261815324
  const kd = (0.08 / 3600) * Math.exp((-230000 / R) * (1 / 318.15 - 1 / 313.15))
  const k = (90 / 3600) * Math.exp((-45000 / R) * (1 / 318.15 - 1 / 313.15))
  const demand = 45 * 0.9 + 8 * Math.log(10) + (8 / 6) * 0.5263 * 45 * (Math.log(10) - 0.9)

  test.each([0.5, 0.9, 0.9999, 1 - 1e-7])(
    'a batch that is stepped magnifies errors as x/((1 − x)(−ln(1 − x))) says, x = %f (closed form)',
    (x) => {
      const { precision } = answer({
        ...scenario([], { find: 'time', conversion: 0.9 }),
        // A dose so dense that its counted volume is nothing: stepped, and yet the closed form holds.
        enzyme: { ...enzyme, density: quantity(1e12) },
        programme: {
          kind: 'constant',
          temperature: celsius(45),
          pH: 6.7,
          dose: quantity((10 * kd * demand) / (k * x)),
          countDoseVolume: true,
        },
      })
      const magnified = x / ((1 - x) * -Math.log1p(-x))
      expect((precision?.amplification ?? 0) / magnified).toBeGreaterThan(0.95)
      expect((precision?.amplification ?? 0) / magnified).toBeLessThan(1.05)
    },
  )
})
