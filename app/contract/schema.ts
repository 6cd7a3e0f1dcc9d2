/** The JSON Schema of the scenario file, generated from the definition that reads it. */
import * as z from 'zod'
import { scenarioFile } from './definition/scenario-file.ts'

/** JSON Schema 2020-12 of what a scenario file may hold, as a plain object. */
export const scenarioSchema = (): Record<string, unknown> => ({
  title: 'Dosewright scenario, version 1',
  ...z.toJSONSchema(scenarioFile, { io: 'input', target: 'draft-2020-12' }),
})
