/**
 * Absurd but legal scenario files: an ordinary one in which some values stand at the ends of what a file may say.
 * Some of these a reader refuses for leaving the range of doubles; those are not scenarios.
 */
import fc from 'fast-check'
import type { File, Json } from './asking.ts'
import { widePlan } from './wide-programmes.ts'
import { fileOf, wide } from './wide-scenarios.ts'

/** A file in the making. */
type Draft = { [key: string]: Draft | Draft[] | string | number | boolean | null }
type Value = Draft[string]
type Edit = (file: Draft) => void

/** Writes a value at a path of keys, making what is missing on the way; undefined takes the key away. */
function set(file: Draft, path: string, value: Json | undefined): void {
  const keys = path.split('.')
  const last = keys.pop() ?? ''
  let at = file
  for (const key of keys) {
    if (!isDraft(at[key])) at[key] = {}
    at = at[key] as Draft
  }
  if (value === undefined) delete at[last]
  else at[last] = value as Value
}

const isDraft = (value: Value | undefined): value is Draft =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

const get = (file: Draft, path: string): Value | undefined =>
  path.split('.').reduce<Value | undefined>((at, key) => (isDraft(at) ? at[key] : undefined), file)

const phasesOf = (file: Draft): Draft[] | undefined => get(file, 'programme.phases') as Draft[] | undefined

const ends = ['1e-300', '1e-200', '1e-100', '1e-30', '1e-9', '1e9', '1e30', '1e100', '1e200', '1e300']
const endsIn = (...units: string[]): fc.Arbitrary<string> =>
  fc.tuple(fc.constantFrom(...ends), fc.constantFrom(...units)).map(([value, unit]) => `${value} ${unit}`)

const extreme = fc.constantFrom(1e-300, 1e-100, 1e-30, 1e-12, 1e12, 1e30, 1e100, 1e300)
const temperature = fc.constantFrom(
  '1 K',
  '1e-300 K',
  '1e-9 K',
  '50 K',
  '-273 degC',
  '300 degC',
  '2000 K',
  '1e5 K',
  '1e300 K',
)
const time = endsIn('s', 'h', 'd')
const conversion = fc.constantFrom(
  5e-324,
  1e-300,
  1e-100,
  1e-16,
  1e-12,
  0.5,
  0.9,
  0.999999,
  0.999999999999,
  0.999999999999999,
  1 - 2 ** -53,
)
const pKa = fc.constantFrom(-1e300, -1000, -300, 0, 7, 14, 300, 1000, 1e300)
const pH = fc.constantFrom(0, 1e-300, 7, 14)
const energy = fc.constantFrom(
  '0 J/mol',
  '1e-300 J/mol',
  '1e6 J/mol',
  '1e9 J/mol',
  '1e30 J/mol',
  '1e300 J/mol',
)
const bell = fc.record({ pKa1: pKa, pKa2: pKa })
const slowOrFast = fc.constantFrom('1e9 m3/h', '1e-9 mL/min')
const many = (count: number, phase: (n: number) => Json): readonly Json[] =>
  Array.from({ length: count }, (_, n) => phase(n))
const rate = fc.constantFrom('0 1/h', '1e-300 1/s', '1e-30 1/h', '1e9 1/s', '1e30 1/s', '1e300 1/s')

const lossStep = fc.record({
  kd: rate,
  at: temperature,
  Ea: fc.constant('200 kJ/mol'),
  residual: fc.constantFrom(0, 1e-300, 1, 1e300),
})

const put = <T>(values: fc.Arbitrary<T>, write: (file: Draft, value: T) => void): fc.Arbitrary<Edit> =>
  values.map((value) => (file: Draft) => write(file, value))
const putAt = (path: string, values: fc.Arbitrary<Json>): fc.Arbitrary<Edit> =>
  put(values, (file, value) => set(file, path, value))
/** For the short form only. */
const putShort = (path: string, values: fc.Arbitrary<Json>): fc.Arbitrary<Edit> =>
  put(values, (file, value) => {
    if (!phasesOf(file)) set(file, path, value)
  })
/** Phases before a kill step, after which nothing may follow. */
const insert = (phases: fc.Arbitrary<readonly Json[]>): fc.Arbitrary<Edit> =>
  put(phases, (file, added) => {
    const all = phasesOf(file)
    if (!all || all.length + added.length > 990) return
    const kill = all.findIndex(({ phase }) => phase === 'inactivate')
    all.splice(kill < 0 ? all.length : kill, 0, ...(structuredClone(added) as Draft[]))
  })

const loss = 'enzyme.inactivation'
const usualLoss = { kd: '1 1/h', at: '40 degC', Ea: '200 kJ/mol' }
const beside = (key: string, values: fc.Arbitrary<Json>): fc.Arbitrary<Edit> =>
  put(values, (file, value) => {
    if (get(file, loss) === undefined) set(file, loss, usualLoss)
    set(file, `${loss}.${key}`, value)
  })

const edits: fc.Arbitrary<Edit>[] = [
  putAt('feed.volume', endsIn('m3', 'L', 'mL')),
  putAt('feed.volume', fc.constantFrom('1 mL', '1e12 m3')),
  putAt('feed.substrate.concentration', endsIn('g/L', 'kg/m3')),
  putAt('feed.product.concentration', endsIn('g/L')),
  putAt('feed.product.massYield', extreme),
  putAt('enzyme.rate.specificRate', endsIn('g/g/h', 'g/g/s')),
  ...['Km', 'Kic', 'Kiu', 'Ksi'].map((key) => putAt(`enzyme.rate.${key}`, endsIn('g/L'))),
  put(extreme, (file, Keq) => {
    set(file, 'enzyme.rate.Keq', Keq)
    set(file, 'feed.substrate.slow', undefined)
  }),
  put(fc.tuple(fc.constantFrom(1e-300, 1e-12, 1 - 2 ** -53), extreme), (file, [share, relative]) => {
    set(file, 'enzyme.rate.Keq', undefined)
    set(file, 'feed.substrate.slow', { share, relativeRate: Math.min(1, relative) })
  }),
  putAt('enzyme.rate.reference.temperature', temperature),
  putAt('enzyme.temperature', fc.record({ Ea: energy })),
  putAt('enzyme.temperature', fc.record({ Q10: extreme, from: temperature })),
  putAt('enzyme.temperature.reversibleLoss', fc.record({ half: temperature, energy })),
  putAt('enzyme.pH', bell),
  putAt('enzyme.pH', fc.record({ free: bell, complex: bell })),
  putAt(loss, fc.record({ kd: rate, at: temperature, Ea: energy })),
  putAt(loss, fc.record({ halfLife: time, at: fc.constant('50 degC'), Ea: energy })),
  putAt(loss, fc.record({ D: time, at: fc.constant('50 degC'), z: endsIn('K') })),
  putAt(loss, fc.record({ series: fc.tuple(lossStep, lossStep).map((steps): Json => steps) })),
  beside('Kp', endsIn('g/L')),
  beside('pH', fc.record({ pKa1: pKa, pKa2: pKa, at: pH })),
  putShort('programme.dose', endsIn('kg', 'mg')),
  putShort('programme.temperature', temperature),
  putShort('programme.pH', pH),
  insert(endsIn('kg').map((amount) => [{ phase: 'dose', amount }])),
  insert(time.map((length) => [{ phase: 'hold', for: length }])),
  insert(
    fc.tuple(conversion, time).map(([c, atMost]) => [{ phase: 'hold', until: { conversion: c }, atMost }]),
  ),
  insert(pH.map((to) => [{ phase: 'adjust', pH: to }])),
  insert(
    fc
      .record({
        flow: endsIn('m3/h', 'kg/h'),
        for: time,
        concentration: endsIn('g/L'),
        enzyme: endsIn('g/L'),
      })
      .map((feed) => [{ phase: 'feed', density: '1 kg/L', ...feed }]),
  ),
  insert(
    fc
      .record({ flow: slowOrFast, flowTo: slowOrFast })
      .map((feed) => [{ phase: 'feed', for: '1 h', concentration: '100 g/L', ...feed }]),
  ),
  insert(
    fc.constantFrom('1e-300 K/min', '1e-9 K/min', '1e9 K/min', '1e300 K/h').map((ramp) => [
      { phase: 'heat', to: '1e5 K', ramp },
      { phase: 'cool', to: '20 degC', ramp },
    ]),
  ),
  insert(
    fc
      .record({
        timeConstant: endsIn('s'),
        temperature: fc.constantFrom('1e5 K', '1e300 K', '60.000001 degC'),
      })
      .map((jacket) => [{ phase: 'heat', to: '60 degC', jacket }]),
  ),
  insert(
    fc
      .constantFrom('1 K/min', '1e9 K/min', '1e-9 K/min')
      .map((ramp) => many(200, (n) => ({ phase: 'heat', to: n % 2 ? '20 degC' : '99 degC', ramp }))),
  ),
  insert(fc.constant(many(900, (n) => ({ phase: 'dose', amount: `${n + 1} mg` })))),
  insert(fc.constant(many(900, (n) => ({ phase: 'hold', for: `${n + 1} s` })))),
  insert(fc.constant(many(900, (n) => ({ phase: 'adjust', pH: n % 14 })))),
  put(fc.constantFrom('1e-300 kg/L', '1e300 kg/L'), (file, density) => {
    set(file, 'enzyme.density', density)
    set(file, 'programme.countDoseVolume', true)
  }),
]

const range = fc.constantFrom<Json>(['1 K', '1e5 K'], ['20 degC', '80 degC'])
const ask: fc.Arbitrary<Json> = fc.oneof(
  { weight: 4, arbitrary: fc.record({ find: fc.constant('time'), conversion }) },
  { weight: 3, arbitrary: fc.record({ find: fc.constant('dose'), conversion, within: time }) },
  {
    weight: 1,
    arbitrary: fc.record({
      find: fc.constant('temperature'),
      best: fc.constant('time'),
      conversion,
      between: range,
    }),
  },
  {
    weight: 1,
    arbitrary: fc.record({
      find: fc.constant('temperature'),
      best: fc.constant('conversion'),
      within: time,
      between: range,
    }),
  },
  {
    weight: 3,
    arbitrary: fc.record({
      find: fc.constant('trace'),
      at: fc.constantFrom<Json>(
        ['0 s', '1e300 s'],
        ['1e-300 s', '1 h', '1e9 h'],
        ['1e30 d', '5 h', '5 h', '0 h'],
      ),
    }),
  },
)

/** A scenario with up to six values at the ends. */
export const absurd: fc.Arbitrary<File> = fc
  .record({
    file: fc.oneof(wide().map(fileOf), widePlan({ feeds: true })),
    changes: fc.array(fc.oneof(...edits), { minLength: 0, maxLength: 6 }),
    ask,
  })
  .map(({ file, changes, ask: question }) => {
    const draft = structuredClone(file) as Draft
    for (const change of changes) change(draft)
    orderly(draft)
    set(draft, 'ask', question)
    return draft as File
  })

/** Heating and cooling named by their direction, whatever was put between; set points stay. */
function orderly(file: Draft): void {
  let at = kelvin(get(file, 'programme.start.temperature'))
  for (const phase of phasesOf(file) ?? []) {
    if (phase.to === undefined) continue
    const to = kelvin(phase.to)
    if (phase.phase !== 'inactivate') phase.phase = to >= at ? 'heat' : 'cool'
    else if (to < at) phase.to = `${at} K`
    at = kelvin(phase.to)
    const jacket = get(phase, 'jacket.temperature')
    if (jacket === undefined) continue
    const reaches = phase.phase === 'cool' ? kelvin(jacket) < at : kelvin(jacket) > at
    if (!reaches) delete phase.jacket
  }
}

const kelvin = (value: Value | undefined): number => {
  const [number, unit] = String(value ?? '0 degC').split(' ')
  return unit === 'K' ? Number(number) : Number(number) + 273.15
}
