import { expect, test } from 'vitest'
import {
  failureSentence,
  hoursCauseSentence,
  remedySentence,
  warningSentence,
} from '../../../app/contract/index.ts'
import {
  celsius,
  type HoursCause,
  hours,
  type Mass,
  type PlanFailure,
  quantity,
  type Remedy,
  type Warning,
} from '../../../engine/index.ts'

const time = hours(6.5)

test.each<[Warning, string]>([
  [
    { code: 'near-the-edge', amplification: 1234, digits: 2 },
    'The answer lies near the edge of what can be reached: a small error of a constant is magnified 1234 times, which leaves about 2 good digits.',
  ],
  [
    { code: 'optimum-at-bound', temperature: celsius(60) },
    'The best temperature lies at a bound of the range asked, 60 °C; beyond it may be better still.',
  ],
  [
    { code: 'fed-after-target', until: hours(2) },
    'The target is met before all of the feed is in: feeding goes on for 2 h and takes the conversion down again.',
  ],
  [
    { code: 'hold-shorter-than-time', hold: hours(5), time },
    'The programme holds for 5 h, but the target takes 6.5 h.',
  ],
  [
    { code: 'far-from-measured', measured: celsius(20), used: celsius(55) },
    'The rate was measured at 20 °C and is carried over to 55 °C; an assay nearer to the process is worth having.',
  ],
  [
    { code: 'routes-disagree', relativeDifference: 0.012 },
    'The two independent routes to this answer differ by 1.2 %; do not rely on it before the cause is known.',
  ],
  [
    { code: 'check-failed', failure: 'too-many-steps' },
    'The independent check gave up: it took too many steps. The answer stands on one route alone.',
  ],
  [
    { code: 'beyond-equilibrium', equilibriumConversion: 0.859 },
    'The target lies beyond the equilibrium, which is at 85.9 % conversion.',
  ],
  [
    { code: 'hours-not-split', temperature: celsius(52) },
    'Where the hours go cannot be told: held at 52 °C from the first dose the batch would never get there.',
  ],
  [
    { code: 'very-long', time: hours(12345) },
    'The time, 12345 h, is longer than anybody waits; take it as "not in practice".',
  ],
])('warning %j', (warning, sentence) => {
  expect(warningSentence(warning)).toBe(sentence)
})

test.each<[Remedy, string]>([
  [{ kind: 'warmer', temperature: celsius(45), time }, 'Warmer, at 45 °C, the target takes 6.5 h.'],
  [{ kind: 'lower-target', conversion: 0.93, time }, 'A target of 93 % conversion takes 6.5 h.'],
  [
    { kind: 'less-inhibition', time },
    'With half the inhibition (product taken away as it forms, or another enzyme) the target takes 6.5 h.',
  ],
  [{ kind: 'better-pH', pH: 6.65, time }, 'At pH 6.65 the target takes 6.5 h.'],
  [
    { kind: 'longer-hold', extra: hours(1.5), time },
    'With 1.5 h more of the last hold before cooling or killing the target takes 6.5 h.',
  ],
  [
    { kind: 'sooner', time },
    "With all doses given at the programme's start, before anything else, the target takes 6.5 h.",
  ],
  [{ kind: 'more-dose', dose: quantity<Mass>(4.2), time }, 'With a dose of 4.2 kg the target takes 6.5 h.'],
])('remedy %j', (remedy, sentence) => {
  expect(remedySentence(remedy)).toBe(sentence)
})

test.each<[PlanFailure, string]>([
  [
    { kind: 'rate-not-finite', time: 3600, component: 0 },
    'the rate stops being a finite number 1 h into the programme',
  ],
  [
    { kind: 'step-too-small', time: 3600 },
    'the integration cannot go on 1 h into the programme: its steps become too small',
  ],
  [
    { kind: 'too-many-steps', time: 3600, taken: 100000 },
    'the integration gives up 1 h into the programme, after 100000 steps',
  ],
  [
    { kind: 'beyond-doubles', what: 'the rate constant' },
    'the rate constant lies beyond the range of double-precision numbers',
  ],
])('failure %j', (failure, sentence) => {
  expect(failureSentence(failure)).toBe(sentence)
})

test('causes are told apart', () => {
  const causes: readonly HoursCause[] = [
    'saturated',
    'substrate-short',
    'product-inhibition',
    'substrate-inhibition',
    'reversibility',
    'slow-fraction',
    'pH',
    'enzyme-loss',
    'heating',
    'staging',
  ]
  expect(new Set(causes.map(hoursCauseSentence)).size).toBe(causes.length)
})
