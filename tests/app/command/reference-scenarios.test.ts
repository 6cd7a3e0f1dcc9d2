/**
 * The sourced cases as scenario lines through the built program: what a plan answers in each of its asks, whatever
 * form the file has, meets the digits that the numbers allow.
 */
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import {
  closedFormBatch,
  conditionOfS,
  inactivationBatch,
  inhibitionBatch,
  optimumBatch,
  programmeBatch,
  type ReferenceBatch,
  seriesBatch,
  stagedBatch,
} from '../../reference/batches.ts'
import { type Comparison, type Tally, tally } from '../../reference/compare.ts'
import { load } from '../../reference/load.ts'
import { type AskOf, scenarioFile } from '../../reference/scenario-files.ts'
import { dosewright } from './running.ts'

interface Measured {
  readonly value: number
  readonly unit: string
}

type Column = { readonly unit: string; readonly values: readonly number[] }

interface AnswerLine {
  readonly error?: unknown
  readonly reachable?: boolean
  readonly time?: Measured
  readonly dose?: Measured
  readonly leastDose?: Measured
  readonly temperature?: Measured
  readonly conversion?: number
  readonly limitingConversion?: number
  readonly trace?: Readonly<Record<'substrate' | 'product' | 'enzyme' | 'conversion' | 'volume', Column>>
  readonly check?: { readonly method: string; readonly relativeDifference: number | null }
  readonly warnings?: readonly { readonly code: string; readonly message: string }[]
}

interface Asked {
  readonly id: string
  readonly line: string
  readonly compare: (answer: AnswerLine) => readonly Comparison[]
  /** By how much the numbers asked magnify what is off. */
  readonly condition: number
}

/** What a number of this condition may be off; its form in the file adds a few round-offs of its own. */
const allowed = (condition = 1): number => Math.max(1e-9, 2e-14 * condition)
/** Where steps answer. */
const stepped = 1e-7

let forms = 0
const asked = (
  id: string,
  batch: ReferenceBatch,
  ask: AskOf,
  compare: Asked['compare'],
  condition = 1,
): Asked => ({ id, line: JSON.stringify(scenarioFile(batch, ask, forms++)), compare, condition })

const hours = (measured: Measured | undefined): number | undefined => {
  if (measured !== undefined) expect(measured.unit).toBe('h')
  return measured && 60 * measured.value
}
/** mg/L from kg in a batch. */
const perLitre = ({ charge }: ReferenceBatch, measured: Measured | undefined): number | undefined => {
  if (measured !== undefined) expect(measured.unit).toBe('kg')
  return measured && (1e6 * measured.value) / charge.V
}

const timeAsked = (
  id: string,
  batch: ReferenceBatch,
  conversion: number,
  due: { readonly t?: number; readonly limit?: number; readonly least?: number | null },
  condition = 1,
): Asked =>
  asked(
    id,
    batch,
    { find: 'time', conversion },
    (answer) => {
      expect(answer.reachable).toBe(due.t !== undefined)
      if (due.t === undefined) expect(answer.time).toBeUndefined()
      return [
        ...(due.t === undefined
          ? []
          : [
              {
                what: `time to ${conversion}`,
                got: hours(answer.time),
                due: due.t,
                within: allowed(condition),
              },
            ]),
        ...(due.limit === undefined
          ? []
          : [
              {
                what: `limit before ${conversion}`,
                got: answer.limitingConversion,
                due: due.limit,
                within: 1e-9,
              },
            ]),
        ...(typeof due.least === 'number' && due.least > 0
          ? [
              {
                what: `least dose for ${conversion}`,
                got: perLitre(batch, answer.leastDose),
                due: due.least,
                within: 1e-9,
              },
            ]
          : []),
      ]
    },
    condition,
  )

interface TraceRow {
  readonly t: number
  readonly S: number
  readonly P?: number
  readonly X?: number
  readonly E?: number
  readonly V?: number
  readonly enzymeTime?: number
}

const traceAsked = (
  id: string,
  batch: ReferenceBatch,
  rows: readonly TraceRow[],
  { within = 1e-9, leastS = 0, leastE = 0 } = {},
): Asked => {
  const conditions = rows.map(({ enzymeTime, S }) =>
    enzymeTime === undefined ? 1 : conditionOfS(batch, enzymeTime, S),
  )
  return asked(
    id,
    batch,
    { find: 'trace', at: rows.map(({ t }) => t) },
    ({ trace }) =>
      rows.flatMap(({ t, S, P, X, E, V }, i): Comparison[] => {
        const near = Math.max(within, allowed(conditions[i]))
        const at = (column: keyof NonNullable<AnswerLine['trace']>): number | undefined =>
          trace?.[column].values[i]
        return [
          { what: `S at ${t}`, got: at('substrate'), due: S, within: near, floor: leastS },
          ...(P === undefined ? [] : [{ what: `P at ${t}`, got: at('product'), due: P, within: near }]),
          ...(X === undefined
            ? []
            : [{ what: `X at ${t}`, got: at('conversion'), due: X, within: near, floor: leastS }]),
          ...(E === undefined
            ? []
            : [{ what: `E at ${t}`, got: 1000 * (at('enzyme') ?? 0), due: E, within, floor: leastE }]),
          ...(V === undefined
            ? []
            : [{ what: `V at ${t}`, got: 1000 * (at('volume') ?? 0), due: V, within }]),
        ]
      }),
    Math.max(1, ...conditions),
  )
}

const groups: readonly { readonly name: string; readonly lines: readonly Asked[] }[] = [
  {
    name: 'Michaelis–Menten',
    lines: load('michaelis_menten_closed_form').cases.flatMap((one) => {
      const batch = closedFormBatch(one)
      const { Vmax, state_at_time: rows = [], time_to_conversion: times } = one.expected
      return [
        ...times.map(({ X, t }) => timeAsked(one.id, batch, X, { t })),
        ...(rows.length === 0
          ? []
          : [
              traceAsked(
                one.id,
                batch,
                rows.map(({ t, S, X, S0_minus_S }) => ({ t, S, X, P: S0_minus_S, enzymeTime: Vmax * t })),
              ),
            ]),
      ]
    }),
  },
  {
    name: 'inhibition and reversibility',
    lines: load('product_inhibition').cases.flatMap((one) => {
      const batch = inhibitionBatch(one)
      const { kcat, E } = one.inputs
      return [
        ...one.expected.time_to_conversion.map(({ X, t, limiting_conversion: limit }) =>
          timeAsked(one.id, batch, X, {
            ...(t !== undefined && { t }),
            ...(limit !== undefined && { limit }),
          }),
        ),
        traceAsked(
          one.id,
          batch,
          one.expected.state_at_time.map((row) => ({ ...row, E, enzymeTime: kcat * E * row.t })),
        ),
      ]
    }),
  },
  {
    name: 'inactivation',
    lines: load('inactivation').cases.flatMap((one) => {
      const batch = inactivationBatch(one)
      const { kcat, kd, E0 } = one.inputs
      const { expected } = one
      const spread = (x: number): number => (x > 0 ? x / ((1 - x) * -Math.log1p(-x)) : 1)
      return [
        ...expected.time_to_conversion.map(({ X, t, limiting_conversion: limit, minimum_dose_E0: least }) =>
          timeAsked(
            one.id,
            batch,
            X,
            { ...(t !== undefined && { t }), ...(limit !== undefined && { limit }), least },
            t === undefined ? 1 : spread((least ?? 0) / E0),
          ),
        ),
        ...expected.edge_of_reachability.flatMap((edge) => [
          timeAsked(
            one.id,
            inactivationBatch(one, edge.E0),
            edge.X,
            { t: edge.t },
            edge.condition_number_t_wrt_E0,
          ),
          timeAsked(one.id, inactivationBatch(one, edge.just_below.E0), edge.X, {
            limit: edge.just_below.limiting_conversion,
          }),
        ]),
        ...expected.dose_for_time.map(({ X, t, E0: dose }) =>
          asked(one.id, batch, { find: 'dose', conversion: X, within: t }, (answer) => {
            expect(answer.reachable).toBe(dose !== undefined)
            return [
              {
                what: `dose for ${X} in ${t}`,
                got: perLitre(batch, answer.dose) ?? Number.POSITIVE_INFINITY,
                due: dose ?? Number.POSITIVE_INFINITY,
                within: 1e-9,
              },
            ]
          }),
        ),
        traceAsked(
          one.id,
          batch,
          expected.state_at_time.map((row) => ({
            ...row,
            enzymeTime: kcat * E0 * (kd === 0 ? row.t : -Math.expm1(-kd * row.t) / kd),
          })),
        ),
      ]
    }),
  },
  {
    name: 'two-step inactivation',
    lines: load('two_step_inactivation')
      .cases.filter((one) => one.expected.time_to_conversion)
      .flatMap((one) => {
        const { time_to_conversion: times = [], limiting_conversion: limit = Number.NaN } = one.expected
        return times.map(({ X, t }) =>
          timeAsked(one.id, seriesBatch(one), X, t === undefined ? { limit } : { t }),
        )
      }),
  },
  {
    name: 'temperature programmes',
    lines: load('temperature_program').cases.flatMap((one) => {
      const batch = programmeBatch(one)
      const dose = one.inputs.E0
      return [
        ...one.expected.time_to_conversion.map(({ X, t }) =>
          timeAsked(one.id, batch, X, t === undefined ? {} : { t }),
        ),
        traceAsked(
          one.id,
          batch,
          one.expected.state_at_time.map(({ kcat_E_integral, ...row }) => ({
            ...row,
            enzymeTime: kcat_E_integral,
          })),
          // What is below it has the digits of its exponent only.
          { leastE: 1e-30 * dose },
        ),
      ]
    }),
  },
  {
    name: 'staged doses and feeds',
    lines: load('staged_dose').cases.flatMap((one) => {
      const rows = one.expected.state_at_time
      const batch = stagedBatch(one.inputs, rows.at(-1)?.t ?? Number.NaN)
      const fed = one.inputs.kind === 'fed_batch'
      const dose = one.inputs.doses.reduce((sum, { E_added }) => sum + E_added, one.inputs.E0 ?? 0)
      const floors = { within: stepped, leastS: 1e-6 * one.inputs.S0, leastE: 1e-5 * dose }
      const states = rows.map(({ V, X, X_of_supplied, ...row }) => {
        const conversion = X_of_supplied ?? X
        return { ...row, ...(fed && { V }), ...(conversion !== undefined && { X: conversion }) }
      })
      // Thrice, so that each is read in several forms.
      return [0, 1, 2].map(() => traceAsked(one.id, batch, states, fed ? floors : {}))
    }),
  },
  {
    name: 'best temperatures',
    lines: load('optimum').cases.flatMap((one) => {
      const { problem, X, t, T_min, T_max } = one.inputs
      const { T_opt, t_min, X_max, at_bound } = one.expected
      const batch = optimumBatch(one, 45)
      const between = [T_min, T_max] as const
      const found = (answer: AnswerLine): Comparison => {
        expect(answer.warnings?.some(({ code }) => code === 'optimum-at-bound')).toBe(at_bound)
        expect(answer.temperature?.unit).toBe('degC')
        return { what: 'temperature', got: answer.temperature?.value, due: T_opt, within: 1e-5 / T_opt }
      }
      if (problem === 'temperature_for_minimum_time')
        return [
          asked(one.id, batch, { find: 'temperature', best: 'time', conversion: X, between }, (answer) => [
            found(answer),
            { what: 'time', got: hours(answer.time), due: t_min, within: 1e-9 },
          ]),
        ]
      if (problem === 'temperature_for_maximum_conversion')
        return [
          asked(one.id, batch, { find: 'temperature', best: 'conversion', within: t, between }, (answer) => [
            found(answer),
            { what: 'conversion', got: answer.conversion, due: X_max, within: 1e-9 },
          ]),
        ]
      return []
    }),
  },
]

const every = groups.flatMap(({ lines }) => lines)
const answers = new Map<Asked, AnswerLine>()

beforeAll(async () => {
  const input = every.map(({ line }) => `${line}\n`).join('')
  const { code, stdout, stderr } = await dosewright(['plan', '--stream'], { input })
  expect({ code, stderr }).toEqual({ code: 0, stderr: '' })
  const said = stdout.split('\n').slice(0, -1)
  expect(said.length).toBe(every.length)
  said.forEach((line, i) => {
    const one = every[i]
    if (one) answers.set(one, JSON.parse(line) as AnswerLine)
  })
})

const answerTo = (one: Asked): AnswerLine => {
  const answer = answers.get(one)
  if (answer === undefined || answer.error !== undefined)
    expect.unreachable(`${one.line}\n${JSON.stringify(answer)}`)
  return answer
}

describe.each(groups)('$name', ({ name, lines }) => {
  const counted: Tally = tally(`${name}, streamed`)
  const checked: Tally = tally(`${name}, checks`)
  afterAll(() => {
    console.log(counted.worst())
    console.log(checked.worst())
  })
  const ids = [...new Set(lines.map(({ id }) => id))]

  test.each(ids)('%s', (id) => {
    for (const one of lines.filter((line) => line.id === id)) {
      const comparisons = one.compare(answerTo(one))
      if (comparisons.length > 0) counted.hold(id, comparisons, one.line)
    }
  })

  test.each(ids)('%s carries a check that agrees', (id) => {
    for (const one of lines.filter((line) => line.id === id)) {
      const { check } = answerTo(one)
      expect(check?.method).toMatch(/^ode-(ex|im)plicit$/)
      const got = check?.relativeDifference ?? Number.NaN
      checked.hold(
        id,
        [{ what: 'check', got: 1 + got, due: 1, within: 1e-6 * Math.max(1, one.condition) }],
        one.line,
      )
    }
  })
})
