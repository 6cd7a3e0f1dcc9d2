/** The enzyme of a scenario as functions of temperature and pH: what the forms in the file come to. */
import { activityPerMass, specificRateFromActivity } from '../kinetics/activity.ts'
import { rateConstant } from '../kinetics/arrhenius.ts'
import { gasConstant } from '../kinetics/gas-constant.ts'
import { EaFromZ, kdFromD, kdFromHalfLife } from '../kinetics/heat-resistance.ts'
import { massYieldOf } from '../kinetics/hydrolysis-gain.ts'
import { ionisationRatio } from '../kinetics/ionisation-ratio.ts'
import { bellOptimum } from '../kinetics/ph-bell.ts'
import { phInactivationFactor } from '../kinetics/ph-inactivation.ts'
import { EaFromQ10 } from '../kinetics/q10.ts'
import type { RateConstants } from '../kinetics/rate-law.ts'
import { activeShare } from '../kinetics/reversible-loss.ts'
import type { Conditions, Enzyme, EnzymeRate, Feed, InactivationStep, PhEffect } from '../scenario.ts'
import {
  type Density,
  type MolarEnergy,
  quantity,
  type SpecificRate,
  type Temperature,
} from '../units/quantity.ts'

export interface EnzymeModel {
  /** At one pH, k of temperature: kg of substrate per kg of preparation and s. */
  readonly k: (pH: number | undefined) => (T: number) => number
  /** The law's constants at a pH; they move with it only in the full pH model. */
  readonly law: (pH: number | undefined) => RateConstants
  readonly lawMovesWithPh: boolean
  readonly inactivation?: InactivationModel
  /** pH of the highest rate; of the bell, or with the full model of the complex (the saturated enzyme). */
  readonly bestPh?: number
  readonly massYield: number
  /** Largest |d ln k/d(−1/T)| and |d ln kd/d(−1/T)|, and that of the reversible loss alone, K: how to cut a ramp. */
  readonly steepness: { readonly rate: number; readonly inactivation: number; readonly loss: number }
}

export interface InactivationModel {
  /** At one pH, the first step's constant of temperature, 1/s, without substrate. */
  readonly k1: (pH: number | undefined) => (T: number) => number
  /** The same for the second step of a series. */
  readonly k2?: (pH: number | undefined) => (T: number) => number
  readonly residual: { readonly first: number; readonly second: number }
  readonly Kp?: number
}

/** The functions and constants of a scenario's enzyme acting on its feed. */
export function enzymeModel(enzyme: Enzyme, feed: Feed): EnzymeModel {
  const { rate, temperature, pH: phEffect } = enzyme
  const at = measuredAt(rate)
  const kRef = specificRate(enzyme, feed)
  const Ea: MolarEnergy = 'Ea' in temperature ? temperature.Ea : EaFromQ10(temperature.Q10, temperature.from)
  const ea = Ea / gasConstant
  const Tref = at.temperature
  const loss = temperature.reversibleLoss
  const lossRef = loss ? activeShare(loss.half, loss.energy, Tref) : 1
  const kNorm = kRef / lossRef
  const k = latest((pH) => {
    const followed = phEffect && pH !== undefined && at.pH !== undefined
    const kHere = followed ? kNorm * rateRatio(phEffect, at.pH, pH) : kNorm
    const arrhenius = rateConstant(kHere, ea, Tref)
    if (!loss) return arrhenius
    return (T: number): number => arrhenius(T) * activeShare(loss.half, loss.energy, quantity<Temperature>(T))
  })
  const constants: RateConstants = {
    Km: rate.Km,
    ...(rate.Kic !== undefined && { Kic: rate.Kic }),
    ...(rate.Kiu !== undefined && { Kiu: rate.Kiu }),
    ...(rate.Ksi !== undefined && { Ksi: rate.Ksi }),
    ...(rate.Keq !== undefined && { Keq: rate.Keq }),
  }
  const full = phEffect && 'free' in phEffect ? phEffect : undefined
  const law = (pH: number | undefined): RateConstants =>
    full && pH !== undefined && at.pH !== undefined
      ? {
          ...constants,
          Km: rate.Km * ionisationRatio(full.free, pH, at.pH) * ionisationRatio(full.complex, at.pH, pH),
        }
      : constants
  const inactivation = enzyme.inactivation && inactivationModel(enzyme.inactivation)
  return {
    k,
    law,
    lawMovesWithPh: full !== undefined,
    ...(inactivation && { inactivation: inactivation.model }),
    ...(phEffect && {
      bestPh: bellOptimum(full ? full.complex : (phEffect as { pKa1: number; pKa2: number })),
    }),
    massYield: massYieldOfFeed(feed),
    steepness: {
      rate: Math.abs(ea) + (loss ? loss.energy / gasConstant : 0),
      inactivation: inactivation?.steepness ?? 0,
      loss: loss ? loss.energy / gasConstant : 0,
    },
  }
}

/** Where the rate constant holds: the assay's conditions for an activity, the reference otherwise. */
export function measuredAt(rate: EnzymeRate): Conditions {
  if (rate.activity) return rate.activity.assay
  if (rate.reference) return rate.reference
  throw new Error('a specific rate without its reference passed validation')
}

function specificRate(enzyme: Enzyme, feed: Feed): SpecificRate {
  const { specificRate: stated, activity, Km } = enzyme.rate
  if (stated !== undefined) return stated
  const molarMass = feed.substrate.molarMass
  if (!activity || molarMass === undefined)
    throw new Error('an activity without molar mass passed validation')
  const { declared, assay } = activity
  const perMass =
    declared.per === 'mass' ? declared.value : activityPerMass(declared.value, densityOf(enzyme))
  return specificRateFromActivity(perMass, molarMass, Km, assay.substrate)
}

function densityOf({ density }: Enzyme): Density {
  if (density === undefined) throw new Error('an activity per volume without density passed validation')
  return density
}

/** Rate at a pH over the one at the pH of measurement. */
const rateRatio = (effect: PhEffect, measured: number, pH: number): number =>
  ionisationRatio('free' in effect ? effect.complex : effect, measured, pH)

type OfTemperature = (T: number) => number

/** Keeps the function of the pH asked for last: a programme asks for the same one run after run. */
function latest(make: (pH: number | undefined) => OfTemperature): (pH: number | undefined) => OfTemperature {
  let at: number | undefined
  let made: OfTemperature | undefined
  return (pH) => {
    if (made === undefined || pH !== at) {
      made = make(pH)
      at = pH
    }
    return made
  }
}

function massYieldOfFeed({ substrate, product }: Feed): number {
  if (product.massYield !== undefined) return product.massYield
  const { stoichiometry } = product
  if (!stoichiometry || substrate.molarMass === undefined)
    throw new Error('a product without mass yield or molar masses passed validation')
  return massYieldOf(stoichiometry.molarMass, substrate.molarMass, stoichiometry.molesPerSubstrate)
}

function inactivationModel(stated: NonNullable<Enzyme['inactivation']>): {
  readonly model: InactivationModel
  readonly steepness: number
} {
  const [first, second] = stated.steps
  const effect = stated.pH
  const withPh = ({ kd, ed, at }: { kd: number; ed: number; at: number }) =>
    latest((pH) =>
      rateConstant(effect && pH !== undefined ? kd * phInactivationFactor(effect, pH) : kd, ed, at),
    )
  const one = stepConstants(first)
  const two = second && stepConstants(second)
  return {
    model: {
      k1: withPh(one),
      ...(two && { k2: withPh(two) }),
      residual: stated.residual ?? { first: 0, second: 0 },
      ...(stated.Kp !== undefined && { Kp: stated.Kp }),
    },
    steepness: Math.max(one.ed, two?.ed ?? 0),
  }
}

/** kd at its temperature, and Ea/R, of one stated step. */
function stepConstants(step: InactivationStep): { kd: number; ed: number; at: number } {
  const kd =
    step.kd ??
    (step.halfLife !== undefined
      ? kdFromHalfLife(step.halfLife)
      : step.D !== undefined
        ? kdFromD(step.D)
        : undefined)
  const Ea = step.Ea ?? (step.z !== undefined ? EaFromZ(step.z, step.at) : undefined)
  if (kd === undefined || Ea === undefined)
    throw new Error('an inactivation without kd or Ea passed validation')
  return { kd, ed: Ea / gasConstant, at: step.at }
}
