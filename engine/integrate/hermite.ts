/**
 * Quintic through three points and three slopes: the ends and the middle of a step.
 *
 * Shapes   theta in [0, 1] is the fraction of the step of the given length; (n) in, (n) out.
 *          Every basis sums to one, so linear invariants of the three points are kept.
 * Source   Hermite interpolation at 0, ½ and 1; error of sixth order in the length.
 */
export const quinticInto = (
  out: Float64Array,
  theta: number,
  length: number,
  y0: Float64Array,
  f0: Float64Array,
  yMiddle: Float64Array,
  fMiddle: Float64Array,
  y1: Float64Array,
  f1: Float64Array,
): void => {
  const q = theta - 1
  const w = 2 * theta - 1
  const qq = q * q
  const ww = w * w
  const tt = theta * theta
  const a = qq * ww * (1 + 6 * theta)
  const b = 16 * tt * qq
  const c = tt * ww * (7 - 6 * theta)
  const d = length * theta * qq * ww
  const e = length * 8 * tt * qq * w
  const g = length * tt * ww * q
  for (let i = 0; i < out.length; i++) {
    out[i] =
      a * (y0[i] as number) +
      b * (yMiddle[i] as number) +
      c * (y1[i] as number) +
      d * (f0[i] as number) +
      e * (fMiddle[i] as number) +
      g * (f1[i] as number)
  }
}
