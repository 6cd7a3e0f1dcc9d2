import { afterAll, describe, test } from 'vitest'
import { seriesBatch } from '../../reference/batches.ts'
import { tally } from '../../reference/compare.ts'
import { load } from '../../reference/load.ts'
import { automatic, compareTimes, explicit, finest, implicit, separation } from '../../reference/routes.ts'

const cases = load('two_step_inactivation').cases.filter((one) => one.expected.time_to_conversion)

describe.each([separation, automatic, explicit, implicit, finest])(
  'a batch whose enzyme dies in two steps runs as worked out, by $name',
  (way) => {
    const counted = tally(`two-step batches by ${way.name}`)
    afterAll(() => console.log(counted.worst()))

    test.each(cases)('$id', (one) => {
      const { time_to_conversion: times = [], limiting_conversion: limit = Number.NaN } = one.expected
      const batch = seriesBatch(one)
      const run = way.route(batch)({ doseScale: 1, endless: true })
      const end = run.ok ? run.value.end : undefined
      counted.hold(one.id, [
        ...compareTimes(
          way,
          batch,
          times.map(({ X, t = null }) => ({ X, t })),
        ),
        { what: 'conversion at rest', got: end?.conversion, due: limit, within: way.within },
      ])
    })
  },
)
