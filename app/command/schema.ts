/** `schema`: the JSON Schema of scenario files, from the definition that validates them. */
import { scenarioSchema } from '../contract/index.ts'
import { exitCode } from './exit-code.ts'
import { print } from './streams.ts'

/** Prints the schema and gives the exit code. */
export const printSchema = async (): Promise<number> => {
  await print(`${JSON.stringify(scenarioSchema(), null, 2)}\n`)
  return exitCode.answered
}
