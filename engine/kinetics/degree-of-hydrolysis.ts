/**
 * Degree of hydrolysis of protein: bonds cut over bonds present, 0..1 here (percent only on screen).
 *
 * Source   Adler-Nissen 1986, Enzymic Hydrolysis of Food Proteins; exponential rate law d(DH)/dt = a·exp(−b·DH).
 */
import { quantity, type Time } from '../units/quantity.ts'

/** Rate of the degree of hydrolysis, 1/s where a is. */
export const degreeOfHydrolysisRate = (a: number, b: number, degree: number): number =>
  a * Math.exp(-b * degree)

/**
 * Degree of hydrolysis after a time.
 *
 * Units    a in 1/s, b plain (per unit of DH); start at `initial`.
 */
export const degreeOfHydrolysisAt = (a: number, b: number, t: Time, initial = 0): number =>
  initial + (b === 0 ? a * t : Math.log1p(a * b * Math.exp(-b * initial) * t) / b)

/** Time to a degree of hydrolysis; the inverse of `degreeOfHydrolysisAt`. */
export const timeToDegreeOfHydrolysis = (a: number, b: number, target: number, initial = 0): Time =>
  quantity<Time>(
    b === 0 ? (target - initial) / a : (Math.exp(b * initial) * Math.expm1(b * (target - initial))) / (a * b),
  )
