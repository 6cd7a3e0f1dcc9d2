/** A programme as a row of doses and of pieces in which nothing jumps. */
import type { FeedFlow, Jacket, Phase, Programme } from '../scenario.ts'
import type { Density } from '../units/quantity.ts'
import { type TemperatureCourse, timeAtTemperature } from './temperature-course.ts'

export type Step = DoseStep | Run

export interface DoseStep {
  readonly kind: 'dose'
  /** kg of preparation */
  readonly mass: number
  readonly phase: number
}

export interface Run {
  readonly kind: 'run'
  /** s; Infinity where the conditions go on */
  readonly duration: number
  readonly course: TemperatureCourse
  readonly pH: number | undefined
  /** The run ends when this conversion is reached, if before its duration. */
  readonly until?: number
  readonly feed?: FeedRun
  readonly phase: number
  readonly purpose: Phase['phase']
}

export interface FeedRun {
  /** m³/s at the start, and its change per s */
  readonly flow: number
  readonly flowSlope: number
  /** kg/m³ in the feed */
  readonly substrate: number
  readonly product: number
  readonly enzyme: number
}

/** m³ fed in by τ, s from the feed's start. */
export const fedAfter = (feed: FeedRun | undefined, τ: number): number =>
  feed ? τ * (feed.flow + 0.5 * feed.flowSlope * τ) : 0

export interface Timeline {
  readonly steps: readonly Step[]
  /** Conditions after the last step, going on without end. */
  readonly after: Run
  readonly countDoseVolume: boolean
  /** The steps have no end of their own: the short form. */
  readonly endless: boolean
}

/** The steps of a programme; the short form doses at time 0 and then holds without end. */
export function timeline(programme: Programme): Timeline {
  if (programme.kind === 'constant') {
    const hold: Run = {
      kind: 'run',
      duration: Number.POSITIVE_INFINITY,
      course: { kind: 'steady', from: programme.temperature },
      pH: programme.pH,
      phase: 0,
      purpose: 'hold',
    }
    const dose: DoseStep = { kind: 'dose', mass: programme.dose ?? 1, phase: 0 }
    return { steps: [dose], after: hold, countDoseVolume: programme.countDoseVolume, endless: true }
  }
  const steps: Step[] = []
  let T: number = programme.start.temperature
  let pH = programme.start.pH
  programme.phases.forEach((phase, index) => {
    const at = { phase: index, purpose: phase.phase }
    const steady = (duration: number): Run => ({
      kind: 'run',
      duration,
      course: { kind: 'steady', from: T },
      pH,
      ...at,
    })
    switch (phase.phase) {
      case 'dose':
        steps.push({ kind: 'dose', mass: phase.amount, phase: index })
        break
      case 'adjust':
        pH = phase.pH
        break
      case 'hold':
        steps.push(
          'for' in phase ? steady(phase.for) : { ...steady(phase.atMost), until: phase.until.conversion },
        )
        break
      case 'feed': {
        const flow = volumeFlow(phase.flow, phase.density)
        const flowTo = phase.flowTo ? volumeFlow(phase.flowTo, phase.density) : flow
        steps.push({
          ...steady(phase.for),
          feed: {
            flow,
            flowSlope: (flowTo - flow) / phase.for,
            substrate: phase.concentration,
            product: phase.product ?? 0,
            enzyme: phase.enzyme ?? 0,
          },
        })
        break
      }
      case 'heat':
      case 'cool':
      case 'inactivate':
        for (const { course, duration } of heating(T, phase.to, phase.ramp, phase.jacket))
          steps.push({ kind: 'run', duration, course, pH, ...at })
        T = phase.to
        if (phase.phase === 'inactivate' && phase.hold > 0) steps.push(steady(phase.hold))
        break
    }
  })
  const after: Run = {
    kind: 'run',
    duration: Number.POSITIVE_INFINITY,
    course: { kind: 'steady', from: T },
    pH,
    phase: programme.phases.length,
    purpose: 'hold',
  }
  return { steps, after, countDoseVolume: programme.countDoseVolume, endless: false }
}

/** Time constants after which a jacket's approach has no difference left that a double sees. */
const settling = 40

/** Volume flow of a feed, m³/s. */
function volumeFlow(flow: FeedFlow, density: Density | undefined): number {
  if (flow.per === 'volume') return flow.value
  if (density === undefined) throw new Error('a mass flow without density passed validation')
  return flow.value / density
}

/**
 * From one temperature to another: at once, along a ramp, or as the jacket allows, the ramp then being the
 * highest rate; the jacket's approach takes over where it is slower than the ramp.
 */
function heating(
  from: number,
  to: number,
  ramp: number | undefined,
  jacket: Jacket | undefined,
): { course: TemperatureCourse; duration: number }[] {
  if (from === to || (ramp === undefined && jacket === undefined)) return []
  const up = to > from ? 1 : -1
  const pieces: { course: TemperatureCourse; duration: number }[] = []
  let T = from
  if (ramp !== undefined) {
    const handover = jacket ? jacket.temperature - up * ramp * jacket.timeConstant : to
    const end = up * handover < up * to ? handover : to
    if (up * end > up * T) {
      const course: TemperatureCourse = { kind: 'linear', from: T, slope: up * ramp }
      pieces.push({ course, duration: Math.abs(end - T) / ramp })
      T = end
    }
  }
  if (jacket && T !== to) {
    const course: TemperatureCourse = {
      kind: 'approach',
      from: T,
      jacket: jacket.temperature,
      timeConstant: jacket.timeConstant,
    }
    if (up * jacket.temperature > up * to) pieces.push({ course, duration: timeAtTemperature(course, to) })
    else {
      // The set point is never reached: the jacket's temperature is, and the phase has no end.
      const settled: TemperatureCourse = { kind: 'steady', from: jacket.temperature }
      pieces.push({ course, duration: settling * jacket.timeConstant })
      pieces.push({ course: settled, duration: Number.POSITIVE_INFINITY })
    }
  }
  return pieces
}
