/** The same scenario with one thing changed: what remedies, optima and the hours ledger compare. */
import type { Phase, Programme, Scenario } from '../scenario.ts'
import { type Concentration, type Mass, quantity, type Temperature, type Time } from '../units/quantity.ts'

/**
 * The temperature at which the reaction is meant to run: of a phased programme the one held longest, kill steps
 * left out; with no hold, the warmest set point before the kill step.
 */
export function holdTemperature(programme: Programme): Temperature {
  if (programme.kind === 'constant') return programme.temperature
  const held = new Map<Temperature, number>()
  let T = programme.start.temperature
  let warmest = T
  let dosed = false
  for (const phase of programme.phases) {
    if (phase.phase === 'inactivate') break
    if (phase.phase === 'dose') dosed = true
    if (phase.phase === 'heat' || phase.phase === 'cool') {
      T = phase.to
      if (T > warmest) warmest = T
    }
    if (phase.phase === 'hold') add('for' in phase ? phase.for : phase.atMost)
    if (phase.phase === 'feed' && dosed) add(phase.for)
  }
  function add(duration: number): void {
    held.set(T, (held.get(T) ?? 0) + duration)
  }
  let longest = 0
  let at = warmest
  for (const [temperature, duration] of held) {
    if (duration > longest) {
      longest = duration
      at = temperature
    }
  }
  return at
}

/** With another hold temperature: every set point that stood at the old one moves. */
export function atHoldTemperature(scenario: Scenario, T: number): Scenario {
  const { programme } = scenario
  const to = quantity<Temperature>(T)
  if (programme.kind === 'constant') return { ...scenario, programme: { ...programme, temperature: to } }
  const old = holdTemperature(programme)
  const setPoints = programme.phases.some(
    (phase) => (phase.phase === 'heat' || phase.phase === 'cool') && phase.to === old,
  )
  return {
    ...scenario,
    programme: {
      ...programme,
      start: setPoints ? programme.start : { ...programme.start, temperature: to },
      phases: programme.phases.map((phase) =>
        (phase.phase === 'heat' || phase.phase === 'cool') && phase.to === old ? { ...phase, to } : phase,
      ),
    },
  }
}

/** With the whole programme at one temperature, its times kept: ramps become waits of the same length. */
export function steadyAt(
  scenario: Scenario,
  T: Temperature,
  durations: ReadonlyMap<number, number>,
): Scenario {
  const { programme } = scenario
  if (programme.kind === 'constant') return scenario
  const phases: Phase[] = programme.phases.map((phase, index) => {
    if (phase.phase !== 'heat' && phase.phase !== 'cool' && phase.phase !== 'inactivate') return phase
    return { phase: 'hold', for: quantity<Time>(durations.get(index) ?? 0) }
  })
  return { ...scenario, programme: { ...programme, start: { ...programme.start, temperature: T }, phases } }
}

/** Under constant conditions, one dose at the start. */
export function constantly(
  scenario: Scenario,
  conditions: { readonly temperature: Temperature; readonly pH?: number | undefined; readonly dose: number },
): Scenario {
  return {
    ...scenario,
    programme: {
      kind: 'constant',
      temperature: conditions.temperature,
      ...(conditions.pH !== undefined && { pH: conditions.pH }),
      dose: quantity<Mass>(conditions.dose),
      countDoseVolume: false,
    },
  }
}

/** Without any inactivation. */
export function withoutInactivation(scenario: Scenario): Scenario {
  const { inactivation: _, ...enzyme } = scenario.enzyme
  return { ...scenario, enzyme }
}

/** At another pH throughout. */
export function atPh(scenario: Scenario, pH: number): Scenario {
  const { programme } = scenario
  if (programme.kind === 'constant') return { ...scenario, programme: { ...programme, pH } }
  return {
    ...scenario,
    programme: {
      ...programme,
      start: { ...programme.start, pH },
      phases: programme.phases.map((phase) => (phase.phase === 'adjust' ? { ...phase, pH } : phase)),
    },
  }
}

/** With every product inhibition constant doubled: as if half the product were taken away or another enzyme used. */
export function withHalfTheInhibition(scenario: Scenario): Scenario {
  const { Kic, Kiu, ...rest } = scenario.enzyme.rate
  const twice = (K: Concentration): Concentration => quantity<Concentration>(2 * K)
  return {
    ...scenario,
    enzyme: {
      ...scenario.enzyme,
      rate: {
        ...rest,
        ...(Kic !== undefined && { Kic: twice(Kic) }),
        ...(Kiu !== undefined && { Kiu: twice(Kiu) }),
      },
    },
  }
}

/** With all doses given together where the first one was. */
export function dosedAtOnce(scenario: Scenario): Scenario {
  const { programme } = scenario
  if (programme.kind === 'constant') return scenario
  let sum = 0
  for (const phase of programme.phases) if (phase.phase === 'dose') sum += phase.amount
  let given = false
  const phases: Phase[] = []
  for (const phase of programme.phases) {
    if (phase.phase !== 'dose') phases.push(phase)
    else if (!given) {
      given = true
      phases.push({ phase: 'dose', amount: quantity<Mass>(sum) })
    }
  }
  return { ...scenario, programme: { ...programme, phases } }
}
