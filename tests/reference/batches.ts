/**
 * The batches of the sourced cases in one form, still in the units of the cases.
 *
 * Units    g/L, mg/L of enzyme, g/(mg min), min, degC, kJ/mol, L; a dose in mg per L of the volume at its moment.
 */
import type {
  ArrheniusInputs,
  Breakpoint,
  ClosedFormCase,
  InactivationCase,
  InhibitionCase,
  LawInputs,
  OptimumCase,
  ProgrammeCase,
  SeriesInputs,
  StagedInputs,
  TwoStepCase,
} from './load.ts'

export interface ReferenceBatch {
  readonly charge: { readonly S0: number; readonly P0: number; readonly y: number; readonly V: number }
  readonly law: {
    readonly Km: number
    readonly Kic?: number
    readonly Kiu?: number
    readonly Ksi?: number
    readonly Keq?: number
  }
  readonly rate: { readonly kcat: number; readonly Ea: number; readonly at: number }
  /** Factor on the rate by a pH off its best. */
  readonly pHFactor?: number
  readonly loss?: { readonly kd: number; readonly Ed: number; readonly at: number }
  readonly series?: SeriesInputs & { readonly at: number }
  readonly programme:
    | { readonly kind: 'constant'; readonly T: number; readonly dose: number }
    | { readonly kind: 'phases'; readonly start: number; readonly phases: readonly ReferencePhase[] }
}

export type ReferencePhase =
  /** mg in all */
  | { readonly phase: 'dose'; readonly mass: number }
  | { readonly phase: 'hold'; readonly minutes: number }
  | { readonly phase: 'ramp'; readonly to: number; readonly minutes: number; readonly up: boolean }
  | {
      readonly phase: 'feed'
      readonly minutes: number
      /** L/min at its start and its end */
      readonly flow: number
      readonly flowTo: number
      readonly substrate: number
      readonly enzyme: number
    }

/** Cases without a temperature run at this one, where their constants hold; degC. */
const isothermal = 40
/** A cubic metre. */
const volume = 1000

const chargeOf = ({ S0, P0 = 0, y = 1 }: LawInputs, V = volume): ReferenceBatch['charge'] => ({
  S0,
  P0,
  y,
  V,
})

const lawOf = ({ Km, Kic, Kiu, Ksi, Kp, Keq }: LawInputs): ReferenceBatch['law'] => {
  const competitive = Kp ?? Kic ?? undefined
  return {
    Km,
    ...(competitive !== undefined && { Kic: competitive }),
    ...(typeof Kiu === 'number' && { Kiu }),
    ...(typeof Ksi === 'number' && { Ksi }),
    ...(Keq !== undefined && { Keq }),
  }
}

/** One temperature, one dose, no other condition. */
const steady = (inputs: LawInputs, kcat: number, dose: number): ReferenceBatch => ({
  charge: chargeOf(inputs),
  law: lawOf(inputs),
  rate: { kcat, Ea: 50, at: isothermal },
  programme: { kind: 'constant', T: isothermal, dose },
})

/** Michaelis–Menten; activities in U per mL of the vessel become the rate of 1 g/L of preparation. */
export const closedFormBatch = ({ inputs }: ClosedFormCase): ReferenceBatch => {
  const { kcat, E, E_U_per_mL, molar_mass_substrate_g_per_mol: M } = inputs
  if (kcat !== undefined && E !== undefined) return steady(inputs, kcat, E)
  return steady(inputs, ((E_U_per_mL ?? Number.NaN) * (M ?? Number.NaN)) / 1000 / 1000, 1000)
}

/** Product and substrate inhibition, reversibility. */
export const inhibitionBatch = ({ inputs }: InhibitionCase): ReferenceBatch =>
  steady(inputs, inputs.kcat, inputs.E)

/** First-order loss; the case's dose unless another is given. */
export const inactivationBatch = ({ inputs }: InactivationCase, dose = inputs.E0): ReferenceBatch => ({
  ...steady(inputs, inputs.kcat, dose),
  loss: { kd: inputs.kd, Ed: 230, at: isothermal },
})

/** Loss in two steps, for the cases with a charge. */
export const seriesBatch = ({ inputs }: TwoStepCase): ReferenceBatch => {
  const { S0 = Number.NaN, Km = Number.NaN, kcat = Number.NaN, E0 = Number.NaN, ...rest } = inputs
  const { k1, k2, alpha1, alpha2 } = inputs
  return {
    ...steady({ ...rest, S0, Km }, kcat, E0),
    series: { k1, k2, alpha1, alpha2, at: isothermal },
  }
}

const arrhenius = (inputs: ArrheniusInputs): Pick<ReferenceBatch, 'rate' | 'loss'> => ({
  rate: { kcat: inputs.kcat_ref, Ea: inputs.Ea, at: inputs.T_ref },
  loss: { kd: inputs.kd_ref, Ed: inputs.Ed, at: inputs.Td_ref },
})

/** At one temperature, degC, of a case that asks for the best. */
export const optimumBatch = ({ inputs }: OptimumCase, T: number): ReferenceBatch => ({
  charge: chargeOf(inputs),
  law: lawOf(inputs),
  ...arrhenius(inputs),
  programme: { kind: 'constant', T, dose: inputs.E0 },
})

/** A temperature programme with its dose at the start. */
export const programmeBatch = ({ inputs }: ProgrammeCase): ReferenceBatch => ({
  charge: chargeOf(inputs),
  law: lawOf(inputs),
  ...arrhenius(inputs),
  ...(inputs.pH_factor !== 1 && { pHFactor: inputs.pH_factor }),
  programme: phased({
    temperatures: inputs.temperature_program,
    doses: [{ t: 0, mass: inputs.E0 * volume }],
    end: 0,
  }),
})

/** Doses in time, under a programme or beside a feed, up to `end`. */
export const stagedBatch = (inputs: StagedInputs, end: number): ReferenceBatch => {
  const { feed, V0 = volume, kcat, kd } = inputs
  const flat: readonly Breakpoint[] = [[0, isothermal]]
  const supplied = (t: number): number => {
    if (!feed) return 0
    const τ = Math.min(Math.max(0, t - feed.t_on), feed.t_off - feed.t_on)
    return τ * (feed.F0 + 0.5 * feed.F1 * τ)
  }
  const constants =
    kcat !== undefined && kd !== undefined
      ? { rate: { kcat, Ea: 50, at: isothermal }, loss: { kd, Ed: 230, at: isothermal } }
      : arrhenius(inputs as ArrheniusInputs)
  return {
    charge: chargeOf(inputs, V0),
    law: lawOf(inputs),
    ...constants,
    programme: phased({
      temperatures: inputs.temperature_program ?? flat,
      doses: [
        ...(inputs.E0 === undefined ? [] : [{ t: 0, mass: inputs.E0 * V0 }]),
        ...inputs.doses.map(({ t, E_added }) => ({ t, mass: E_added * (V0 + supplied(t)) })),
      ],
      ...(feed && { feed }),
      end,
    }),
  }
}

interface Course {
  readonly temperatures: readonly Breakpoint[]
  /** mg */
  readonly doses: readonly { readonly t: number; readonly mass: number }[]
  readonly feed?: NonNullable<StagedInputs['feed']>
  /** The programme lasts at least this long, min. */
  readonly end: number
}

/** The phases of a course: cut at every breakpoint, dose and turn of the feed. */
function phased({ temperatures, doses, feed, end }: Course): ReferenceBatch['programme'] {
  const cuts = new Set([0, end, ...temperatures.map(([t]) => t), ...doses.map(({ t }) => t)])
  if (feed) for (const t of [feed.t_on, feed.t_off]) cuts.add(t)
  const times = [...cuts].sort((a, b) => a - b)
  const phases: ReferencePhase[] = []
  times.forEach((t, i) => {
    for (const dose of doses) if (dose.t === t) phases.push({ phase: 'dose', mass: dose.mass })
    const next = times[i + 1]
    if (next === undefined) return
    const minutes = next - t
    const to = temperatureAt(temperatures, next)
    const from = temperatureAt(temperatures, t)
    if (feed && t >= feed.t_on && next <= feed.t_off) {
      const flow = (at: number): number => feed.F0 + feed.F1 * (at - feed.t_on)
      phases.push({
        phase: 'feed',
        minutes,
        flow: flow(t),
        flowTo: flow(next),
        substrate: feed.Sf,
        enzyme: feed.Ef,
      })
    } else if (to !== from) phases.push({ phase: 'ramp', to, minutes, up: to > from })
    else phases.push({ phase: 'hold', minutes })
  })
  return { kind: 'phases', start: temperatureAt(temperatures, 0), phases }
}

function temperatureAt(breakpoints: readonly Breakpoint[], t: number): number {
  let before = breakpoints[0] ?? [0, Number.NaN]
  for (const point of breakpoints) {
    if (point[0] === t) return point[1]
    if (point[0] > t) return before[1] + ((point[1] - before[1]) * (t - before[0])) / (point[0] - before[0])
    before = point
  }
  return before[1]
}

/** How strongly a relative error of the enzyme-time shows in S: I/(Km(1 + P/Kic) + S(1 + P/Kiu) + S²/Ksi). */
export function conditionOfS({ law, charge }: ReferenceBatch, enzymeTime: number, S: number): number {
  const { Km, Kic, Kiu, Ksi, Keq } = law
  const P = charge.P0 + charge.y * (charge.S0 - S)
  const resistance =
    Km * (1 + (Kic === undefined ? 0 : P / Kic)) +
    S * (1 + (Kiu === undefined ? 0 : P / Kiu)) +
    (Ksi === undefined ? 0 : (S * S) / Ksi)
  const drive = Keq === undefined ? 1 : Math.max(0, 1 - P / (Keq * S))
  return (enzymeTime * drive) / resistance
}
