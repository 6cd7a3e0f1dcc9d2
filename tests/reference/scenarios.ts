/** The batches of the sourced cases as the engine reads them: SI. */
import type { Ask, Phase, Scenario } from '../../engine/scenario.ts'
import {
  type Concentration,
  celsius,
  type FirstOrderRate,
  type Flow,
  type Mass,
  type MolarEnergy,
  minutes,
  quantity,
  type Ramp,
  type SpecificRate,
  type Volume,
} from '../../engine/units/quantity.ts'
import type { ReferenceBatch, ReferencePhase } from './batches.ts'

const grams = (perLitre: number): Concentration => quantity<Concentration>(perLitre)
const milligrams = (mg: number): Mass => quantity<Mass>(mg / 1e6)
const kilojoules = (kJ: number): MolarEnergy => quantity<MolarEnergy>(1000 * kJ)
const perMinute = (kd: number): FirstOrderRate => quantity<FirstOrderRate>(kd / 60)
const litresPerMinute = (flow: number): Flow => quantity<Flow>(flow / 1000 / 60)

/** The scenario of a batch; what it asks matters only to `plan`. */
export function scenarioOf(batch: ReferenceBatch, ask: Ask = { find: 'trace', at: [] }): Scenario {
  const { charge, law, rate, loss, series, programme, pHFactor = 1 } = batch
  return {
    feed: {
      volume: quantity<Volume>(charge.V / 1000),
      substrate: { concentration: grams(charge.S0) },
      product: { massYield: charge.y, concentration: grams(charge.P0) },
    },
    enzyme: {
      rate: {
        specificRate: quantity<SpecificRate>((pHFactor * rate.kcat * 1000) / 60),
        reference: { temperature: celsius(rate.at) },
        Km: grams(law.Km),
        ...(law.Kic !== undefined && { Kic: grams(law.Kic) }),
        ...(law.Kiu !== undefined && { Kiu: grams(law.Kiu) }),
        ...(law.Ksi !== undefined && { Ksi: grams(law.Ksi) }),
        ...(law.Keq !== undefined && { Keq: law.Keq }),
      },
      temperature: { Ea: kilojoules(rate.Ea) },
      ...(loss && {
        inactivation: {
          steps: [{ kd: perMinute(loss.kd), at: celsius(loss.at), Ea: kilojoules(loss.Ed) }],
        },
      }),
      ...(series && {
        inactivation: {
          steps: [
            { kd: perMinute(series.k1), at: celsius(series.at), Ea: kilojoules(200) },
            { kd: perMinute(series.k2), at: celsius(series.at), Ea: kilojoules(150) },
          ],
          residual: { first: series.alpha1, second: series.alpha2 },
        },
      }),
    },
    programme:
      programme.kind === 'constant'
        ? {
            kind: 'constant',
            temperature: celsius(programme.T),
            dose: milligrams(programme.dose * charge.V),
            countDoseVolume: false,
          }
        : {
            kind: 'phases',
            start: { temperature: celsius(programme.start) },
            phases: phasesOf(programme.start, programme.phases),
            countDoseVolume: false,
          },
    ask,
  }
}

function phasesOf(start: number, phases: readonly ReferencePhase[]): Phase[] {
  let T = start
  return phases.map((phase) => {
    const made = phaseOf(phase, T)
    if (phase.phase === 'ramp') T = phase.to
    return made
  })
}

function phaseOf(phase: ReferencePhase, from: number): Phase {
  switch (phase.phase) {
    case 'dose':
      return { phase: 'dose', amount: milligrams(phase.mass) }
    case 'hold':
      return { phase: 'hold', for: minutes(phase.minutes) }
    case 'ramp': {
      const ramp = quantity<Ramp>(Math.abs(phase.to - from) / phase.minutes / 60)
      return { phase: phase.up ? 'heat' : 'cool', to: celsius(phase.to), ramp }
    }
    case 'feed':
      return {
        phase: 'feed',
        for: minutes(phase.minutes),
        flow: { per: 'volume', value: litresPerMinute(phase.flow) },
        ...(phase.flowTo !== phase.flow && {
          flowTo: { per: 'volume', value: litresPerMinute(phase.flowTo) },
        }),
        concentration: grams(phase.substrate),
        ...(phase.enzyme > 0 && { enzyme: grams(phase.enzyme / 1000) }),
      }
  }
}
