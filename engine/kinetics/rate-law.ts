/**
 * The rate law: saturation with substrate, inhibition by product and by substrate, reversibility.
 *
 * v = k·E·saturation, saturation = (S − P/Keq) / (Km(1 + P/Kic) + S(1 + P/Kiu) + S²/Ksi).
 *
 * Units    every K and concentration kg/m³, Keq plain; an absent constant means that its term is absent.
 * Source   Cornish-Bowden, Fundamentals of Enzyme Kinetics; Segel 1975; the reversible numerator is
 *          Haldane-consistent.
 */
export interface RateConstants {
  readonly Km: number
  readonly Kic?: number
  readonly Kiu?: number
  readonly Ksi?: number
  readonly Keq?: number
}

/** The denominator, kg/m³: what one unit of k·E has to work against. */
export const resistance = ({ Km, Kic, Kiu, Ksi }: RateConstants, S: number, P: number): number =>
  Km * (Kic === undefined ? 1 : 1 + P / Kic) +
  S * (Kiu === undefined ? 1 : 1 + P / Kiu) +
  (Ksi === undefined ? 0 : (S * S) / Ksi)

/** The share of k·E that works at S and P; negative beyond the equilibrium. */
export const saturation = (constants: RateConstants, S: number, P: number): number =>
  (constants.Keq === undefined ? S : S - P / constants.Keq) / resistance(constants, S, P)
