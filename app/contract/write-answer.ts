/**
 * The answer as a plain JSON object for machines: full-precision doubles in the units of the format.
 *
 * Shapes   every value a { value, unit } or a plain number; no undefined, no typed arrays.
 * Units    h, kg, degC, g/L, m3; money per batch.
 * Fails    throws where the engine hands over a number that is not finite: that is a bug.
 */
import {
  type Answer,
  type DimensionName,
  type HoursLedger,
  inUnit,
  type Quantity,
  type Remedy,
  type Time,
  type Trace,
} from '../../engine/index.ts'
import { ledgerSentence } from './hours-words.ts'
import type { ReadScenario } from './read-scenario.ts'
import { hoursCauseSentence, remedySentence, warningSentence } from './sentences.ts'

export type JsonValue =
  | string
  | number
  | boolean
  | null
  | readonly JsonValue[]
  | { readonly [key: string]: JsonValue }

export type JsonObject = { readonly [key: string]: JsonValue }

/** What `plan --json` prints; `read` is what readScenario gave, whose ask is echoed as in the file. */
export const writeAnswer = (answer: Answer, read: ReadScenario): JsonObject =>
  given({
    format: 'dosewright-answer',
    version: 1,
    ask: echoedAsk(read),
    reachable: answer.reachable,
    time: map(answer.time, hours),
    dose: map(answer.dose, (dose) => measured(dose, 'mass', 'kg')),
    temperature: map(answer.temperature, (t) => measured(t, 'temperature', 'degC')),
    conversion: map(answer.conversion, finite),
    cost: map(answer.cost, (cost) => ({ value: finite(cost.value), unit: `${cost.currency}/batch` })),
    limitingConversion: map(answer.limitingConversion, finite),
    leastDose: map(answer.leastDose, (dose) => measured(dose, 'mass', 'kg')),
    trace: map(answer.trace, writeTrace),
    check: {
      method: answer.check.method,
      relativeDifference:
        answer.check.relativeDifference === null ? null : finite(answer.check.relativeDifference),
    },
    hours: map(answer.hours, writeHours),
    remedies: map(answer.remedies, (remedies) => remedies.map(writeRemedy)),
    killStep: map(answer.killStep, (kill) =>
      given({
        residualActivity: finite(kill.residualActivity),
        logReduction: Number.isFinite(kill.logReduction) ? kill.logReduction : undefined,
      }),
    ),
    precision: map(answer.precision, (precision) =>
      given({
        amplification: Number.isFinite(precision.amplification) ? precision.amplification : undefined,
        digits: finite(precision.digits),
      }),
    ),
    work: { ...answer.work },
    massBalance: finite(answer.massBalance),
    warnings: answer.warnings.map((warning) => ({ code: warning.code, message: warningSentence(warning) })),
  })

const echoedAsk = (read: ReadScenario): JsonValue =>
  (read.source as { readonly ask?: JsonValue } | null)?.ask ?? null

const writeHours = (ledger: HoursLedger): JsonValue =>
  given({
    total: hours(ledger.total),
    lines: ledger.lines.map((line) => ({
      cause: line.cause,
      label: hoursCauseSentence(line.cause),
      time: hours(line.time),
    })),
    largestAvoidable: ledger.largestAvoidable,
    sentence: ledgerSentence(ledger),
  })

const writeRemedy = (remedy: Remedy): JsonValue =>
  given({
    kind: remedy.kind,
    dose: 'dose' in remedy ? measured(remedy.dose, 'mass', 'kg') : undefined,
    temperature: 'temperature' in remedy ? measured(remedy.temperature, 'temperature', 'degC') : undefined,
    conversion: 'conversion' in remedy ? finite(remedy.conversion) : undefined,
    pH: 'pH' in remedy ? finite(remedy.pH) : undefined,
    extra: 'extra' in remedy ? hours(remedy.extra) : undefined,
    doses: 'doses' in remedy ? finite(remedy.doses) : undefined,
    each: 'each' in remedy ? measured(remedy.each, 'mass', 'kg') : undefined,
    every: 'every' in remedy ? hours(remedy.every) : undefined,
    time: hours(remedy.time),
    sentence: remedySentence(remedy),
  })

const writeTrace = (trace: Trace): JsonValue => {
  const column = <D extends DimensionName>(values: Float64Array, dimension: D, unit: string) => ({
    unit,
    values: Array.from(values, (value) => measured(value as Quantity<D>, dimension, unit).value),
  })
  const plain = (values: Float64Array) => ({ unit: '1', values: Array.from(values, finite) })
  return given({
    time: column(trace.time, 'time', 'h'),
    substrate: column(trace.substrate, 'concentration', 'g/L'),
    product: column(trace.product, 'concentration', 'g/L'),
    enzyme: column(trace.enzyme, 'concentration', 'g/L'),
    temperature: column(trace.temperature, 'temperature', 'degC'),
    pH: map(trace.pH, plain),
    volume: column(trace.volume, 'volume', 'm3'),
    conversion: plain(trace.conversion),
  })
}

const hours = (time: Time) => measured(time, 'time', 'h')

const measured = <D extends DimensionName>(value: Quantity<D>, dimension: D, unit: string) => ({
  value: finite(inUnit(value, dimension, unit) ?? Number.NaN),
  unit,
})

const finite = (value: number): number => {
  if (!Number.isFinite(value)) throw new Error('the engine answered with a number that is not finite')
  return value + 0
}

const map = <T, U>(value: T | undefined, made: (value: T) => U): U | undefined =>
  value === undefined ? undefined : made(value)

/** Without the keys that have no value. */
const given = (object: { readonly [key: string]: JsonValue | undefined }): JsonObject => {
  const written: { [key: string]: JsonValue } = {}
  for (const [key, value] of Object.entries(object)) if (value !== undefined) written[key] = value
  return written
}
