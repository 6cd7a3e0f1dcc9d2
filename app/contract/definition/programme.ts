/** What is done with the batch: the short form, or phases in order. */
import * as z from 'zod'
import { found } from '../fault.ts'
import { complain, given, listed, onObject } from './clashes.ts'
import { conditions } from './enzyme.ts'
import { flagField, phField, quantityField, record } from './fields.ts'
import { phase } from './phases.ts'

const shortKeys = ['temperature', 'pH', 'dose', 'hold'] as const
const phaseKeys = ['start', 'phases'] as const

/** `programme` of the file. */
export const programme = record('what is done with the batch', {
  temperature: quantityField('temperature', 'above', {
    title: 'the temperature held throughout',
  }).exactOptional(),
  pH: phField('the pH held throughout').exactOptional(),
  dose: quantityField('mass', 'above', { title: 'the dose, given at time 0,' }).exactOptional(),
  hold: quantityField('time', 'above', { title: 'the time the batch is held' }).exactOptional(),
  start: conditions('conditions before the first phase').exactOptional(),
  phases: z
    .array(phase, { error: (issue) => `found ${found(issue.input)}; phases is a list of objects, in order` })
    .exactOptional(),
  countDoseVolume: flagField(
    'whether a dose adds its volume; needs the density of the preparation',
  ).exactOptional(),
})
  .superRefine((value, ctx) => {
    const short = given(value, shortKeys)
    const phased = given(value, phaseKeys)
    if (short.length > 0 && phased.length > 0) {
      complain(
        ctx,
        `found ${listed(short, 'and')} of the short form beside ${listed(phased, 'and')}; give the short form, or start and phases`,
      )
      return
    }
    if (phased.length === 0) {
      if (!short.includes('temperature')) {
        complain(
          ctx,
          'is missing; write the temperature held, such as "42 degC", or give start and phases',
          'temperature',
        )
      }
      return
    }
    if (!phased.includes('start'))
      complain(ctx, 'is missing; phases need the conditions they start from', 'start')
    if (!phased.includes('phases'))
      complain(ctx, 'is missing; start needs a list of phases after it', 'phases')
  }, onObject)
  .meta({
    oneOf: [
      { required: ['temperature'], not: { anyOf: phaseKeys.map((key) => ({ required: [key] })) } },
      { required: [...phaseKeys], not: { anyOf: shortKeys.map((key) => ({ required: [key] })) } },
    ],
  })

export type ProgrammeFile = z.output<typeof programme>
