/** What everybody in the trade knows of enzymes (common practice, no source), as the answers show it. */
import { expect, test } from 'vitest'
import { answerTo, asking, type File, type Json } from './asking.ts'

/** A milk lactase of common magnitude; invented. */
const batch = (more: { [key: string]: Json } = {}, programme: Json = warm): File => ({
  format: 'dosewright-scenario',
  version: 1,
  feed: {
    volume: '10 m3',
    substrate: { concentration: '45 g/L' },
    product: { massYield: 0.5263, concentration: '0 g/L' },
  },
  enzyme: {
    rate: {
      specificRate: '60 g/g/h',
      reference: { temperature: '30 degC', pH: 6.7 },
      Km: '8 g/L',
    },
    temperature: { Q10: 2, from: '20 degC' },
    pH: { pKa1: 5.4, pKa2: 8 },
    inactivation: { kd: '0.05 1/h', at: '45 degC', Ea: '260 kJ/mol' },
    ...more,
  },
  programme,
  ask: { find: 'time', conversion: 0.5 },
})

const warm: Json = { temperature: '30 degC', pH: 6.7, dose: '2 kg' }
const at = (temperature: number, dose = 2, pH = 6.7): Json => ({
  temperature: `${temperature} degC`,
  pH,
  dose: `${dose} kg`,
})
const timeOf = (file: File): number => answerTo(file).time ?? Number.POSITIVE_INFINITY
const course = (file: File, hours: readonly number[]) => {
  const { trace } = answerTo(asking(file, { find: 'trace', at: hours.map((h) => `${h} h`) }))
  if (!trace) throw new Error('a trace without columns')
  return trace
}

test('ten kelvin more double the rate, below the heat that kills', () => {
  expect(timeOf(batch({}, at(20))) / timeOf(batch({}, at(30)))).toBeCloseTo(2, 1)
})

test('the speed rises with temperature, peaks, and falls steeply to nothing', () => {
  const speeds = [10, 20, 30, 40, 50, 60, 70, 80].map((T) => 1 / timeOf(batch({}, at(T))))
  const peak = speeds.indexOf(Math.max(...speeds))
  expect(peak).toBeGreaterThan(2)
  expect(peak).toBeLessThan(7)
  for (let i = 1; i <= peak; i++) expect(speeds[i]).toBeGreaterThan(speeds[i - 1] as number)
  for (let i = peak + 1; i < speeds.length; i++)
    expect(speeds[i]).toBeLessThanOrEqual(speeds[i - 1] as number)
  expect(speeds[speeds.length - 1]).toBe(0)
})

test('cold slows an enzyme and does not destroy it', () => {
  const phases = (cold: string): Json => ({
    start: { temperature: '30 degC', pH: 6.7 },
    phases: [
      { phase: 'dose', amount: '2 kg' },
      { phase: 'cool', to: cold },
      { phase: 'hold', for: '24 h' },
      { phase: 'heat', to: '30 degC' },
      { phase: 'hold', for: '1 h' },
    ],
  })
  const { enzyme } = course(batch({}, phases('2 degC')), [0, 24])
  expect((enzyme[1] as number) / (enzyme[0] as number)).toBeGreaterThan(0.999)
  const inTheCold = course(batch({}, phases('2 degC')), [1]).conversion[0] as number
  const inTheWarm = course(batch({}, phases('30 degC')), [1]).conversion[0] as number
  expect(inTheCold).toBeLessThan(0.2 * inTheWarm)
})

test('rate against pH is a bell around an optimum of the enzyme’s own', () => {
  const speed = (pH: number): number => 1 / timeOf(batch({}, at(30, 2, pH)))
  expect(speed(6.7)).toBeGreaterThan(speed(5.7))
  expect(speed(6.7)).toBeGreaterThan(speed(7.7))
  expect(speed(5.7)).toBeGreaterThan(speed(4.7))
  expect(speed(5.7) / speed(7.7)).toBeCloseTo(1, 2)
})

test('a stomach enzyme has its best near pH 2', () => {
  const stomach = { pH: { pKa1: 1.1, pKa2: 3.1 } }
  const speeds = [1, 1.5, 2, 2.5, 3, 4, 7].map((pH) => 1 / timeOf(batch(stomach, at(30, 2, pH))))
  expect(speeds.indexOf(Math.max(...speeds))).toBe(2)
  expect(speeds[6]).toBeLessThan(0.001 * (speeds[2] as number))
})

test('a small pH excursion is reversible', () => {
  const excursion: Json = {
    start: { temperature: '30 degC', pH: 6.7 },
    phases: [
      { phase: 'adjust', pH: 5.2 },
      { phase: 'adjust', pH: 6.7 },
      { phase: 'dose', amount: '2 kg' },
      { phase: 'hold', for: '100 h' },
    ],
  }
  expect(timeOf(batch({}, excursion)) / timeOf(batch())).toBeCloseTo(1, 9)
})

/** Substrate far above Km, and far below it. */
const withSubstrate = (file: File, concentration: string): File => ({
  ...file,
  feed: {
    volume: '10 m3',
    substrate: { concentration },
    product: { massYield: 0.5263, concentration: '0 g/L' },
  },
})

test('with substrate in excess twice the enzyme is twice the rate', () => {
  const early = (dose: number): number =>
    course(withSubstrate(batch({}, at(30, dose)), '400 g/L'), [0.1]).conversion[0] as number
  expect(early(4) / early(2)).toBeCloseTo(2, 2)
})

test('with enzyme in excess more enzyme gains nothing', () => {
  const done = (dose: number): number => course(batch({}, at(30, dose)), [4]).conversion[0] as number
  expect(done(400) - done(200)).toBeLessThan(1e-6)
})

test('at high substrate the rate levels off at its maximum', () => {
  const rate = (S0: number): number =>
    S0 * (course(withSubstrate(batch(), `${S0} g/L`), [0.01]).conversion[0] as number)
  expect(rate(2) / rate(1)).toBeGreaterThan(1.7)
  expect(rate(2000) / rate(1000)).toBeLessThan(1.01)
})

test('a catalyst is not used up by the reaction itself', () => {
  const stable = { inactivation: { kd: '0 1/h', at: '45 degC', Ea: '0 kJ/mol' } }
  const { enzyme, conversion } = course(batch(stable), [0, 100])
  expect(conversion[1]).toBeGreaterThan(0.99)
  expect(enzyme[1]).toBe(enzyme[0])
})
