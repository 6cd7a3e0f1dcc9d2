/**
 * The scenario as the engine reads it: the file of the contract with every value in SI and every optional
 * part either present or absent. Forms that mean the same (half-life for kd, Q10 for Ea, activity for k) stay
 * as given; `solve` turns them into constants.
 */
import type {
  Activity,
  Concentration,
  Density,
  FirstOrderRate,
  Flow,
  Mass,
  MassFlow,
  MolarEnergy,
  MolarMass,
  Ramp,
  SpecificRate,
  Temperature,
  TemperatureDifference,
  Time,
  Volume,
  VolumetricActivity,
} from './units/quantity.ts'

export interface Scenario {
  readonly title?: string
  readonly feed: Feed
  readonly enzyme: Enzyme
  readonly programme: Programme
  readonly costs?: Costs
  readonly spreads?: Spreads
  readonly ask: Ask
}

export interface Feed {
  readonly volume: Volume
  readonly substrate: {
    readonly name?: string
    readonly molarMass?: MolarMass
    readonly concentration: Concentration
    /** The share of the substrate that reacts slowly, and how fast beside the rest. */
    readonly slow?: { readonly share: number; readonly relativeRate: number }
  }
  readonly product: {
    readonly name?: string
    /** kg of product per kg of substrate; one of this and `stoichiometry`. */
    readonly massYield?: number
    /** From molar masses instead: product's, and moles of product per mole of substrate. */
    readonly stoichiometry?: { readonly molarMass: MolarMass; readonly molesPerSubstrate: number }
    readonly concentration: Concentration
  }
}

export interface Enzyme {
  readonly name?: string
  readonly form?: string
  readonly density?: Density
  readonly rate: EnzymeRate
  readonly temperature: TemperatureEffect
  readonly pH?: PhEffect
  readonly inactivation?: Inactivation
}

export interface EnzymeRate {
  /** Exactly one of `specificRate` and `activity`. */
  readonly specificRate?: SpecificRate
  readonly activity?: {
    readonly declared: DeclaredActivity
    readonly assay: {
      readonly temperature: Temperature
      readonly pH?: number
      /** Absent: the assay saturates the enzyme. */
      readonly substrate?: Concentration
    }
  }
  /** Where `specificRate` holds; with an activity, absent means the assay's conditions. */
  readonly reference?: Conditions
  readonly Km: Concentration
  readonly Kic?: Concentration
  readonly Kiu?: Concentration
  readonly Ksi?: Concentration
  /** (kg/m³ product)/(kg/m³ substrate) at equilibrium. */
  readonly Keq?: number
}

export type DeclaredActivity =
  | { readonly per: 'mass'; readonly value: Activity }
  | { readonly per: 'volume'; readonly value: VolumetricActivity }

export interface Conditions {
  readonly temperature: Temperature
  readonly pH?: number
}

export type TemperatureEffect = (
  | { readonly Ea: MolarEnergy }
  | { readonly Q10: number; readonly from: Temperature }
) & {
  /** Two-state reversible loss: half of the enzyme is out of action at `half`. */
  readonly reversibleLoss?: { readonly half: Temperature; readonly energy: MolarEnergy }
}

export interface PkPair {
  readonly pKa1: number
  readonly pKa2: number
}

export type PhEffect = PkPair | { readonly free: PkPair; readonly complex: PkPair }

/** How fast one inactivation step runs: one of kd, half-life, D; one of Ea, z. */
export interface InactivationStep {
  readonly kd?: FirstOrderRate
  readonly halfLife?: Time
  readonly D?: Time
  readonly at: Temperature
  readonly Ea?: MolarEnergy
  readonly z?: TemperatureDifference
}

export interface Inactivation {
  /** One step: first order. Two steps: series inactivation through a form of residual activity. */
  readonly steps: readonly [InactivationStep] | readonly [InactivationStep, InactivationStep]
  /** Activity of the form after the first step, and after the second, relative to the native one. */
  readonly residual?: { readonly first: number; readonly second: number }
  /** Substrate protects: every kd is divided by 1 + S/Kp. */
  readonly Kp?: Concentration
  /** Every kd times h(pH)/h(at), h = 1 + 10^(pKa1 − pH) + 10^(pH − pKa2). */
  readonly pH?: PkPair & { readonly at: number }
}

export type Programme =
  | {
      readonly kind: 'constant'
      readonly temperature: Temperature
      readonly pH?: number
      readonly dose?: Mass
      readonly hold?: Time
      readonly countDoseVolume: boolean
    }
  | {
      readonly kind: 'phases'
      readonly start: Conditions
      readonly phases: readonly Phase[]
      readonly countDoseVolume: boolean
    }

/** A jacket: first-order approach to its temperature, the phase's ramp as an upper limit of the rate. */
export interface Jacket {
  readonly temperature: Temperature
  readonly timeConstant: Time
}

export type Phase =
  | {
      readonly phase: 'heat' | 'cool'
      readonly to: Temperature
      readonly ramp?: Ramp
      readonly jacket?: Jacket
    }
  | { readonly phase: 'dose'; readonly amount: Mass }
  | { readonly phase: 'hold'; readonly for: Time }
  | { readonly phase: 'hold'; readonly until: { readonly conversion: number }; readonly atMost: Time }
  | {
      readonly phase: 'feed'
      readonly flow: FeedFlow
      /** Absent: steady; present: the flow changes linearly to this over the phase. */
      readonly flowTo?: FeedFlow
      readonly for: Time
      readonly concentration: Concentration
      /** Enzyme preparation and product in the feed, kg/m³. */
      readonly enzyme?: Concentration
      readonly product?: Concentration
      /** Needed where the flow is given by mass. */
      readonly density?: Density
    }
  | { readonly phase: 'adjust'; readonly pH: number }
  | {
      readonly phase: 'inactivate'
      readonly to: Temperature
      readonly ramp?: Ramp
      readonly jacket?: Jacket
      readonly hold: Time
    }

export type FeedFlow =
  | { readonly per: 'volume'; readonly value: Flow }
  | { readonly per: 'mass'; readonly value: MassFlow }

/** Money per SI unit, all in the one currency named. */
export interface Costs {
  readonly currency: string
  /** per kg of preparation */
  readonly enzyme?: number
  /** per s of vessel time */
  readonly vessel?: number
  readonly turnaround?: Time
}

/** Relative standard deviations, except temperature (K) and pH. */
export interface Spreads {
  readonly rate?: number
  readonly Km?: number
  readonly Kic?: number
  readonly Kiu?: number
  readonly Ksi?: number
  readonly Keq?: number
  readonly kd?: number
  readonly lotActivity?: number
  readonly dose?: number
  readonly concentration?: number
  readonly temperature?: TemperatureDifference
  readonly pH?: number
}

export type Ask =
  | { readonly find: 'time'; readonly conversion: number }
  | { readonly find: 'dose'; readonly conversion: number; readonly within: Time }
  | {
      readonly find: 'temperature'
      readonly best: 'time'
      readonly conversion: number
      readonly between: readonly [Temperature, Temperature]
    }
  | {
      readonly find: 'temperature'
      readonly best: 'conversion'
      readonly within: Time
      readonly between: readonly [Temperature, Temperature]
    }
  | { readonly find: 'trace'; readonly at: readonly Time[] }
