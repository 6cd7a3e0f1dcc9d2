/** The ways a first-order inactivation is stated: kd, half-life, D-value; and Ea or z for its temperature. */
import {
  type FirstOrderRate,
  type MolarEnergy,
  quantity,
  type Temperature,
  type TemperatureDifference,
  type Time,
} from '../units/quantity.ts'
import { gasConstant } from './gas-constant.ts'

/** kd from the time in which half of the activity is lost. */
export const kdFromHalfLife = (halfLife: Time): FirstOrderRate =>
  quantity<FirstOrderRate>(Math.LN2 / halfLife)

/** kd from the time in which nine tenths of the activity are lost. */
export const kdFromD = (D: Time): FirstOrderRate => quantity<FirstOrderRate>(Math.LN10 / D)

/** Half-life of a first-order inactivation. */
export const halfLifeFromKd = (kd: FirstOrderRate): Time => quantity<Time>(Math.LN2 / kd)

/** D-value (decimal reduction time) of a first-order inactivation. */
export const DFromKd = (kd: FirstOrderRate): Time => quantity<Time>(Math.LN10 / kd)

/** D-value at T from the one at Tref: D·10^((Tref − T)/z). */
export const DAt = (D: Time, Tref: Temperature, z: TemperatureDifference, T: Temperature): Time =>
  quantity<Time>(D * 10 ** ((Tref - T) / z))

/**
 * Activation energy whose local slope of log D at T is that of z.
 *
 * Units    K, K; returns J/mol.
 * Source   d(log10 D)/dT = −1/z against d(ln kd)/dT = Ea/(R·T²): Ea = ln 10·R·T²/z.
 */
export const EaFromZ = (z: TemperatureDifference, T: Temperature): MolarEnergy =>
  quantity<MolarEnergy>((Math.LN10 * gasConstant * T * T) / z)

/** Local z-value at T of an activation energy; the inverse of `EaFromZ`. */
export const zFromEa = (Ea: MolarEnergy, T: Temperature): TemperatureDifference =>
  quantity<TemperatureDifference>((Math.LN10 * gasConstant * T * T) / Ea)
