/** The ODE engine against the hand-inlined yardstick, in the same run. */
import { createIntegrator } from '../../engine/integrate/integrator.ts'
import { odeRoute } from '../../engine/solve/ode-route.ts'
import { measure, report } from './measure.ts'
import { type Case, constantCases, conversion, feedCases, Km, programmeCases } from './problems.ts'
import { constantTime, feedTime, programmeTime } from './yardstick.ts'

/** So few that their scenarios stay in the processor's cache, as the one of a plan does. */
const count = 500

/** The integration of the balances, each kind of batch to be measured in a process of its own. */
export const odeEngine = {
  constant: () => compare('constant', constantCases(count), Km, constantTime),
  'six-phases': () => compare('six-phase programme', programmeCases(count), Km, programmeTime),
  'stiff-end': () =>
    compare(
      'stiff end (Km/S0 = 1e-4, to 99.99 %)',
      constantCases(count, 0.0045, 0.9999),
      0.0045,
      (dose, T, km, tolerance) => constantTime(dose, T, km, tolerance, 0.9999),
      0.9999,
    ),
  feed: () => compare('feed', feedCases(count), Km, feedTime),
}

type Yardstick = (dose: number, T: number, km: number, tolerance: number) => number

function compare(
  label: string,
  cases: readonly Case[],
  km: number,
  yardstick: Yardstick,
  target = conversion,
): void {
  const integrator = createIntegrator(2)
  const request = { doseScale: 1, target, endless: false }
  const exact = engineTimes(1e-13)
  const condition = Float64Array.from(cases, ({ dose, T }, i) => {
    // How much the time answers to a relative change of the dose.
    const shifted = yardstick(dose * (1 + 1e-6), T, km, 1e-12)
    return Math.abs((exact[i] as number) / shifted - 1) / 1e-6
  })
  function engineTimes(tolerance: number): Float64Array {
    const out = new Float64Array(cases.length)
    cases.forEach(({ batch }, i) => {
      const run = odeRoute(batch, { tolerance, method: 'automatic', maxSteps: 1e6 }, integrator)(request)
      out[i] = run.ok ? (run.value.reachedAt ?? Number.NaN) : Number.NaN
    })
    return out
  }
  for (const tolerance of [1e-6, 1e-9]) {
    const routes = cases.map(({ batch }) =>
      odeRoute(batch, { tolerance, method: 'automatic', maxSteps: 1e6 }, integrator),
    )
    const out = new Float64Array(cases.length)
    const other = new Float64Array(cases.length)
    const [engine, inlined] = measure(
      [
        {
          name: 'engine',
          run: () => {
            for (let i = 0; i < routes.length; i++) {
              const run = (routes[i] as (typeof routes)[number])(request)
              out[i] = run.ok ? (run.value.reachedAt ?? Number.NaN) : Number.NaN
            }
            return out
          },
        },
        {
          name: 'inlined',
          run: () => {
            for (let i = 0; i < cases.length; i++) {
              const { dose, T } = cases[i] as Case
              other[i] = yardstick(dose, T, km, tolerance)
            }
            return other
          },
        },
      ],
      exact,
      condition,
    )
    if (!engine || !inlined) continue
    const ratio = engine.nanoseconds / inlined.nanoseconds
    report(`${label}, ${tolerance}`, engine, { text: `${ratio.toFixed(2)}× (goal ≤ 2×)`, met: ratio <= 2 })
    report('   yardstick', inlined)
  }
}
