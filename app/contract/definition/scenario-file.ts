/**
 * The scenario file, defined once: this reads a file into SI and generates its JSON Schema.
 *
 * Source   the format's page: "format": "dosewright-scenario", "version": 1.
 */
import * as z from 'zod'
import { found } from '../fault.ts'
import { scenarioRules } from '../rules/scenario-rules.ts'
import { ask } from './ask.ts'
import { onObject } from './clashes.ts'
import { enzyme } from './enzyme.ts'
import { feed } from './feed.ts'
import { record, textField } from './fields.ts'
import { costs, spreads } from './money.ts'
import { programme } from './programme.ts'

const exactly = <V extends string | number>(value: V, otherwise: string) =>
  z.literal(value, {
    error: (issue) =>
      issue.input === undefined
        ? `is missing; it is ${JSON.stringify(value)}`
        : `found ${found(issue.input)}; ${otherwise}`,
  })

/** The whole file. */
export const scenarioFile = record('a scenario', {
  format: exactly('dosewright-scenario', 'a scenario file says "dosewright-scenario"'),
  version: exactly(1, 'this program reads version 1'),
  title: textField('title').exactOptional(),
  feed,
  enzyme,
  programme,
  costs: costs.exactOptional(),
  spreads: spreads.exactOptional(),
  ask,
}).superRefine(scenarioRules, onObject)

export type ScenarioFile = z.output<typeof scenarioFile>
