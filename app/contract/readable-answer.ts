/**
 * The answer in words: first the sentence that answers, then where the hours go, what would help, the check,
 * the warnings, and the cautions that belong to advice on dosing or a kill step.
 *
 * Shapes   lines joined by line ends, none at the end; no control characters, whatever the file's texts hold.
 */
import { type Answer, type Ask, formatNumber, formatNumberUp, type Time } from '../../engine/index.ts'
import { visible } from './fault.ts'
import { ledgerSentence, ledgerTable } from './hours-words.ts'
import type { ReadScenario } from './read-scenario.ts'
import {
  cautions,
  checkMethodSentence,
  degrees,
  hours,
  kilograms,
  percent,
  remedySentence,
  warningSentence,
} from './sentences.ts'
import { traceTable } from './trace-table.ts'

/** What `plan` prints for people; `read` is what readScenario gave. */
export const readableAnswer = (answer: Answer, read: ReadScenario): string => {
  const title = read.scenario.title
  const parts: (readonly string[])[] = [
    title === undefined ? [] : [visible(title, 200)],
    [answerSentence(answer, read), ...limitSentences(answer, read)],
    answer.trace === undefined ? [] : traceTable(answer.trace),
    answer.hours === undefined
      ? []
      : ['Where the hours go:', ...ledgerTable(answer.hours), ledgerSentence(answer.hours)],
    answer.remedies === undefined || answer.remedies.length === 0
      ? []
      : ['What would help:', ...answer.remedies.map((remedy) => `  ${remedySentence(remedy)}`)],
    killSentences(answer),
    [checkSentence(answer)],
    answer.warnings.map((warning) => `Warning: ${warningSentence(warning)}`),
    cautionLines(answer, read),
  ]
  return parts
    .filter((part) => part.length > 0)
    .map((part) => part.join('\n'))
    .join('\n\n')
}

const answerSentence = (answer: Answer, read: ReadScenario): string => {
  const { ask } = answer
  if (ask.find === 'trace') return 'The course of the batch:'
  if (ask.find === 'temperature') return bestTemperature(answer, ask)
  const target = `${percent(ask.conversion, 4)} conversion`
  const dose = answer.dose === undefined ? '' : `${formatNumberUp(answer.dose)} kg`
  const { programme } = read.scenario
  if (!answer.reachable) {
    if (ask.find === 'dose') return `No dose reaches ${target} within ${hours(ask.within)}.`
    return `${dose === '' ? '' : `Dose ${dose}${where(answer, read)}: `}${target} is not reached${programme.kind === 'phases' ? ' by the end of the programme' : ''}.`
  }
  const time = answer.time === undefined ? '' : enoughHours(answer.time)
  if (programme.kind === 'phases') {
    const doses = dose === '' ? '' : `, with ${dose} of enzyme in all`
    return `${target} is reached ${time} after the first dose${doses}${money(answer)}.`
  }
  return `Dose ${dose}, hold ${time}${where(answer, read)}: ${target}${money(answer)}.`
}

/** Rounded up, so that the hold read out is long enough. */
const enoughHours = (time: Time): string => `${formatNumberUp(time / 3600)} h`

const bestTemperature = (answer: Answer, ask: Extract<Ask, { find: 'temperature' }>): string => {
  const best = answer.temperature === undefined ? 'no temperature of the range' : degrees(answer.temperature)
  if (ask.best === 'time') {
    const target = `${percent(ask.conversion, 4)} conversion`
    return answer.reachable && answer.time !== undefined
      ? `${target} is reached soonest at ${best}: in ${enoughHours(answer.time)}${money(answer)}.`
      : `${target} is not reached at any temperature of the range.`
  }
  const reached = answer.conversion === undefined ? '' : `: ${percent(answer.conversion, 4)}`
  return `Within ${hours(ask.within)} conversion is highest at ${best}${reached}${money(answer)}.`
}

const where = (answer: Answer, read: ReadScenario): string => {
  const { programme } = read.scenario
  const temperature =
    answer.temperature ?? (programme.kind === 'constant' ? programme.temperature : undefined)
  return temperature === undefined ? '' : ` at ${degrees(temperature)}`
}

const money = (answer: Answer): string => {
  if (answer.cost === undefined) return ''
  const { value, currency } = answer.cost
  return `, ${value < 100 ? value.toFixed(2) : formatNumber(value)} ${currency} a batch`
}

const limitSentences = (answer: Answer, read: ReadScenario): readonly string[] => {
  const rest = answer.limitingConversion
  const hold =
    read.scenario.programme.kind === 'constant' ? 'However long the hold, conversion' : 'Conversion'
  return [
    ...(rest === undefined || answer.reachable ? [] : [`${hold} comes to rest at ${percent(rest, 4)}.`]),
    ...(answer.leastDose === undefined
      ? []
      : [`Below a dose of ${kilograms(answer.leastDose)} the target is never reached.`]),
  ]
}

const killSentences = (answer: Answer): readonly string[] => {
  if (answer.killStep === undefined) return []
  const { residualActivity, logReduction } = answer.killStep
  const left = residualActivity < 1e-9 ? 'less than a billionth' : percent(residualActivity, 2)
  // A lethality is never rounded up.
  const down = logReduction > 12 ? 'more than 12' : formatNumber(Math.floor(10 * logReduction) / 10, 3)
  return [
    `After the kill step ${left} of the enzyme charged is active; the step takes it down by ${down} powers of ten.`,
  ]
}

const checkSentence = (answer: Answer): string => {
  const method = checkMethodSentence(answer.check.method)
  const digits = answer.precision?.digits
  const good = digits === undefined || digits > 6 ? '' : ` About ${formatNumber(digits, 2)} digits are good.`
  const { relativeDifference } = answer.check
  return relativeDifference === null
    ? `Check by ${method}: it gave no result.${good}`
    : `Check by ${method}: the two agree to ${formatNumber(Math.abs(relativeDifference), 1)} of the value.${good}`
}

const cautionLines = (answer: Answer, read: ReadScenario): readonly string[] => {
  const { programme } = read.scenario
  const phases = programme.kind === 'phases' ? programme.phases : []
  const dosing =
    answer.ask.find === 'dose' ||
    (answer.remedies ?? []).some((r) => r.kind === 'more-dose' || r.kind === 'staged')
  const acids =
    phases.some((p) => p.phase === 'adjust') || (answer.remedies ?? []).some((r) => r.kind === 'better-pH')
  const kill = answer.killStep !== undefined || phases.some((p) => p.phase === 'inactivate')
  const lines = [
    ...(dosing ? [cautions.dosing] : []),
    ...(kill ? [cautions.killStep] : []),
    ...(acids ? [cautions.acids] : []),
  ]
  return lines.length === 0
    ? []
    : ['Cautions:', ...[...lines, cautions.prediction].map((line) => `  ${line}`)]
}
