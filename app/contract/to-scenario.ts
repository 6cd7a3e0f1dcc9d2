/**
 * From the file as read to the scenario of the engine: molar values become masses, alternatives take their
 * engine shape.
 *
 * Units    SI on both sides; molar concentrations are of the substrate (mol/m³ times kg/mol is kg/m³).
 */
import {
  type Ask,
  type Concentration,
  type Costs,
  type Enzyme,
  type EnzymeRate,
  type Feed,
  type Inactivation,
  type InactivationStep,
  type MolarMass,
  type Phase,
  type PhEffect,
  type Programme,
  quantity,
  type Scenario,
  type SpecificRate,
  type TemperatureEffect,
} from '../../engine/index.ts'
import type { ScenarioFile } from './definition/scenario-file.ts'

/** Takes a value by mass as it is, and a molar one times the substrate's molar mass. */
type ByMass = <Q extends Concentration | SpecificRate>(given: Molar<Q>) => Q

type Molar<Q> = { readonly by: 'mass'; readonly value: Q } | { readonly by: 'amount'; readonly value: number }

/** The scenario a sound file describes. */
export const toScenario = (file: ScenarioFile): Scenario => {
  const byMass = massWith(file.feed.substrate.molarMass)
  const costs = file.costs === undefined ? undefined : toCosts(file.costs)
  return {
    ...(file.title === undefined ? {} : { title: file.title }),
    feed: toFeed(file.feed, byMass),
    enzyme: toEnzyme(file.enzyme, byMass),
    programme: toProgramme(file.programme, byMass),
    ...(costs === undefined ? {} : { costs }),
    ...(file.spreads === undefined ? {} : { spreads: file.spreads }),
    ask: file.ask satisfies Ask,
  }
}

const massWith =
  (molarMass: MolarMass | undefined): ByMass =>
  (given) =>
    given.by === 'mass' ? given.value : quantity(given.value * due(molarMass))

const toFeed = (feed: ScenarioFile['feed'], byMass: ByMass): Feed => {
  const { molarMass, molesPerSubstrate, ...product } = feed.product
  return {
    ...feed,
    substrate: { ...feed.substrate, concentration: byMass(feed.substrate.concentration) },
    product: {
      ...product,
      ...(molarMass === undefined
        ? {}
        : { stoichiometry: { molarMass, molesPerSubstrate: molesPerSubstrate ?? 1 } }),
      concentration: byMass(product.concentration),
    },
  }
}

const toEnzyme = (enzyme: ScenarioFile['enzyme'], byMass: ByMass): Enzyme => {
  const { rate, temperature, pH, inactivation, ...rest } = enzyme
  const { specificRate, activity, Km, Kic, Kiu, Ksi, ...plain } = rate
  return {
    ...rest,
    rate: {
      ...plain,
      ...(specificRate === undefined ? {} : { specificRate: byMass(specificRate) }),
      ...(activity === undefined ? {} : { activity: toActivity(activity, byMass) }),
      Km: byMass(Km),
      ...(Kic === undefined ? {} : { Kic: byMass(Kic) }),
      ...(Kiu === undefined ? {} : { Kiu: byMass(Kiu) }),
      ...(Ksi === undefined ? {} : { Ksi: byMass(Ksi) }),
    },
    temperature: toTemperature(temperature),
    ...(pH === undefined ? {} : { pH: toPh(pH) }),
    ...(inactivation === undefined ? {} : { inactivation: toInactivation(inactivation, byMass) }),
  }
}

const toActivity = (
  given: NonNullable<ScenarioFile['enzyme']['rate']['activity']>,
  byMass: ByMass,
): NonNullable<EnzymeRate['activity']> => {
  const { substrate, ...assay } = given.assay
  const amount = substrate === undefined ? {} : { substrate: byMass(substrate) }
  return { declared: given.declared, assay: { ...assay, ...amount } }
}

const toTemperature = (given: ScenarioFile['enzyme']['temperature']): TemperatureEffect => {
  const { Ea, Q10, from, reversibleLoss } = given
  const loss = reversibleLoss === undefined ? {} : { reversibleLoss }
  return Ea === undefined ? { Q10: due(Q10), from: due(from), ...loss } : { Ea, ...loss }
}

const toPh = (given: NonNullable<ScenarioFile['enzyme']['pH']>): PhEffect =>
  given.free === undefined
    ? { pKa1: due(given.pKa1), pKa2: due(given.pKa2) }
    : { free: given.free, complex: due(given.complex) }

const toInactivation = (
  given: NonNullable<ScenarioFile['enzyme']['inactivation']>,
  byMass: ByMass,
): Inactivation => {
  const { series, Kp, pH, at, ...step } = given
  const beside = { ...(Kp === undefined ? {} : { Kp: byMass(Kp) }), ...(pH === undefined ? {} : { pH }) }
  if (series === undefined) return { steps: [{ ...step, at: due(at) }], ...beside }
  const [one, two] = series
  const { residual: first, ...firstStep } = due(one)
  const { residual: second, ...secondStep } = due(two)
  const steps: readonly [InactivationStep, InactivationStep] = [firstStep, secondStep]
  return { steps, residual: { first, second }, ...beside }
}

const toProgramme = (given: ScenarioFile['programme'], byMass: ByMass): Programme => {
  const { start, phases, temperature, countDoseVolume = false, ...short } = given
  if (phases === undefined) {
    return { kind: 'constant', temperature: due(temperature), ...short, countDoseVolume }
  }
  return {
    kind: 'phases',
    start: due(start),
    phases: phases.map((phase) => toPhase(phase, byMass)),
    countDoseVolume,
  }
}

type FilePhase = NonNullable<ScenarioFile['programme']['phases']>[number]

const toPhase = (given: FilePhase, byMass: ByMass): Phase => {
  if (given.phase === 'feed') {
    const { concentration, product, ...rest } = given
    const amount = product === undefined ? {} : { product: byMass(product) }
    return { ...rest, concentration: byMass(concentration), ...amount }
  }
  if (given.phase !== 'hold') return given
  return given.until === undefined
    ? { phase: 'hold', for: due(given.for) }
    : { phase: 'hold', until: given.until, atMost: due(given.atMost) }
}

const toCosts = (given: NonNullable<ScenarioFile['costs']>): Costs | undefined => {
  const { enzyme, vessel, turnaround } = given
  const currency = (enzyme ?? vessel)?.currency
  if (currency === undefined) return undefined
  return {
    currency,
    ...(enzyme === undefined ? {} : { enzyme: enzyme.value }),
    ...(vessel === undefined ? {} : { vessel: vessel.value }),
    ...(turnaround === undefined ? {} : { turnaround }),
  }
}

/** What the rules of the file have promised. */
const due = <T>(value: T | undefined): T => {
  if (value === undefined) throw new Error('a rule of the scenario file let through what it should refuse')
  return value
}
