/**
 * The rate law integrated at constant volume over u = ln((S0 − Seq)/(S − Seq)), Seq = 0 without an equilibrium:
 * the enzyme-time ∫k·E dt, kg/m³, as a sum in which every term is positive, so that nothing cancels.
 *
 * Source   integrated rate equations (Segel 1975), expanded about the equilibrium instead of in powers of S.
 */
import { excess } from './decay.ts'
import type { RateConstants } from './rate-law.ts'

/** A batch as the integrated law sees it: concentrations kg/m³ at the start, y kg of product per kg. */
export interface Charge {
  readonly S0: number
  readonly P0: number
  readonly massYield: number
}

/** Substrate at equilibrium with all that the charge can form, kg/m³; 0 for an irreversible law. */
export const equilibriumSubstrate = ({ S0, P0, massYield }: Charge, Keq: number | undefined): number =>
  Keq === undefined ? 0 : (P0 + massYield * S0) / (Keq + massYield)

/** The enzyme-time by cause, kg/m³. */
export interface EnzymeTimeTerms {
  readonly saturated: number
  readonly substrateShort: number
  readonly productInhibition: number
  readonly substrateInhibition: number
}

/**
 * The enzyme-time by cause up to u.
 *
 * Shapes   u ≥ 0; for a reversible law the terms are those of the whole law, reversibility spread over them.
 */
export function enzymeTimeTerms(law: RateConstants, charge: Charge, u: number): EnzymeTimeTerms {
  const { Km, Kic, Kiu, Ksi, Keq } = law
  const { S0, P0, massYield: y } = charge
  const equilibrium = equilibriumSubstrate(charge, Keq)
  const reverse = Keq === undefined ? 1 : 1 + y / Keq
  const span = S0 - equilibrium
  const gone = -Math.expm1(-u)
  const late = excess(u)
  const substrateTime = equilibrium * u + span * gone
  const competitive = Kic === undefined ? 0 : (Km / Kic) * (P0 * u + y * span * late)
  const uncompetitive =
    Kiu === undefined
      ? 0
      : (P0 * substrateTime + y * (equilibrium * span * late + 0.5 * span * span * gone * gone)) / Kiu
  const squared =
    Ksi === undefined
      ? 0
      : (equilibrium * equilibrium * u +
          2 * equilibrium * span * gone -
          0.5 * span * span * Math.expm1(-2 * u)) /
        Ksi
  return {
    saturated: substrateTime / reverse,
    substrateShort: (Km * u) / reverse,
    productInhibition: (competitive + uncompetitive) / reverse,
    substrateInhibition: squared / reverse,
  }
}

/** The enzyme-time up to u, kg/m³. */
export function enzymeTime(law: RateConstants, charge: Charge, u: number): number {
  const terms = enzymeTimeTerms(law, charge, u)
  return terms.saturated + terms.substrateShort + terms.productInhibition + terms.substrateInhibition
}
