/** What would shorten the hold, or make an unreachable target reachable; each computed, none guessed. */
import type { Remedy } from '../answer.ts'
import type { Phase, Scenario } from '../scenario.ts'
import { type Mass, quantity, type Temperature, type Time } from '../units/quantity.ts'
import { goodTemperature } from './best-temperature.ts'
import { doseScaleFor, leastDoseScale } from './dose.ts'
import { equilibriumBefore } from './equilibrium.ts'
import { timeTo } from './reach.ts'
import { type Solver, solverOf } from './solver.ts'
import { atHoldTemperature, atPh, dosedAtOnce, holdTemperature, withHalfTheInhibition } from './variants.ts'

/** The changes whose effect on the hold is compared: common practice for one step of a plan. */
const doseStep = 1.2
const temperatureStep = 3
const targetStep = 0.02
/** A change that saves a smaller share of the hold is not worth a line. */
const worthSaying = 0.005
/** A remedy that takes longer than this is none, s: thirty days. */
const longest = 30 * 86400

/** Changes that shorten the hold of a reachable plan, the strongest first. */
export function shorteningRemedies(
  scenario: Scenario,
  solver: Solver,
  conversion: number,
  time: number,
): Remedy[] {
  const found: Remedy[] = []
  const consider = (remedy: Remedy): void => {
    if (remedy.time < time * (1 - worthSaying)) found.push(remedy)
  }
  const t = (changed: Solver, target = conversion, scale = 1): Time =>
    quantity<Time>(timeTo(changed, target, scale))
  const dose = quantity<Mass>(solver.fullDose * doseStep)
  consider({ kind: 'more-dose', dose, time: t(solver, conversion, doseStep) })
  const hold = holdTemperature(scenario.programme)
  for (const [kind, step] of [
    ['cooler', -temperatureStep],
    ['warmer', temperatureStep],
  ] as const) {
    const temperature = quantity<Temperature>(hold + step)
    if (temperature > 0)
      consider({ kind, temperature, time: t(solverOf(atHoldTemperature(scenario, temperature))) })
  }
  const lower = conversion - Math.min(targetStep, 0.1 * conversion)
  consider({ kind: 'lower-target', conversion: lower, time: t(solver, lower) })
  const { Kic, Kiu } = scenario.enzyme.rate
  if (Kic !== undefined || Kiu !== undefined)
    consider({ kind: 'less-inhibition', time: t(solverOf(withHalfTheInhibition(scenario))) })
  const pH = solver.batch.model.bestPh
  if (pH !== undefined && pH >= 0 && pH <= 14)
    consider({ kind: 'better-pH', pH, time: t(solverOf(atPh(scenario, pH))) })
  return found.sort((a, b) => a.time - b.time)
}

/** A dose this much above the least one reaches the target without hanging on the last digit. */
const margin = 1.1
const mostDoses = 24

/** Changes that make an unreachable target reachable, the quickest first. */
export function reachabilityRemedies(scenario: Scenario, solver: Solver, conversion: number): Remedy[] {
  // Beyond the equilibrium neither dose nor temperature nor time gets anywhere.
  if (equilibriumBefore(solver.batch, conversion) !== undefined) return []
  const found: Remedy[] = []
  const consider = (remedy: Remedy): void => {
    if (remedy.time >= 0 && remedy.time < longest) found.push(remedy)
  }
  const scale = sufficientScale(solver, conversion)
  if (scale !== undefined) {
    const dose = quantity<Mass>(solver.fullDose * scale * margin)
    consider({ kind: 'more-dose', dose, time: quantity<Time>(timeTo(solver, conversion, scale * margin)) })
    const staged = stagedDoses(scenario, solver, conversion, scale)
    if (staged) consider(staged)
  }
  const hold = holdTemperature(scenario.programme)
  const better = goodTemperature(scenario, conversion, Math.max(1, hold - 40), hold + 20)
  if (better !== null) {
    const temperature = quantity<Temperature>(better)
    consider({
      kind: better < hold ? 'cooler' : 'warmer',
      temperature,
      time: quantity<Time>(timeTo(solverOf(atHoldTemperature(scenario, temperature)), conversion)),
    })
  }
  if (scenario.programme.kind === 'phases') {
    const sooner = solverOf(dosedAtOnce(dosedFirst(scenario)))
    consider({ kind: 'sooner', time: quantity<Time>(timeTo(sooner, conversion)) })
    const held = longerHold(scenario, solver, conversion)
    if (held) consider(held)
  }
  return found.sort((a, b) => a.time - b.time)
}

/** Factor on the doses with which the programme, or the endless hold, gets there. */
function sufficientScale(solver: Solver, conversion: number): number | undefined {
  if (solver.batch.timeline.endless) {
    const least = leastDoseScale(solver, conversion)
    return least.ok && least.value !== null ? least.value : undefined
  }
  const scale = doseScaleFor(solver, conversion, Number.POSITIVE_INFINITY)
  return scale.ok && scale.value.kind === 'scale' ? scale.value.scale : undefined
}

/** The stated dose again and again, one every half-life, until enough has been given; constant conditions only. */
function stagedDoses(
  scenario: Scenario,
  solver: Solver,
  conversion: number,
  scale: number,
): Remedy | undefined {
  const { programme } = scenario
  const { inactivation } = solver.batch.model
  if (programme.kind !== 'constant' || !inactivation) return undefined
  const every = quantity<Time>(Math.LN2 / inactivation.k1(programme.pH)(programme.temperature))
  const doses = Math.ceil(scale * margin)
  if (!(every > 1e-3) || !Number.isFinite(every) || doses < 2 || doses > mostDoses) return undefined
  const each = quantity<Mass>(solver.fullDose)
  const phases: Phase[] = []
  for (let i = 0; i < doses; i++)
    phases.push(
      { phase: 'dose', amount: each },
      { phase: 'hold', for: i < doses - 1 ? every : quantity<Time>(100 * every) },
    )
  const staged = solverOf({
    ...scenario,
    programme: {
      kind: 'phases',
      start: { temperature: programme.temperature, ...(programme.pH !== undefined && { pH: programme.pH }) },
      phases,
      countDoseVolume: programme.countDoseVolume,
    },
  })
  return { kind: 'staged', doses, each, every, time: quantity<Time>(timeTo(staged, conversion)) }
}

/** The last hold before cooling or killing held until the target is there. */
function longerHold(scenario: Scenario, solver: Solver, conversion: number): Remedy | undefined {
  const { programme } = scenario
  if (programme.kind === 'constant') return undefined
  const { phases } = programme
  const dosed = phases.findIndex((phase) => phase.phase === 'dose')
  const killed = phases.findIndex((phase) => phase.phase === 'inactivate')
  const last = phases.findLastIndex(
    (phase, i) => phase.phase === 'hold' && i > dosed && (killed < 0 || i < killed),
  )
  const whole = solver.answers({ doseScale: 1, endless: false })
  if (last < 0 || !whole.ok) return undefined
  const until: Phase = { phase: 'hold', until: { conversion }, atMost: quantity<Time>(longest) }
  const held = solverOf({
    ...scenario,
    programme: { ...programme, phases: phases.map((phase, i) => (i === last ? until : phase)) },
  }).answers({ doseScale: 1, target: conversion, endless: false })
  if (!held.ok || held.value.reachedAt === undefined) return undefined
  const inHold = held.value.marks.find((mark) => mark.phase === last)
  const before = whole.value.marks.find((mark) => mark.phase === last)
  if (!inHold || !before) return undefined
  const extra = inHold.to - inHold.from - (before.to - before.from)
  if (!(extra > 0)) return undefined
  return {
    kind: 'longer-hold',
    extra: quantity<Time>(extra),
    time: quantity<Time>(held.value.reachedAt - held.value.firstDoseAt),
  }
}

/** With the first dose before everything else. */
function dosedFirst(scenario: Scenario): Scenario {
  const { programme } = scenario
  if (programme.kind === 'constant') return scenario
  const first = programme.phases.findIndex((phase) => phase.phase === 'dose')
  if (first < 0) return scenario
  const dose = programme.phases[first] as Phase
  const phases = [dose, ...programme.phases.filter((_, i) => i !== first)]
  return { ...scenario, programme: { ...programme, phases } }
}
