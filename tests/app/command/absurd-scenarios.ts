/** Scenarios that are legal and make no sense: constants and programmes from the ends of what a file may say. */
import fc from 'fast-check'

/** Evenly spread, ends included; a generator of doubles as such would mostly give numbers next to 0. */
const plain = (min: number, max: number): fc.Arbitrary<number> =>
  fc.noBias(fc.integer({ min: 0, max: 10_000 })).map((step) => min + ((max - min) * step) / 10_000)

const magnitude = (from: number, to: number): fc.Arbitrary<number> =>
  plain(from, to).map((exponent) => Number((10 ** exponent).toPrecision(4)))

const measured = (from: number, to: number, ...units: string[]): fc.Arbitrary<string> =>
  fc.tuple(magnitude(from, to), fc.constantFrom(...units)).map(([value, unit]) => `${value} ${unit}`)

const celsius = fc
  .oneof({ weight: 4, arbitrary: plain(0, 100) }, fc.constantFrom(-273, -40, 200, 3000))
  .map((degrees) => `${degrees} degC`)

const conversion = fc.oneof(plain(0.01, 0.999), fc.constantFrom(1e-12, 1e-3, 0.999999, 1 - 2 ** -52))

const time = measured(-6, 6, 's', 'min', 'h', 'd')
const concentration = measured(-9, 6, 'g/L', 'mmol/L', 'mg/L')
const mass = measured(-9, 9, 'kg', 'mg', 't')

const optional = <T>(key: string, value: fc.Arbitrary<T>): fc.Arbitrary<Record<string, T>> =>
  fc.option(
    value.map((made) => ({ [key]: made })),
    { nil: {} },
  )

const merged = (...parts: fc.Arbitrary<object>[]): fc.Arbitrary<object> =>
  fc.tuple(...parts).map((made) => Object.assign({}, ...made) as object)

const energy = measured(-2, 3, 'kJ/mol', 'kcal/mol')

const rate = merged(
  fc.oneof(
    measured(-9, 9, 'g/g/h', 'mg/mg/min').map((specificRate) => ({
      specificRate,
      reference: { temperature: '40 degC', pH: 6.5 },
    })),
    fc
      .tuple(measured(-6, 9, 'U/g', 'kat/kg'), optional('substrate', concentration))
      .map(([declared, substrate]) => ({
        activity: { declared, assay: { temperature: '37 degC', pH: 6.5, ...substrate } },
      })),
  ),
  concentration.map((Km) => ({ Km })),
  optional('Kic', concentration),
  optional('Kiu', concentration),
  optional('Ksi', concentration),
  optional('Keq', magnitude(-6, 6)),
)

const inactivation = merged(
  fc.oneof(
    measured(-9, 3, '1/h', '1/s').map((kd) => ({ kd })),
    time.map((halfLife) => ({ halfLife })),
    time.map((D) => ({ D })),
  ),
  fc.oneof(
    energy.map((Ea) => ({ Ea })),
    measured(-1, 3, 'K').map((z) => ({ z })),
  ),
  fc.constant({ at: '45 degC' }),
  optional('Kp', concentration),
)

const phases = fc
  .tuple(
    fc.array(fc.tuple(mass, time, fc.boolean(), concentration, measured(-6, 6, 'L/h', 'm3/h')), {
      minLength: 1,
      maxLength: 6,
    }),
  )
  .map(([stages]) =>
    stages.flatMap(([amount, length, fed, strength, flow]) => [
      { phase: 'dose', amount },
      fed ? { phase: 'feed', flow, for: length, concentration: strength } : { phase: 'hold', for: length },
    ]),
  )

const programme = fc.oneof(
  fc.record({ temperature: celsius, pH: plain(0, 14), dose: mass }),
  fc.record({ start: fc.record({ temperature: celsius, pH: plain(0, 14) }), phases }),
)

const ask = fc.oneof(
  conversion.map((target) => ({ find: 'time', conversion: target })),
  fc.tuple(conversion, time).map(([target, within]) => ({ find: 'dose', conversion: target, within })),
  fc.array(time, { minLength: 1, maxLength: 4 }).map((at) => ({ find: 'trace', at })),
  conversion.map((target) => ({
    find: 'temperature',
    best: 'time',
    conversion: target,
    between: ['5 degC', '90 degC'],
  })),
)

/** A scenario that a file may hold, whatever a plant would say to it. */
export const absurdScenario: fc.Arbitrary<object> = fc.record({
  format: fc.constant('dosewright-scenario'),
  version: fc.constant(1),
  feed: fc.record({
    volume: measured(-6, 6, 'm3', 'L'),
    substrate: fc.record({ molarMass: measured(0, 6, 'g/mol'), concentration }),
    product: fc.record({
      massYield: magnitude(-6, 2),
      concentration: fc.constantFrom('0 g/L', '1e-9 g/L', '1000 g/L'),
    }),
  }),
  enzyme: merged(
    rate.map((made) => ({ rate: made })),
    fc.oneof(
      energy.map((Ea) => ({ temperature: { Ea } })),
      fc.constant({ temperature: { Q10: 2, from: '30 degC' } }),
    ),
    optional('pH', fc.record({ pKa1: plain(0, 7), pKa2: plain(7, 14) })),
    optional('inactivation', inactivation),
  ),
  programme,
  ask,
})
