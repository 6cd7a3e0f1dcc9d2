/**
 * One sentence for each warning, remedy, failure, cause and method. Every switch is exhaustive, so a new code
 * does not compile until it has its words.
 */
import {
  type CheckMethod,
  formatNumber,
  formatQuantity,
  type HoursCause,
  type Mass,
  type PlanFailure,
  type Remedy,
  type Temperature,
  type Time,
  type Warning,
} from '../../engine/index.ts'

/** "9.41 h" */
export const hours = (time: Time): string => formatQuantity(time, 'time', 'h')

/** "42 °C" */
export const degrees = (temperature: Temperature): string => `${formatNumber(temperature - 273.15)} °C`

/** "3.5 kg" */
export const kilograms = (mass: Mass): string => formatQuantity(mass, 'mass', 'kg')

/** A share of one as a percentage: "95 %". */
export const percent = (share: number, significant = 3): string =>
  `${formatNumber(share * 100, significant)} %`

/** What a warning says. */
export const warningSentence = (warning: Warning): string => {
  switch (warning.code) {
    case 'near-the-edge':
      return `The answer lies near the edge of what can be reached: a small error of a constant is magnified ${formatNumber(warning.amplification, 2)} times, which leaves about ${warning.digits} good digits.`
    case 'optimum-at-bound':
      return `The best temperature lies at a bound of the range asked, ${degrees(warning.temperature)}; beyond it may be better still.`
    case 'hold-shorter-than-time':
      return `The programme holds for ${hours(warning.hold)}, but the target takes ${hours(warning.time)}.`
    case 'kill-step-incomplete':
      return `After the kill step ${percent(warning.residualActivity, 2)} of the enzyme charged is still active.`
    case 'far-from-measured':
      return `The rate was measured at ${degrees(warning.measured)} and is carried over to ${degrees(warning.used)}; an assay nearer to the process is worth having.`
    case 'routes-disagree':
      return `The two independent routes to this answer differ by ${percent(warning.relativeDifference, 2)}; do not rely on it before the cause is known.`
    case 'check-failed':
      return `The independent check gave up: ${gaveUp(warning.failure)}. The answer stands on one route alone.`
    case 'beyond-equilibrium':
      return `The target lies beyond the equilibrium, which is at ${percent(warning.equilibriumConversion)} conversion.`
    case 'fed-after-target':
      return `The target is met before all of the feed is in: feeding goes on for ${hours(warning.until)} and takes the conversion down again.`
    case 'hours-not-split':
      return `Where the hours go cannot be told: held at ${degrees(warning.temperature)} from the first dose the batch would never get there.`
    case 'very-long':
      return `The time, ${hours(warning.time)}, is longer than anybody waits; take it as "not in practice".`
    default:
      return warning satisfies never
  }
}

/** What a remedy offers. */
export const remedySentence = (remedy: Remedy): string => {
  const takes = `the target takes ${hours(remedy.time)}`
  switch (remedy.kind) {
    case 'more-dose':
      return `With a dose of ${kilograms(remedy.dose)} ${takes}.`
    case 'cooler':
      return `Cooler, at ${degrees(remedy.temperature)}, ${takes}.`
    case 'warmer':
      return `Warmer, at ${degrees(remedy.temperature)}, ${takes}.`
    case 'lower-target':
      return `A target of ${percent(remedy.conversion)} conversion takes ${hours(remedy.time)}.`
    case 'less-inhibition':
      return `With half the inhibition (product taken away as it forms, or another enzyme) ${takes}.`
    case 'better-pH':
      return `At pH ${formatNumber(remedy.pH)} ${takes}.`
    case 'longer-hold':
      return `With ${hours(remedy.extra)} more of the last hold before cooling or killing ${takes}.`
    case 'sooner':
      return `With all doses given at the programme's start, before anything else, ${takes}.`
    case 'staged':
      return `With ${remedy.doses} doses of ${kilograms(remedy.each)}, one every ${hours(remedy.every)}, ${takes}.`
    default:
      return remedy satisfies never
  }
}

/** What a line of the ledger of hours is for, short enough for a table. */
export const hoursCauseSentence = (cause: HoursCause): string => {
  switch (cause) {
    case 'saturated':
      return 'the reaction itself, saturated and uninhibited'
    case 'substrate-short':
      return 'substrate running short'
    case 'product-inhibition':
      return 'inhibition by the product'
    case 'substrate-inhibition':
      return 'inhibition by the substrate'
    case 'reversibility':
      return 'the reverse reaction'
    case 'slow-fraction':
      return 'the slow share of the substrate'
    case 'pH':
      return 'pH away from the optimum'
    case 'enzyme-loss':
      return 'loss of enzyme'
    case 'heating':
      return 'heating up and cooling'
    case 'staging':
      return 'later doses and feeding'
    default:
      return cause satisfies never
  }
}

/** By which independent route an answer was checked. */
export const checkMethodSentence = (method: CheckMethod): string => {
  switch (method) {
    case 'ode-explicit':
      return 'step-by-step integration, explicit'
    case 'ode-implicit':
      return 'step-by-step integration, implicit'
    case 'quadrature':
      return 'quadrature along the reaction'
    default:
      return method satisfies never
  }
}

/** Why there is no answer. */
export const failureSentence = (failure: PlanFailure): string => {
  switch (failure.kind) {
    case 'rate-not-finite':
      return `the rate stops being a finite number ${formatNumber(failure.time / 3600)} h into the programme`
    case 'step-too-small':
      return `the integration cannot go on ${formatNumber(failure.time / 3600)} h into the programme: its steps become too small`
    case 'too-many-steps':
      return `the integration gives up ${formatNumber(failure.time / 3600)} h into the programme, after ${failure.taken} steps`
    case 'beyond-doubles':
      return `${failure.what} lies beyond the range of double-precision numbers`
    default:
      return failure satisfies never
  }
}

const gaveUp = (kind: PlanFailure['kind']): string => {
  switch (kind) {
    case 'rate-not-finite':
      return 'its rate stopped being a finite number'
    case 'step-too-small':
      return 'its steps became too small'
    case 'too-many-steps':
      return 'it took too many steps'
    case 'beyond-doubles':
      return 'a number left the range of doubles'
    default:
      return kind satisfies never
  }
}

/** What keeps people and product safe, said beside advice on dosing or a kill step. */
export const cautions = {
  dosing:
    'Enzyme dust and aerosol can sensitise the airways; handle the preparation as its safety data sheet says.',
  killStep: 'Hot liquid and jackets scald; mind them in the kill step.',
  acids: 'Adjusting the pH means strong acids or alkalis; handle them as their safety data sheets say.',
  prediction:
    "Predictions support, and never replace, the site's validated procedures, assays on the batch itself, food and pharmaceutical law, local codes and licensed practice.",
} as const
