/** Two thousand absurd but legal scenarios, through the reader, the engine and the writers. */
import fc from 'fast-check'
import { expect, test } from 'vitest'
import { failureSentence, readableAnswer, readScenario, writeAnswer } from '../../app/contract/index.ts'
import { plan } from '../../engine/index.ts'
import { absurd } from './absurd-scenarios.ts'
import { answerTo, asking, type File, type Json, notFinite } from './asking.ts'
import { seed } from './holding.ts'

/** Steps of one answer and its check; what searches spend beside is bounded by the engine. */
const mostSteps = 500_000

/** 'answer', 'sentence' or, where a list grew too long for the reader, 'refused'. */
function treated(file: File): 'answer' | 'sentence' | 'refused' {
  const read = readScenario(JSON.stringify(file))
  if (!read.ok) return 'refused'
  const outcome = plan(read.value.scenario)
  if (!outcome.ok) {
    expect(failureSentence(outcome.failure)).toMatch(/\w/)
    expect(failureSentence(outcome.failure)).not.toMatch(/NaN|Infinity|undefined/)
    return 'sentence'
  }
  expect(notFinite(writeAnswer(outcome.value, read.value))).toEqual([])
  expect(readableAnswer(outcome.value, read.value)).not.toMatch(/NaN|Infinity|undefined/)
  const { stepsAccepted, stepsRejected } = outcome.value.work
  expect(stepsAccepted + stepsRejected).toBeLessThan(mostSteps)
  return 'answer'
}

test.each([0, 1, 2, 3])(
  'five hundred absurd scenarios get an answer or a sentence, part %i',
  (part) => {
    console.info(`seed ${seed + part}`)
    const count = { answer: 0, sentence: 0, refused: 0 }
    for (const file of fc.sample(absurd, { seed: seed + part, numRuns: 500 })) {
      try {
        count[treated(file)]++
      } catch (cause) {
        throw new Error(JSON.stringify(file), { cause })
      }
    }
    // Most have an answer: the engine does not take refuge in sentences.
    expect(count.answer).toBeGreaterThan(400)
    expect(count.refused).toBeLessThan(10)
  },
  300_000,
)

const batch = (enzyme: { readonly [key: string]: Json }, programme: Json): File => ({
  format: 'dosewright-scenario',
  version: 1,
  feed: {
    volume: '12 m3',
    substrate: { concentration: '45 g/L' },
    product: { massYield: 0.5263, concentration: '0 g/L' },
  },
  enzyme: {
    rate: { specificRate: '95 g/g/h', reference: { temperature: '40 degC', pH: 6.7 }, Km: '8 g/L' },
    temperature: { Ea: '45 kJ/mol' },
    ...enzyme,
  },
  programme,
  ask: { find: 'time', conversion: 0.95 },
})
const short: Json = { temperature: '40 degC', pH: 6.7, dose: '3.5 kg' }

test('an enzyme that dies at once converts nothing', () => {
  const answer = answerTo(batch({ inactivation: { kd: '1e30 1/h', at: '40 degC', Ea: '0 J/mol' } }, short))
  expect(answer.reachable).toBe(false)
  expect(answer.limitingConversion).toBeGreaterThanOrEqual(0)
  expect(answer.limitingConversion).toBeLessThan(1e-25)
})

test('a reaction that stands still at 1 K takes beyond doubles, and says so or never gets there', () => {
  expect(treated(batch({}, { temperature: '1 K', pH: 6.7, dose: '3.5 kg' }))).toBeTypeOf('string')
  const cold = answerTo(batch({}, { temperature: '50 K', pH: 6.7, dose: '3.5 kg' }))
  expect(cold.reachable).toBe(true)
  expect(cold.warnings.map(({ code }) => code)).toContain('very-long')
})

test('a bell a thousand pH units away keeps its ratio', () => {
  const far = answerTo(batch({ pH: { pKa1: -1000, pKa2: -1000 } }, short))
  const without = answerTo(batch({}, short))
  expect(far.time).toBe(without.time)
})

test('a product that inhibits beyond all measure makes a time beyond all measure', () => {
  const rate = { specificRate: '95 g/g/h', reference: { temperature: '40 degC', pH: 6.7 }, Km: '8 g/L' }
  const answer = answerTo(batch({ rate: { ...rate, Kic: '1e-30 g/L' } }, short))
  expect(answer.reachable).toBe(true)
  expect(answer.time).toBeGreaterThan(1e30)
})

test('the state after 1e300 s is the state of rest', () => {
  const file = batch({ inactivation: { kd: '0.1 1/h', at: '40 degC', Ea: '200 kJ/mol' } }, short)
  const { trace } = answerTo(asking(file, { find: 'trace', at: ['1e300 s'] }))
  const never = answerTo(asking(file, { find: 'time', conversion: 1 - 1e-15 }))
  expect(trace?.enzyme[0]).toBe(0)
  expect(trace?.conversion[0]).toBeCloseTo(never.limitingConversion ?? 0, 12)
})

test('a thousand phases of heating and cooling are gone through', () => {
  const phases: Json[] = [{ phase: 'dose', amount: '3.5 kg' }]
  for (let n = 0; n < 499; n++)
    phases.push(
      { phase: 'heat', to: '60 degC', ramp: '1 K/min' },
      { phase: 'cool', to: '20 degC', ramp: '1 K/min' },
    )
  const file = batch(
    { inactivation: { kd: '0.001 1/h', at: '40 degC', Ea: '200 kJ/mol' } },
    { start: { temperature: '20 degC', pH: 6.7 }, phases },
  )
  expect(answerTo(file).check.relativeDifference).toBeLessThan(1e-6)
}, 60_000)
