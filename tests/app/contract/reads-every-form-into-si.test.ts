import { expect, test } from 'vitest'
import { readScenario } from '../../../app/contract/index.ts'
import type { Scenario } from '../../../engine/index.ts'
import { edited, type Json, phased, shortForm } from './scenarios.ts'

type Edit = readonly [path: string, value: Json | undefined]

const read = (source: { [key: string]: Json }, ...edits: Edit[]): Scenario => {
  const outcome = readScenario(JSON.stringify(edited(source, ...edits)))
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.failure.faults))
  return outcome.value.scenario
}

const short = (...edits: Edit[]): Scenario => read(shortForm(), ...edits)

test('the short form of the page', () => {
  expect(short()).toEqual({
    title: 'Lactose in permeate',
    feed: {
      volume: 12,
      substrate: { name: 'lactose', molarMass: 0.3423, concentration: 45 },
      product: { name: 'galactose', massYield: 0.5263, concentration: 0 },
    },
    enzyme: {
      name: 'an invented lactase',
      form: 'liquid',
      density: 1150,
      rate: {
        specificRate: 95 / 3600,
        reference: { temperature: 313.15, pH: 6.7 },
        Km: 8,
        Kic: 5,
        Kiu: 40,
        Ksi: 300,
        Keq: 3.2,
      },
      temperature: { Ea: 45000 },
      pH: { pKa1: 5.2, pKa2: 8.1 },
      inactivation: { steps: [{ kd: 0.08 / 3600, at: 313.15, Ea: 230000 }] },
    },
    programme: {
      kind: 'constant',
      temperature: 315.15,
      pH: 6.7,
      dose: 3.5,
      hold: 36000,
      countDoseVolume: false,
    },
    costs: { currency: 'EUR', enzyme: 30, vessel: 85 / 3600, turnaround: 5400 },
    spreads: {
      rate: 0.08,
      Km: 0.15,
      Kic: 0.2,
      kd: 0.25,
      lotActivity: 0.04,
      concentration: 0.02,
      temperature: 0.4,
      pH: 0.05,
    },
    ask: { find: 'time', conversion: 0.95 },
  })
})

test('the phases of the page', () => {
  expect(read(phased()).programme).toEqual({
    kind: 'phases',
    start: { temperature: 283.15, pH: 6.7 },
    countDoseVolume: false,
    phases: [
      { phase: 'heat', to: 315.15, ramp: 0.5 / 60 },
      { phase: 'dose', amount: 3.5 },
      { phase: 'hold', for: 21600 },
      { phase: 'dose', amount: 0.8 },
      { phase: 'feed', flow: { per: 'volume', value: 0.5 / 3600 }, for: 7200, concentration: 150 },
      { phase: 'hold', for: 14400 },
      { phase: 'inactivate', to: 358.15, ramp: 1 / 60, hold: 600 },
      { phase: 'cool', to: 281.15, ramp: 1 / 60 },
    ],
  })
})

test('phases with all that they may hold', () => {
  const { programme } = read(
    phased(),
    ['programme.countDoseVolume', true],
    [
      'programme.phases',
      [
        { phase: 'heat', to: '20 degC' },
        { phase: 'hold', for: '15 s' },
        { phase: 'heat', to: '42 degC', jacket: { temperature: '60 degC', timeConstant: '25 min' } },
        { phase: 'adjust', pH: 6.5 },
        { phase: 'dose', amount: '3400 g' },
        {
          phase: 'feed',
          flow: '500 kg/h',
          flowTo: '100 kg/h',
          for: '2 h',
          concentration: '100 mmol/L',
          enzyme: '0.3 g/L',
          product: '10 mmol/L',
          density: '1.05 kg/L',
        },
        { phase: 'hold', until: { conversion: 0.9 }, atMost: '0.5 d' },
        { phase: 'inactivate', to: '85 degC', hold: '0 s' },
      ],
    ],
  )
  expect(programme).toEqual({
    kind: 'phases',
    start: { temperature: 283.15, pH: 6.7 },
    countDoseVolume: true,
    phases: [
      { phase: 'heat', to: 293.15 },
      { phase: 'hold', for: 15 },
      { phase: 'heat', to: 315.15, jacket: { temperature: 333.15, timeConstant: 1500 } },
      { phase: 'adjust', pH: 6.5 },
      { phase: 'dose', amount: 3.4 },
      {
        phase: 'feed',
        flow: { per: 'mass', value: 500 / 3600 },
        flowTo: { per: 'mass', value: 100 / 3600 },
        for: 7200,
        concentration: 100 * 0.3423,
        enzyme: 0.3,
        product: 10 * 0.3423,
        density: 1050,
      },
      { phase: 'hold', until: { conversion: 0.9 }, atMost: 43200 },
      { phase: 'inactivate', to: 358.15, hold: 0 },
    ],
  })
})

const activity = (declared: string, assay: { [key: string]: Json } = {}): Edit => [
  'enzyme.rate.activity',
  { declared, assay: { temperature: '37 degC', pH: 6.5, ...assay } },
]

test('an activity by mass, the substrate of its assay molar', () => {
  const { rate } = short(
    ['enzyme.rate.specificRate', undefined],
    ['enzyme.rate.reference', undefined],
    activity('5000 U/g', { substrate: '100 mmol/L' }),
  ).enzyme
  // 5000 umol/min per g: 5000e-6/60 mol/s per 1e-3 kg.
  expect(rate.activity?.declared.per).toBe('mass')
  expect(rate.activity?.declared.value).toBeCloseTo(5 / 60, 15)
  expect(rate.activity?.assay).toEqual({ temperature: 310.15, pH: 6.5, substrate: 100 * 0.3423 })
  expect(rate.reference).toBeUndefined()
})

test('an activity by volume', () => {
  const { rate } = short(['enzyme.rate.specificRate', undefined], activity('5 U/mL')).enzyme
  expect(rate.activity?.declared.per).toBe('volume')
  expect(rate.activity?.declared.value).toBeCloseTo(0.08333333333333333, 15)
})

test('a specific rate in moles', () => {
  const { rate } = short(['enzyme.rate.specificRate', '360 mmol/g/h']).enzyme
  expect(rate.specificRate).toBeCloseTo(0.1 * 0.3423, 14)
})

test('molar constants are of the substrate', () => {
  const { rate, inactivation } = short(
    ['enzyme.rate.Km', '23 mmol/L'],
    ['enzyme.rate.Kic', '0.02 mol/L'],
    ['enzyme.inactivation.Kp', '5 mmol/L'],
  ).enzyme
  expect(rate.Km).toBeCloseTo(23 * 0.3423, 12)
  expect(rate.Kic).toBeCloseTo(20 * 0.3423, 12)
  expect(inactivation?.Kp).toBeCloseTo(5 * 0.3423, 12)
})

test('Q10, and a loss that cooling restores', () => {
  const given = { Q10: 2, from: '30 degC', reversibleLoss: { half: '55 degC', energy: '300 kJ/mol' } }
  expect(short(['enzyme.temperature', given]).enzyme.temperature).toEqual({
    Q10: 2,
    from: 303.15,
    reversibleLoss: { half: 328.15, energy: 300000 },
  })
})

test('half-life and D, z and the pH of the loss', () => {
  const half = short(['enzyme.inactivation', { halfLife: '8.7 h', at: '40 degC', z: '6 degC' }])
  expect(half.enzyme.inactivation).toEqual({ steps: [{ halfLife: 8.7 * 3600, at: 313.15, z: 6 }] })
  const D = short([
    'enzyme.inactivation',
    { D: '28.8 h', at: '313.15 K', Ea: '55 kcal/mol', pH: { pKa1: 4, pKa2: 9, at: 6.5 } },
  ])
  expect(D.enzyme.inactivation).toEqual({
    steps: [{ D: 28.8 * 3600, at: 313.15, Ea: 230120 }],
    pH: { pKa1: 4, pKa2: 9, at: 6.5 },
  })
})

test('inactivation in series', () => {
  const { inactivation } = short([
    'enzyme.inactivation',
    {
      series: [
        { kd: '0.5 1/h', at: '50 degC', Ea: '200 kJ/mol', residual: 0.4 },
        { D: '2 h', at: '50 degC', z: '6 K', residual: 0 },
      ],
      Kp: '20 g/L',
    },
  ]).enzyme
  expect(inactivation).toEqual({
    steps: [
      { kd: 0.5 / 3600, at: 323.15, Ea: 200000 },
      { D: 7200, at: 323.15, z: 6 },
    ],
    residual: { first: 0.4, second: 0 },
    Kp: 20,
  })
})

test('two bells, a slow share, a stoichiometric yield', () => {
  const scenario = short(
    ['enzyme.pH', { free: { pKa1: 5, pKa2: 8 }, complex: { pKa1: 4.5, pKa2: 8.5 } }],
    ['enzyme.rate.Keq', undefined],
    ['feed.substrate.slow', { share: 0.2, relativeRate: 0.1 }],
    ['feed.product', { molarMass: '180.16 g/mol', concentration: '0 g/L' }],
  )
  expect(scenario.enzyme.pH).toEqual({ free: { pKa1: 5, pKa2: 8 }, complex: { pKa1: 4.5, pKa2: 8.5 } })
  expect(scenario.feed.substrate.slow).toEqual({ share: 0.2, relativeRate: 0.1 })
  expect(scenario.feed.product.stoichiometry).toEqual({ molarMass: 0.18016, molesPerSubstrate: 1 })
  expect(scenario.feed.product.massYield).toBeUndefined()
})

test.each<[Json, Scenario['ask']]>([
  [
    { find: 'dose', conversion: 0.95, within: '10 h' },
    { find: 'dose', conversion: 0.95, within: 36000 as never },
  ],
  [
    { find: 'temperature', best: 'time', conversion: 0.95, between: ['25 degC', '60 degC'] },
    { find: 'temperature', best: 'time', conversion: 0.95, between: [298.15, 333.15] as never },
  ],
  [
    { find: 'temperature', best: 'conversion', within: '10 h', between: ['25 degC', '60 degC'] },
    { find: 'temperature', best: 'conversion', within: 36000, between: [298.15, 333.15] } as never,
  ],
  [
    { find: 'trace', at: ['2 h', '0 h', '30 min'] },
    { find: 'trace', at: [7200, 0, 1800] as never },
  ],
])('the question %j', (given, asked) => {
  expect(short(['ask', given]).ask).toEqual(asked)
})

test('what is only optional may be absent', () => {
  const scenario = short(
    ['title', undefined],
    ['feed.substrate.molarMass', undefined],
    ['feed.substrate.name', undefined],
    ['enzyme.density', undefined],
    ['enzyme.pH', undefined],
    ['enzyme.rate.reference.pH', undefined],
    ['enzyme.inactivation', undefined],
    ['programme', { temperature: '42 degC' }],
    ['costs', { turnaround: '1 h' }],
    ['spreads', undefined],
    ['ask', { find: 'dose', conversion: 0.9, within: '8 h' }],
  )
  expect(scenario.programme).toEqual({ kind: 'constant', temperature: 315.15, countDoseVolume: false })
  expect(scenario).not.toHaveProperty('costs')
  expect(scenario.enzyme).not.toHaveProperty('pH')
  expect(scenario.enzyme).not.toHaveProperty('inactivation')
})

test('the file is kept as given beside the scenario', () => {
  const outcome = readScenario(JSON.stringify(shortForm()))
  expect(outcome.ok && outcome.value.source).toEqual(shortForm())
})
