/** The scenarios of the benchmark: pseudo-random, from a fixed seed, each reaching its target. */
import { enzymeTime } from '../../engine/kinetics/integrated-rate-law.ts'
import type { Enzyme, Feed, Phase, Programme } from '../../engine/scenario.ts'
import { enzymeModel } from '../../engine/solve/enzyme-model.ts'
import { odeRoute } from '../../engine/solve/ode-route.ts'
import type { Batch } from '../../engine/solve/route.ts'
import { timeline } from '../../engine/solve/timeline.ts'
import {
  celsius,
  gramsPerLitre,
  hours,
  kilojoulesPerMole,
  perHour,
  quantity,
} from '../../engine/units/quantity.ts'

export const gas = 8.31446261815324
export const S0 = 45
export const Km = 8
export const Kic = 5
export const massYield = 0.526
export const k50 = 20
export const Ea = 45
export const kd50 = 0.05
export const EaLoss = 180
export const T50 = 323.15
export const conversion = 0.95

/** Linear congruential numbers in [0, 1), the same on every machine. */
export function randomNumbers(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0
    return state / 2 ** 32
  }
}

export const feed: Feed = {
  volume: quantity(1),
  substrate: { concentration: gramsPerLitre(S0) },
  product: { massYield, concentration: gramsPerLitre(0) },
}

export const enzyme = (km = Km): Enzyme => ({
  rate: {
    specificRate: quantity(k50 / 3600),
    reference: { temperature: quantity(T50) },
    Km: gramsPerLitre(km),
    Kic: gramsPerLitre(Kic),
  },
  temperature: { Ea: kilojoulesPerMole(Ea) },
  inactivation: { steps: [{ kd: perHour(kd50), at: quantity(T50), Ea: kilojoulesPerMole(EaLoss) }] },
})

/** A scenario ready to run: dose in kg/m³ into one m³, hold temperature in K. */
export interface Case {
  readonly dose: number
  readonly T: number
  readonly batch: Batch
}

/** Batch of the standard enzyme and feed under a programme. */
export const batchUnder = (programme: Programme, of: Enzyme = enzyme(), what: Feed = feed): Batch => ({
  feed: what,
  model: enzymeModel(of, what),
  timeline: timeline(programme),
})

const constantProgramme = (dose: number, T: number): Programme => ({
  kind: 'constant',
  temperature: quantity(T),
  dose: quantity(dose),
  countDoseVolume: false,
})

/** Dose 0.5..4 g/L, 45..65 °C, kept when reached within 86 h and not within a hundredth of the edge. */
export function constantCases(count: number, km = Km, X = conversion): Case[] {
  const random = randomNumbers(20261)
  const cases: Case[] = []
  const needed = enzymeTime({ Km: km, Kic }, { S0, P0: 0, massYield }, -Math.log1p(-X))
  while (cases.length < count) {
    const dose = 0.5 * 8 ** random()
    const T = celsius(45 + 20 * random())
    const k = k50 * Math.exp(((Ea * 1000) / gas) * (1 / T50 - 1 / T))
    const kd = kd50 * Math.exp(((EaLoss * 1000) / gas) * (1 / T50 - 1 / T))
    const x = (kd * needed) / (k * dose)
    if (x > 0.99 || -Math.log1p(-x) / kd > 86) continue
    cases.push({ dose, T, batch: batchUnder(constantProgramme(dose, T), enzyme(km)) })
  }
  return cases
}

/** Temperature falling 0.3 K/h from the start to 30 °C below it. */
export function rampCases(count: number): Case[] {
  return constantCases(count).map(({ dose, T }) => ({
    dose,
    T,
    batch: batchUnder({
      kind: 'phases',
      start: { temperature: quantity(T) },
      phases: [
        { phase: 'dose', amount: quantity(dose) },
        { phase: 'cool', to: quantity(T - 30), ramp: quantity(0.3 / 3600) },
      ],
      countDoseVolume: false,
    }),
  }))
}

/** Heat-up, dose, hold, second dose, cool-down, long hold: six phases, the target in the last. */
export const sixPhases = (dose: number, T: number): readonly Phase[] => [
  { phase: 'dose', amount: quantity(0.5 * dose) },
  { phase: 'heat', to: quantity(T), ramp: quantity(0.5 / 60) },
  { phase: 'hold', for: hours(1) },
  { phase: 'dose', amount: quantity(0.5 * dose) },
  { phase: 'cool', to: quantity(T - 6), ramp: quantity(0.2 / 60) },
  { phase: 'hold', for: hours(90) },
]

export function programmeCases(count: number): Case[] {
  return constantCases(count).map(({ dose, T }) => ({
    dose,
    T,
    batch: batchUnder({
      kind: 'phases',
      start: { temperature: celsius(20) },
      phases: sixPhases(dose, T),
      countDoseVolume: false,
    }),
  }))
}

/** Substrate fed in for two hours after an hour's hold. */
export const feeding = { flow: 0.1 / 3600, duration: 2 * 3600, concentration: 150, before: 3600 }

/** Only those whose enzyme lasts: an unreachable target is no matter for a race. */
export function feedCases(count: number): Case[] {
  const cases = constantCases(3 * count).map(({ dose, T }) => ({
    dose,
    T,
    batch: batchUnder({
      kind: 'phases',
      start: { temperature: quantity(T) },
      phases: [
        { phase: 'dose', amount: quantity(dose) },
        { phase: 'hold', for: quantity(feeding.before) },
        {
          phase: 'feed',
          flow: { per: 'volume', value: quantity(feeding.flow) },
          for: quantity(feeding.duration),
          concentration: gramsPerLitre(feeding.concentration),
        },
        { phase: 'hold', for: hours(200) },
      ],
      countDoseVolume: false,
    }),
  }))
  return cases
    .filter(({ batch }) => {
      const run = odeRoute(batch)({ doseScale: 1, target: conversion, endless: false })
      return run.ok && run.value.reachedAt !== undefined
    })
    .slice(0, count)
}
