import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { rateConstant } from '../../../engine/kinetics/arrhenius.ts'
import { phInactivationFactor } from '../../../engine/kinetics/ph-inactivation.ts'
import { resistance } from '../../../engine/kinetics/rate-law.ts'
import { activeShare } from '../../../engine/kinetics/reversible-loss.ts'
import { protectedShare } from '../../../engine/kinetics/substrate-protection.ts'
import { fractionPath } from '../../../engine/solve/fraction-path.ts'
import { protectedLoss, protectedTime } from '../../../engine/solve/protected-time.ts'
import { reactionPath } from '../../../engine/solve/reaction-path.ts'
import { celsius, kilojoulesPerMole, quantity } from '../../../engine/units/quantity.ts'

/** Romberg's rule: nothing in common with the Gauss–Legendre rules and closed forms that it is held against. */
function romberg(f: (x: number) => number, end: number, levels = 12): number {
  let rows: number[] = []
  for (let level = 0; level <= levels; level++) {
    const n = 2 ** level
    let sum = 0.5 * (f(0) + f(end))
    for (let i = 1; i < n; i++) sum += f((end * i) / n)
    const row = [(sum * end) / n]
    for (let j = 1; j <= level; j++)
      row.push((row[j - 1] as number) + ((row[j - 1] as number) - (rows[j - 1] as number)) / (4 ** j - 1))
    rows = row
  }
  return rows[Math.min(8, levels)] as number
}

describe('reversible loss at high temperature (two-state van ’t Hoff)', () => {
  const half = celsius(60)
  const energy = kilojoulesPerMole(300)

  test('is one half at its temperature', () => {
    expect(activeShare(half, energy, half)).toBe(0.5)
  })

  test('at any other has the ratio that the equilibrium constant gives (closed form)', () => {
    const T = celsius(55)
    const K = Math.exp((300000 / 8.31446261815324) * (1 / half - 1 / T))
    expect(activeShare(half, energy, T)).toBeCloseTo(1 / (1 + K), 14)
  })

  test('falls with temperature', () => {
    fc.assert(
      fc.property(fc.double({ min: 280, max: 370, noNaN: true }), (T) => {
        expect(activeShare(half, energy, quantity(T))).toBeGreaterThanOrEqual(
          activeShare(half, energy, quantity(T + 1)),
        )
      }),
    )
  })
})

test('substrate at Kp halves the loss of enzyme (binding of one site)', () => {
  expect(protectedShare(7, 7)).toBe(0.5)
  expect(protectedShare(7, 0)).toBe(1)
})

test('inactivation by acid and alkali is 1 where it was measured, tenfold a pH unit beyond the pK (closed form)', () => {
  const effect = { pKa1: 4, pKa2: 9, at: 6.5 }
  expect(phInactivationFactor(effect, 6.5)).toBe(1)
  expect(phInactivationFactor(effect, 1) / phInactivationFactor(effect, 2)).toBeCloseTo(
    (1 + 1e3 + 1e-8) / (1 + 1e2 + 1e-7),
    12,
  )
})

test('a rate constant stays a number where its factors leave the range of doubles', () => {
  const k = rateConstant(1e-250, 1e7, 300)
  expect(k(310)).toBe(1e200)
  // 1e−250·e^(1e7·(1/300 − 1/301)) = 1e−250·e^110.74197…: within range, known in logarithms.
  expect(Math.log(k(301))).toBeCloseTo(-250 * Math.LN10 + (1e7 * 1) / (301 * 300), 9)
})

describe('a substrate with a slow fraction', () => {
  const law = { Km: 8, Kic: 5, Kiu: 60, Ksi: 200 }
  const charge = { S0: 45, P0: 2, massYield: 0.526 }

  test('demands the enzyme-time that a quadrature of its denominator gives', () => {
    const path = fractionPath(law, charge, { share: 0.3, relativeRate: 0.15 })
    for (const conversion of [0.05, 0.5, 0.9, 0.99]) {
      const u = path.coordinate(conversion) as number
      const D = (at: number): number =>
        resistance(law, path.substrate(at), charge.P0 + charge.massYield * path.consumed(at))
      expect(path.demand(u) / romberg(D, u)).toBeCloseTo(1, 11)
      expect(path.consumed(u) / charge.S0).toBeCloseTo(conversion, 13)
    }
  })

  test('as fast as the rest is a uniform one', () => {
    const path = fractionPath(law, charge, { share: 0.4, relativeRate: 1 })
    const uniform = reactionPath(law, charge)
    const u = uniform.coordinate(0.9) as number
    expect(path.coordinate(0.9)).toBeCloseTo(u, 12)
    expect(path.demand(u) / uniform.demand(u)).toBeCloseTo(1, 13)
  })
})

describe('an enzyme that substrate protects', () => {
  const path = reactionPath({ Km: 8, Kic: 5, Ksi: 300 }, { S0: 45, P0: 0, massYield: 0.526 })
  const decay = { k: 20, kd: 0.4, Kp: 12 }
  const loss = (u: number): number =>
    ((decay.kd / decay.k) * path.demandSlope(u)) / (1 + path.substrate(u) / decay.Kp)

  test('loses and takes what nested quadratures give', () => {
    const u = path.coordinate(0.95) as number
    expect(protectedLoss(path, decay, u) / romberg(loss, u)).toBeCloseTo(1, 12)
    const left = (at: number): number => 2 - (at === 0 ? 0 : romberg(loss, at, 8))
    const time = romberg((at) => path.demandSlope(at) / (decay.k * left(at)), u, 9)
    expect(protectedTime(path, decay, 2, u) / time).toBeCloseTo(1, 10)
  })

  test('without protection takes the closed-form time', () => {
    const u = path.coordinate(0.9) as number
    const bare = { ...decay, Kp: 1e300 }
    const x = (decay.kd * path.demand(u)) / (decay.k * 3)
    expect(protectedTime(path, bare, 3, u) / (-Math.log1p(-x) / decay.kd)).toBeCloseTo(1, 12)
  })

  test('never arrives from less than the least dose', () => {
    const u = path.coordinate(0.9) as number
    const least = protectedLoss(path, decay, u)
    expect(protectedTime(path, decay, 0.999 * least, u)).toBe(Number.POSITIVE_INFINITY)
    expect(protectedTime(path, decay, 1.001 * least, u)).toBeLessThan(1e6)
  })
})
