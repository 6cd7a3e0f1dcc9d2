/** Whether no value is infinite or not a number. */
export const allFinite = (values: Float64Array): boolean => {
  // The sum of finite numbers may overflow, the sum of their zeroes cannot.
  let sum = 0
  for (let i = 0; i < values.length; i++) sum += 0 * (values[i] as number)
  return sum === 0
}

/** Index of the first value that is infinite or not a number, or −1. */
export const firstNotFinite = (values: Float64Array): number =>
  values.findIndex((value) => !Number.isFinite(value))
