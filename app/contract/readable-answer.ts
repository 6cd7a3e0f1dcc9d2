/**
 * The answer in words: first the sentence that answers, then where the hours go, what would help, the check,
 * the warnings, and the cautions that belong to advice on dosing or a kill step.
 *
 * Shapes   lines joined by line ends, none at the end; no control characters, whatever the file's texts hold.
 */
import { type Answer, formatNumber, formatQuantity, type Temperature, type Time } from '../../engine/index.ts'
import { visible } from './fault.ts'
import { ledgerSentence, ledgerTable } from './hours-words.ts'
import type { ReadScenario } from './read-scenario.ts'
import { cautions, checkMethodSentence, percent, remedySentence, warningSentence } from './sentences.ts'
import { traceTable } from './trace-table.ts'

/** What `plan` prints for people; `read` is what readScenario gave. */
export const readableAnswer = (answer: Answer, read: ReadScenario): string => {
  const title = read.scenario.title
  const parts: (readonly string[])[] = [
    title === undefined ? [] : [visible(title, 200)],
    [answerSentence(answer), ...limitSentences(answer), ...costSentence(answer)],
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

const hours = (time: Time): string => formatQuantity(time, 'time', 'h')
const at = (temperature: Temperature | undefined): string =>
  temperature === undefined ? '' : ` at ${formatQuantity(temperature, 'temperature', 'degC')}`

const answerSentence = (answer: Answer): string => {
  const { ask } = answer
  const dose = answer.dose === undefined ? undefined : formatQuantity(answer.dose, 'mass', 'kg')
  const withDose = dose === undefined ? '' : ` with a dose of ${dose}`
  if (ask.find === 'trace') return 'The course of the batch:'
  const target = 'conversion' in ask ? `${percent(ask.conversion, 4)} conversion` : 'the conversion'
  if (!answer.reachable) return `${target} is not reached${withDose}${at(answer.temperature)}.`
  switch (ask.find) {
    case 'time':
      return answer.time === undefined
        ? `${target} is reached${withDose}.`
        : `${target} is reached ${hours(answer.time)} after the first dose${withDose}${at(answer.temperature)}.`
    case 'dose':
      return dose === undefined
        ? `${target} is reached within ${hours(ask.within)}.`
        : `A dose of ${dose} reaches ${target} within ${hours(ask.within)}${at(answer.temperature)}.`
    case 'temperature':
      return bestTemperature(
        answer,
        ask.best === 'time' ? `${target} soonest` : `furthest within ${hours(ask.within)}`,
      )
    default:
      return ask satisfies never
  }
}

const bestTemperature = (answer: Answer, aim: string): string => {
  const best =
    answer.temperature === undefined ? '' : formatQuantity(answer.temperature, 'temperature', 'degC')
  const reached = [
    ...(answer.time === undefined ? [] : [`in ${hours(answer.time)}`]),
    ...(answer.conversion === undefined ? [] : [`to ${percent(answer.conversion, 4)} conversion`]),
  ].join(' ')
  return `The batch comes to ${aim} at ${best}${reached === '' ? '' : `: ${reached}`}.`
}

const limitSentences = (answer: Answer): readonly string[] => [
  ...(answer.limitingConversion === undefined || answer.reachable
    ? []
    : [`However long the hold, conversion comes to rest at ${percent(answer.limitingConversion, 4)}.`]),
  ...(answer.leastDose === undefined
    ? []
    : [`Below a dose of ${formatQuantity(answer.leastDose, 'mass', 'kg')} the target is never reached.`]),
]

const costSentence = (answer: Answer): readonly string[] =>
  answer.cost === undefined
    ? []
    : [`The batch costs ${formatNumber(answer.cost.value)} ${answer.cost.currency}.`]

const killSentences = (answer: Answer): readonly string[] =>
  answer.killStep === undefined
    ? []
    : [
        `After the kill step ${percent(answer.killStep.residualActivity, 2)} of the enzyme charged is active; the step takes it down by ${formatNumber(answer.killStep.logReduction, 2)} powers of ten.`,
      ]

const checkSentence = (answer: Answer): string => {
  const good = answer.precision === undefined ? '' : ` About ${answer.precision.digits} digits are good.`
  const { relativeDifference } = answer.check
  if (relativeDifference === null)
    return `Check by ${checkMethodSentence(answer.check.method)}: no result.${good}`
  return `Check by ${checkMethodSentence(answer.check.method)}: differs by ${formatNumber(relativeDifference, 1)} of the value.${good}`
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
