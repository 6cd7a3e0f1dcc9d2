/**
 * The ODE engine against SciPy's `solve_ivp` with LSODA on the constant-temperature cases, at the same achieved
 * error: SciPy is given the loosest tolerance with which it errs no more than the engine does.
 */
import { spawnSync } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import { createIntegrator } from '../../engine/integrate/integrator.ts'
import { odeRoute } from '../../engine/solve/ode-route.ts'
import { errorsOf, type Measured, measure, report } from './measure.ts'
import { constantCases, conversion, Kic, Km, massYield, S0 } from './problems.ts'
import { constantTime, kAt, kdAt } from './yardstick.ts'

const count = 60
const goal = 200
/** Relative tolerances that SciPy may be run with, loosest first. */
const tolerances = [1e-5, 3e-6, 1e-6, 3e-7, 1e-7, 3e-8, 1e-8, 1e-9, 1e-10, 1e-11]

interface Reply {
  readonly scipy: string
  readonly runs: readonly { readonly rtol: number; readonly seconds: number[]; readonly times: number[] }[]
}

/** Bench beside SciPy where there is one. */
export function againstScipy(): void {
  const cases = constantCases(count)
  const reply = askPython({
    cases: cases.map(({ dose, T }) => ({ k: kAt(T), kd: kdAt(T), dose, km: Km })),
    tolerances,
    S0,
    Kic,
    y: massYield,
    target: (1 - conversion) * S0,
  })
  if (!reply) {
    console.log('       skipped: no python3 with SciPy here; on Debian: apt-get install python3-scipy')
    return
  }
  const exact = Float64Array.from(cases, ({ dose, T }) => constantTime(dose, T, Km, 1e-13))
  const integrator = createIntegrator(2)
  const request = { doseScale: 1, target: conversion, endless: false }
  for (const tolerance of [1e-6, 1e-9]) {
    const routes = cases.map(({ batch }) =>
      odeRoute(batch, { tolerance, method: 'automatic', maxSteps: 1e6 }, integrator),
    )
    const out = new Float64Array(count)
    const run = (): Float64Array => {
      routes.forEach((route, i) => {
        const answer = route(request)
        out[i] = answer.ok ? (answer.value.reachedAt ?? Number.NaN) : Number.NaN
      })
      return out
    }
    const [engine] = measure([{ name: 'engine', run }], exact)
    const lsoda = engine && asExact(reply, engine, exact)
    if (!engine || !lsoda) {
      console.log(`       ${tolerance}: no tolerance brings solve_ivp to the error of the engine`)
      continue
    }
    const ratio = lsoda.nanoseconds / engine.nanoseconds
    report(`constant, ${tolerance}`, engine, {
      text: `${ratio.toFixed(0)}× (goal ≥ ${goal}×)`,
      met: ratio >= goal,
    })
    report(`   ${lsoda.name}`, lsoda)
  }
}

/** The loosest run of SciPy whose errors, the median and the 99 % one, are no larger than the engine's. */
function asExact({ scipy, runs }: Reply, engine: Measured, exact: Float64Array): Measured | undefined {
  for (const { rtol, seconds, times } of runs) {
    const errors = errorsOf(
      Float64Array.from(times, (t) => t ?? Number.NaN),
      exact,
    )
    if (!(errors.median <= engine.errors.median && errors.p99 <= engine.errors.p99)) continue
    const sorted = [...seconds].sort((a, b) => a - b)
    const nanoseconds = 1e9 * (sorted[sorted.length >> 1] as number)
    return { name: `SciPy ${scipy}, rtol ${rtol}`, nanoseconds, errors }
  }
  return undefined
}

function askPython(request: object): Reply | undefined {
  const script = fileURLToPath(new URL('solve_ivp.py', import.meta.url))
  for (const python of ['python3', '/usr/bin/python3']) {
    const { status, stdout } = spawnSync(python, [script], {
      input: JSON.stringify(request),
      encoding: 'utf8',
      stdio: ['pipe', 'pipe', 'ignore'],
    })
    if (status === 0) return JSON.parse(stdout) as Reply
  }
  return undefined
}
