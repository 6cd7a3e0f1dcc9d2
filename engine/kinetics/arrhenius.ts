/** Arrhenius' law. */

/** No rate constant is let above this, 1/s: products with amounts and times stay within the range of doubles. */
const greatest = 1e200

/**
 * Ratio of a rate constant at T to the one at Tref.
 *
 * Units    Ea/R in K (J/mol over the gas constant), K; returns a plain ratio.
 * Source   Arrhenius law, exp(−Ea/R·(1/T − 1/Tref)), written without the difference of reciprocals.
 */
export const arrheniusFactor = (energyOverR: number, Tref: number, T: number): number =>
  Math.exp((energyOverR * (T - Tref)) / (T * Tref))

/**
 * A rate constant as a function of temperature, K, from its value at one temperature; at most 1e200 1/s.
 */
export function rateConstant(k: number, energyOverR: number, Tref: number): (T: number) => number {
  if (!(k > 0)) return () => 0
  if (energyOverR === 0) return () => Math.min(k, greatest)
  return (T) => {
    const value = k * arrheniusFactor(energyOverR, Tref, T)
    if (value <= greatest) return value
    // Either factor alone may leave the range of doubles where their product does not.
    const exponent = Math.log(k) + (energyOverR * ((T - Tref) / T)) / Tref
    return exponent < Math.log(greatest) ? Math.exp(exponent) : greatest
  }
}
