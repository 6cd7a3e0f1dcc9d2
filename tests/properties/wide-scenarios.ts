/**
 * Physically wide random scenarios: Km/S0 from 1e-6 to 1e4, kd from 0 to 100 per h, 0 to 100 °C, activation energies
 * up to 120 (rate) and 500 kJ/mol (loss), every optional part present or absent.
 */
import fc from 'fast-check'
import type { File, Json } from './asking.ts'

/** A number from 0 to 1, spread evenly; the library's own would crowd at the ends of the double range. */
const share = fc.noBias(fc.integer({ min: 0, max: 2 ** 30 })).map((n) => n / 2 ** 30)

/** A number spread evenly, with twelve digits as a file would have them. */
export const between = (low: number, high: number): fc.Arbitrary<number> =>
  share.map((x) => Number((low + (high - low) * x).toPrecision(12)))

/** A number spread evenly over decades, from 10^low to 10^high. */
export const decades = (low: number, high: number): fc.Arbitrary<number> =>
  share.map((x) => Number((10 ** (low + (high - low) * x)).toPrecision(12)))

/** Present about half of the time. */
const perhaps = <T>(value: fc.Arbitrary<T>): fc.Arbitrary<T | undefined> =>
  fc.option(value, { nil: undefined, freq: 2 })

const celsius = between(0, 100)
const pH = between(2, 10)
const pKs = fc
  .record({ pKa1: between(1, 7), width: between(0, 6) })
  .map(({ pKa1, width }) => ({ pKa1, pKa2: pKa1 + width }))

/** What is measured in S0, per hour, in the hours a saturated batch would take. */
export interface Wide {
  readonly S0: number
  readonly volume: number
  readonly massYield: number
  readonly P0: number
  readonly k: number
  readonly Km: number
  readonly Kic?: number
  readonly Kiu?: number
  readonly Ksi?: number
  readonly Keq?: number
  readonly slow?: { readonly share: number; readonly relativeRate: number }
  readonly Tref: number
  readonly Ea: number
  readonly reversibleLoss?: { readonly half: number; readonly energy: number }
  readonly pHref: number
  readonly pHEffect?: Json
  readonly loss?: Loss
  readonly T: number
  readonly pH: number
  /** kg of preparation */
  readonly dose: number
  readonly conversion: number
}

export interface Loss {
  readonly kd: number
  readonly at: number
  readonly Ea: number
  readonly series?: {
    readonly kd: number
    readonly Ea: number
    readonly first: number
    readonly second: number
  }
  readonly Kp?: number
  readonly pH?: { readonly pKa1: number; readonly pKa2: number; readonly at: number }
}

/** Which optional parts a family of scenarios may have. */
export interface Family {
  /** Keeps to laws that separate under constant conditions. */
  readonly separable?: boolean
  readonly stable?: boolean
  readonly irreversible?: boolean
}

/** Random scenarios of a family; dose and constants in proportion to the charge. */
export function wide({ separable, stable, irreversible }: Family = {}): fc.Arbitrary<Wide> {
  return fc
    .record({
      S0: decades(-2, 3),
      volume: decades(-3, 4),
      massYield: between(0.05, 2),
      P0: fc.oneof(fc.constant(0), decades(-3, 1)),
      k: decades(-2, 4),
      Km: decades(-6, 4),
      Kic: perhaps(decades(-3, 3)),
      Kiu: perhaps(decades(-3, 3)),
      Ksi: perhaps(decades(-3, 3)),
      Keq: irreversible ? fc.constant(undefined) : perhaps(decades(-2, 3)),
      slow: perhaps(fc.record({ share: between(0.01, 0.99), relativeRate: decades(-4, 0) })),
      Tref: celsius,
      Ea: between(0, 120),
      reversibleLoss: perhaps(fc.record({ half: between(30, 100), energy: between(0, 500) })),
      pHref: pH,
      pHEffect: fc.oneof(
        fc.constant(undefined),
        pKs,
        fc.record({ free: pKs, complex: pKs }) as fc.Arbitrary<Json>,
      ),
      loss: stable ? fc.constant(undefined) : perhaps(lossOf(separable ?? false)),
      T: celsius,
      pH,
      supply: decades(-2.5, 2.5),
      conversion: fc.oneof(
        between(0.001, 0.999),
        decades(-6, -1),
        decades(-9, -2).map((x) => 1 - x),
      ),
    })
    .map(({ supply, Keq, slow, ...w }) => {
      const scale = <T extends number | undefined>(K: T) => (K === undefined ? undefined : K * w.S0)
      const given: Wide = {
        ...dropped({
          ...w,
          Kic: scale(w.Kic),
          Kiu: scale(w.Kiu),
          Ksi: scale(w.Ksi),
          Keq,
          slow: Keq === undefined ? slow : undefined,
          loss: w.loss && dropped({ ...w.loss, Kp: scale(w.loss.Kp) }),
        }),
        Km: w.Km * w.S0,
        P0: w.P0 * w.S0,
        // So much that a saturated batch at the reference takes ten hours over `supply`.
        dose: (supply * w.S0 * w.volume) / (10 * w.k),
      }
      return given
    })
}

const lossOf = (separable: boolean) =>
  fc.record({
    kd: fc.oneof(fc.constant(0), decades(-6, 2)),
    at: celsius,
    Ea: between(0, 500),
    series: perhaps(
      fc.record({
        kd: fc.oneof(fc.constant(0), decades(-6, 2)),
        Ea: between(0, 500),
        first: between(0, 1),
        second: between(0, 0.5),
      }),
    ),
    Kp: separable ? fc.constant(undefined) : perhaps(decades(-3, 3)),
    pH: perhaps(fc.record({ pKa1: between(0, 4), pKa2: between(8, 12), at: pH })),
  })

/** Without the keys that have no value. */
function dropped<T extends object>(given: T): { [K in keyof T]: Exclude<T[K], undefined> } {
  return Object.fromEntries(Object.entries(given).filter(([, value]) => value !== undefined)) as {
    [K in keyof T]: Exclude<T[K], undefined>
  }
}

/** The short form of a scenario that asks for the time. */
export function fileOf(w: Wide): File {
  const { loss } = w
  const step = loss && { kd: `${loss.kd} 1/h`, at: `${loss.at} degC`, Ea: `${loss.Ea} kJ/mol` }
  return dropped({
    format: 'dosewright-scenario',
    version: 1,
    feed: {
      volume: `${w.volume} m3`,
      substrate: dropped({ concentration: `${w.S0} g/L`, slow: w.slow as Json }) as Json,
      product: { massYield: w.massYield, concentration: `${w.P0} g/L` },
    },
    enzyme: dropped({
      rate: dropped({
        specificRate: `${w.k} g/g/h`,
        reference: { temperature: `${w.Tref} degC`, pH: w.pHref },
        Km: `${w.Km} g/L`,
        Kic: w.Kic === undefined ? undefined : `${w.Kic} g/L`,
        Kiu: w.Kiu === undefined ? undefined : `${w.Kiu} g/L`,
        Ksi: w.Ksi === undefined ? undefined : `${w.Ksi} g/L`,
        Keq: w.Keq,
      }) as Json,
      temperature: dropped({
        Ea: `${w.Ea} kJ/mol`,
        reversibleLoss:
          w.reversibleLoss &&
          ({ half: `${w.reversibleLoss.half} degC`, energy: `${w.reversibleLoss.energy} kJ/mol` } as Json),
      }) as Json,
      pH: w.pHEffect,
      inactivation:
        loss &&
        (dropped({
          ...(loss.series
            ? {
                series: [
                  { ...step, residual: loss.series.first },
                  {
                    kd: `${loss.series.kd} 1/h`,
                    at: `${loss.at} degC`,
                    Ea: `${loss.series.Ea} kJ/mol`,
                    residual: loss.series.second,
                  },
                ],
              }
            : step),
          Kp: loss.Kp === undefined ? undefined : `${loss.Kp} g/L`,
          pH: loss.pH as Json,
        }) as Json),
    }) as Json,
    programme: { temperature: `${w.T} degC`, pH: w.pH, dose: `${w.dose} kg` },
    ask: { find: 'time', conversion: w.conversion },
  }) as File
}
