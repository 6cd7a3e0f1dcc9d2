/** The contract room: how scenarios come in and answers go out. */
export { type BadInput, type Fault, wholeFile } from './fault.ts'
export { decodeScenario, largestFile, type ReadScenario, readScenario } from './read-scenario.ts'
export { readableAnswer } from './readable-answer.ts'
export { scenarioSchema } from './schema.ts'
export { failureSentence, hoursCauseSentence, remedySentence, warningSentence } from './sentences.ts'
export { type JsonObject, type JsonValue, writeAnswer } from './write-answer.ts'
