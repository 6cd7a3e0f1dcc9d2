/** How the temperature runs during one piece of a programme, τ in s from the piece's start. */
export type TemperatureCourse =
  | { readonly kind: 'steady'; readonly from: number }
  | { readonly kind: 'linear'; readonly from: number; readonly slope: number }
  /** First-order approach to the jacket: T = jacket − (jacket − from)·e^(−τ/timeConstant). */
  | {
      readonly kind: 'approach'
      readonly from: number
      readonly jacket: number
      readonly timeConstant: number
    }

/** Temperature after τ, K. */
export function temperatureAt(course: TemperatureCourse, τ: number): number {
  if (course.kind === 'steady') return course.from
  if (course.kind === 'linear') return course.from + course.slope * τ
  return course.from - (course.jacket - course.from) * Math.expm1(-τ / course.timeConstant)
}

/** Time at which a course that is not steady passes a temperature, s. */
export function timeAtTemperature(course: TemperatureCourse, T: number): number {
  if (course.kind === 'linear') return (T - course.from) / course.slope
  if (course.kind === 'approach')
    return -course.timeConstant * Math.log1p((course.from - T) / (course.jacket - course.from))
  return 0
}
