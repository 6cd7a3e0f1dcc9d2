/** An answer as the engine gives it, with every part, for tests of how answers are written. */
import { type ReadScenario, readScenario } from '../../../app/contract/index.ts'
import { type Answer, celsius, hours, type Mass, quantity } from '../../../engine/index.ts'
import { edited, type Json, phased, shortForm } from './scenarios.ts'

/** Reads a scenario that is known to be sound. */
export const sound = (
  source: { [key: string]: Json },
  ...edits: [string, Json | undefined][]
): ReadScenario => {
  const read = readScenario(JSON.stringify(edited(source, ...edits)))
  if (!read.ok) throw new Error(JSON.stringify(read.failure))
  return read.value
}

export const asked = sound(shortForm())
export const askedInPhases = sound(phased())

const kg = (value: number): Mass => quantity<Mass>(value)

/** 95 % after 9.412 h with 3.5 kg. */
export const fullAnswer: Answer = {
  ask: asked.scenario.ask,
  reachable: true,
  time: hours(9.412),
  dose: kg(3.5),
  temperature: celsius(42),
  conversion: 0.95,
  cost: { value: 1012.149, currency: 'EUR' },
  limitingConversion: 0.987,
  leastDose: kg(2.532),
  trace: {
    time: Float64Array.of(0, 3600),
    substrate: Float64Array.of(45, 27.8),
    product: Float64Array.of(0, 9.05),
    enzyme: Float64Array.of(0.2917, 0.2535),
    temperature: Float64Array.of(315.15, 315.15),
    pH: Float64Array.of(6.7, 6.7),
    volume: Float64Array.of(12, 12),
    conversion: Float64Array.of(0, 0.3822),
  },
  check: { method: 'ode-explicit', relativeDifference: 1.3e-10 },
  precision: { amplification: 12.5, digits: 4 },
  hours: {
    total: hours(9.412),
    lines: [
      { cause: 'saturated', time: hours(1.4) },
      { cause: 'product-inhibition', time: hours(4.012) },
      { cause: 'enzyme-loss', time: hours(4) },
      { cause: 'heating', time: hours(0) },
    ],
    largestAvoidable: 'product-inhibition',
  },
  remedies: [
    { kind: 'more-dose', dose: kg(4.2), time: hours(6.59) },
    { kind: 'cooler', temperature: celsius(39), time: hours(7.59) },
    { kind: 'staged', doses: 3, each: kg(1.2), every: hours(2), time: hours(8) },
  ],
  killStep: { residualActivity: 0.0123, logReduction: 1.91 },
  work: { stepsAccepted: 75, stepsRejected: 1, rateEvaluations: 836, jacobians: 0 },
  massBalance: 1e-15,
  warnings: [{ code: 'kill-step-incomplete', residualActivity: 0.0123 }],
}
