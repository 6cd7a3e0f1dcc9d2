import { afterAll, describe, test } from 'vitest'
import { type ReferenceBatch, stagedBatch } from '../../reference/batches.ts'
import { tally } from '../../reference/compare.ts'
import { load, type StagedCase } from '../../reference/load.ts'
import { automatic, compareStates, explicit, finest, implicit, separation } from '../../reference/routes.ts'

const { cases } = load('staged_dose')
const fed = (one: StagedCase): boolean => one.inputs.kind === 'fed_batch'

const batchOf = ({ inputs, expected }: StagedCase): ReferenceBatch =>
  stagedBatch(inputs, expected.state_at_time.at(-1)?.t ?? Number.NaN)

describe.each([separation, automatic, explicit, implicit, finest])(
  'doses in time, under a programme and beside a feed run as worked out, by $name',
  (way) => {
    const counted = tally(`staged doses by ${way.name}`)
    afterAll(() => console.log(counted.worst()))

    test.each(cases.filter((one) => way !== separation || !fed(one)))('$id', (one) => {
      const { inputs, expected } = one
      const dose = inputs.doses.reduce((sum, { E_added }) => sum + E_added, inputs.E0 ?? 0)
      counted.hold(
        one.id,
        compareStates(
          way,
          batchOf(one),
          expected.state_at_time.map(({ V, X, X_of_supplied, ...row }) => {
            const conversion = X_of_supplied ?? X
            return {
              ...row,
              // The cases without a feed are worked out for a litre.
              ...(fed(one) && { V }),
              ...(conversion !== undefined && { X: conversion }),
              dose,
            }
          }),
        ),
      )
    })
  },
)
