/** Types for the fixed-step fourth-order Runge–Kutta stepper; it ships none of its own. */
declare module 'ode-rk4' {
  type Derivative = (out: Float64Array, y: Float64Array, t: number) => void

  interface Stepper {
    y: Float64Array
    t: number
    dt: number
    deriv: Derivative
    readonly n: number
    step(): Stepper
    steps(count: number): Stepper
  }

  export default function rk4(y0: Float64Array, deriv: Derivative, t: number, dt: number): Stepper
}
