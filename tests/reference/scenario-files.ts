/**
 * The batches of the sourced cases as scenario files, in the many forms that say the same: units, half-life or D for
 * kd, z or Q10 for an energy, activities for a rate, moles for grams, phases for the short form.
 *
 * Shapes   a form is a whole number; each part of the file picks one of its own forms by it.
 */
import type { ReferenceBatch, ReferencePhase } from './batches.ts'

export type Json = string | number | boolean | readonly Json[] | { readonly [key: string]: Json }

/** What a file asks, with times in min and temperatures in degC. */
export type AskOf =
  | { readonly find: 'time'; readonly conversion: number }
  | { readonly find: 'dose'; readonly conversion: number; readonly within: number }
  | { readonly find: 'trace'; readonly at: readonly number[] }
  | {
      readonly find: 'temperature'
      readonly best: 'time'
      readonly conversion: number
      readonly between: readonly [number, number]
    }
  | {
      readonly find: 'temperature'
      readonly best: 'conversion'
      readonly within: number
      readonly between: readonly [number, number]
    }

const R = 8.31446261815324
const kelvin = (T: number): number => T + 273.15
/** g/mol */
const M = 342.3
/** kg/L */
const preparation = 1.15
/** g/L in the assay */
const assayed = 50

/** Writes quantities in the forms that one number picks. */
const writer = (form: number) => {
  /** One of several, by its own turn, so that the forms of different parts combine. */
  const pick = <T>(turn: number, ...choices: readonly [T, ...T[]]): T =>
    choices[Math.floor(form / turn) % choices.length] ?? choices[0]
  return {
    pick,
    concentration: (x: number): string =>
      pick(1, `${x} g/L`, `${(1000 * x) / M} mmol/L`, `${x} kg/m3`, `${1000 * x} mg/L`, `${x / M} mol/L`),
    volume: (L: number): string => pick(1, `${L / 1000} m3`, `${L} L`),
    mass: (mg: number): string => pick(1, `${mg / 1e6} kg`, `${mg / 1000} g`, `${mg} mg`),
    time: (min: number): string => pick(1, `${min} min`, `${min / 60} h`, `${60 * min} s`, `${min / 1440} d`),
    temperature: (T: number): string => pick(1, `${T} degC`, `${T} degC`, `${kelvin(T)} K`),
    energy: (kJ: number): string => pick(1, `${kJ} kJ/mol`, `${1000 * kJ} J/mol`, `${kJ / 4.184} kcal/mol`),
    firstOrder: (kd: number): string => pick(2, `${kd} 1/min`, `${60 * kd} 1/h`, `${1440 * kd} 1/d`),
    ramp: (perMinute: number): string =>
      pick(
        1,
        `${perMinute} K/min`,
        `${60 * perMinute} K/h`,
        `${perMinute} degC/min`,
        `${60 * perMinute} degC/h`,
      ),
    flow: (litres: number): string =>
      pick(
        1,
        `${litres} L/min`,
        `${60 * litres} L/h`,
        `${(60 * litres) / 1000} m3/h`,
        `${1000 * litres} mL/min`,
      ),
  }
}

type Writer = ReturnType<typeof writer>

/** The scenario of a batch in one of its forms. */
export function scenarioFile(batch: ReferenceBatch, ask: AskOf, form: number): Json {
  const write = writer(form)
  const { charge, law, rate, programme } = batch
  const loss = lossOf(batch, write)
  return {
    format: 'dosewright-scenario',
    version: 1,
    feed: {
      volume: write.volume(charge.V),
      substrate: { molarMass: `${M} g/mol`, concentration: write.concentration(charge.S0) },
      product: {
        ...write.pick<Json & object>(
          3,
          { massYield: charge.y },
          { molarMass: `${(charge.y * M) / 2} g/mol`, molesPerSubstrate: 2 },
        ),
        concentration: write.concentration(charge.P0),
      },
    },
    enzyme: {
      density: `${preparation} kg/L`,
      rate: {
        ...rateOf(batch, write),
        Km: write.concentration(law.Km),
        ...(law.Kic !== undefined && { Kic: write.concentration(law.Kic) }),
        ...(law.Kiu !== undefined && { Kiu: write.concentration(law.Kiu) }),
        ...(law.Ksi !== undefined && { Ksi: write.concentration(law.Ksi) }),
        ...(law.Keq !== undefined && { Keq: law.Keq }),
      },
      temperature: write.pick<Json>(
        2,
        { Ea: write.energy(rate.Ea) },
        {
          Q10: Math.exp((1e4 * rate.Ea) / (R * kelvin(30) * kelvin(40))),
          from: write.temperature(30),
        },
      ),
      ...(batch.pHFactor !== undefined && { pH: bell }),
      ...(loss && { inactivation: loss }),
    },
    programme:
      programme.kind === 'constant'
        ? constantly(batch, programme, ask, write)
        : {
            start: {
              temperature: write.temperature(programme.start),
              ...(batch.pHFactor !== undefined && { pH: offBest(batch.pHFactor) }),
            },
            phases: phasesOf(programme.start, programme.phases, write),
          },
    ask: askOf(ask, write),
  }
}

/** Specific rates in their units, at another temperature, or behind an activity with its assay. */
function rateOf({ rate, law, pHFactor }: ReferenceBatch, write: Writer): { readonly [key: string]: Json } {
  const pH = pHFactor === undefined ? {} : { pH: best }
  const at = (T: number): { readonly [key: string]: Json } => ({
    temperature: write.temperature(T),
    ...pH,
  })
  const reference = at(rate.at)
  const colder = rate.at - 7
  const slower = Math.exp(((-1000 * rate.Ea) / R) * (1 / kelvin(colder) - 1 / kelvin(rate.at)))
  // g/(mg min) is 1000 g/(g min), and that times 1e6/M umol/(g min).
  const units = (rate.kcat * 1e9) / M
  const unsaturated = (units * assayed) / (law.Km + assayed)
  return write.pick<{ readonly [key: string]: Json }>(
    1,
    { specificRate: `${rate.kcat} g/mg/min`, reference },
    { specificRate: `${1000 * rate.kcat} mg/mg/min`, reference },
    {
      activity: {
        declared: `${unsaturated} U/g`,
        assay: { ...reference, substrate: write.concentration(assayed) },
      },
    },
    { specificRate: `${60_000 * rate.kcat * slower} g/g/h`, reference: at(colder) },
    { activity: { declared: `${units / 60_000} kat/kg`, assay: reference } },
    { activity: { declared: `${units * preparation} U/mL`, assay: reference } },
    { activity: { declared: `${(1000 * units) / 60} nkat/g`, assay: reference }, reference },
  )
}

function lossOf({ loss, series }: ReferenceBatch, write: Writer): Json | undefined {
  const step = (kd: number, at: number, Ed: number): { readonly [key: string]: Json } => {
    const kept = kd > 0 && write.pick(1, false, true, true)
    const z = (Math.LN10 * R * kelvin(at) ** 2) / (1000 * Ed)
    return {
      ...(kept
        ? write.pick<{ readonly [key: string]: Json }>(
            2,
            { halfLife: write.time(Math.LN2 / kd) },
            { D: write.time(Math.LN10 / kd) },
          )
        : { kd: write.firstOrder(kd) }),
      at: write.temperature(at),
      ...write.pick<{ readonly [key: string]: Json }>(2, { Ea: write.energy(Ed) }, { z: `${z} K` }),
    }
  }
  if (series) {
    return {
      series: [
        { ...step(series.k1, series.at, 200), residual: series.alpha1 },
        { ...step(series.k2, series.at, 150), residual: series.alpha2 },
      ],
    }
  }
  return loss && step(loss.kd, loss.at, loss.Ed)
}

/** The short form, or the same as phases where what is asked does not look past their end. */
function constantly(
  { charge }: ReferenceBatch,
  { T, dose }: { readonly T: number; readonly dose: number },
  ask: AskOf,
  write: Writer,
): Json {
  const amount = write.mass(dose * charge.V)
  const short: Json = {
    temperature: write.temperature(T),
    ...(ask.find === 'dose' && write.pick(3, true, false) ? {} : { dose: amount }),
  }
  if (ask.find !== 'trace') return short
  const hold: Json = { phase: 'hold', for: write.time(Math.max(1, ask.at.at(-1) ?? 1)) }
  return write.pick<Json>(
    2,
    short,
    { start: { temperature: write.temperature(T) }, phases: [{ phase: 'dose', amount }, hold] },
    {
      start: { temperature: write.temperature(T - 30) },
      phases: [{ phase: 'heat', to: write.temperature(T) }, { phase: 'dose', amount }, hold],
    },
  )
}

function phasesOf(start: number, phases: readonly ReferencePhase[], write: Writer): Json {
  const written: Json[] = []
  let T = start
  for (let i = 0; i < phases.length; i++) {
    const phase = phases[i]
    const next = phases[i + 1]
    if (phase === undefined) break
    if (phase.phase === 'ramp') {
      const ramp = write.ramp(Math.abs(phase.to - T) / phase.minutes)
      T = phase.to
      const to = write.temperature(T)
      if (phase.up && next?.phase === 'hold' && T > 80) {
        written.push({ phase: 'inactivate', to, ramp, hold: write.time(next.minutes) })
        i += 1
      } else written.push({ phase: phase.up ? 'heat' : 'cool', to, ramp })
    } else if (phase.phase === 'dose') written.push({ phase: 'dose', amount: write.mass(phase.mass) })
    else if (phase.phase === 'hold') written.push({ phase: 'hold', for: write.time(phase.minutes) })
    else written.push(feedOf(phase, write))
  }
  return written
}

function feedOf(phase: Extract<ReferencePhase, { readonly phase: 'feed' }>, write: Writer): Json {
  const { minutes, flow, flowTo, substrate, enzyme } = phase
  const density = 1.05
  const byMass = write.pick(2, false, true)
  const text = (litres: number): string => (byMass ? `${60 * litres * density} kg/h` : write.flow(litres))
  return {
    phase: 'feed',
    for: write.time(minutes),
    flow: text(flow),
    ...(flowTo !== flow && { flowTo: text(flowTo) }),
    ...(byMass && { density: `${density} kg/L` }),
    concentration: write.concentration(substrate),
    ...(enzyme > 0 && { enzyme: write.pick(1, `${enzyme} mg/L`, `${enzyme / 1000} g/L`) }),
  }
}

function askOf(ask: AskOf, write: Writer): Json {
  switch (ask.find) {
    case 'time':
      return { find: 'time', conversion: ask.conversion }
    case 'dose':
      return { find: 'dose', conversion: ask.conversion, within: write.time(ask.within) }
    case 'trace':
      return { find: 'trace', at: ask.at.map(write.time) }
    case 'temperature': {
      const between = ask.between.map(write.temperature)
      return ask.best === 'time'
        ? { find: 'temperature', best: 'time', conversion: ask.conversion, between }
        : { find: 'temperature', best: 'conversion', within: write.time(ask.within), between }
    }
  }
}

const bell = { pKa1: 5.2, pKa2: 8.1 }
const best = 6.65

/** The pH on the acid side at which the bell falls to a share of its top. */
function offBest(share: number): number {
  const height = (pH: number): number => 1 / (1 + 10 ** (bell.pKa1 - pH) + 10 ** (pH - bell.pKa2))
  let [low, high] = [0, best]
  for (let i = 0; i < 60; i++) {
    const middle = 0.5 * (low + high)
    if (height(middle) < share * height(best)) low = middle
    else high = middle
  }
  return high
}
