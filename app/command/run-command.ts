/**
 * From arguments to exit code. Verbs load what they need when they run, so that `help` and `version` answer
 * without loading the engine.
 */
import { type Call, type Misuse, readArguments } from './arguments.ts'
import { exitCode } from './exit-code.ts'
import { helpFor, version } from './help.ts'
import { sentenceFor } from './internal-failure.ts'
import { complain, print } from './streams.ts'

/** Runs one command line; the promise never rejects. */
export const runCommand = async (args: readonly string[]): Promise<number> => {
  try {
    const read = readArguments(args)
    if (read.ok) return await run(read.value)
    complain(await misuseSentence(read.failure))
    return exitCode.wrongInput
  } catch (error) {
    complain(`dosewright: ${sentenceFor(error)}`)
    if (process.env.DOSEWRIGHT_DEBUG === '1' && error instanceof Error)
      process.stderr.write(`${error.stack}\n`)
    return exitCode.internal
  }
}

const run = async (call: Call): Promise<number> => {
  switch (call.verb) {
    case 'help':
      await print(helpFor(call.about))
      return exitCode.answered
    case 'version':
      await print(`dosewright ${version()}\n`)
      return exitCode.answered
    case 'schema':
      return (await import('./schema.ts')).printSchema()
    case 'plan':
      return (await import('./plan-file.ts')).planFile(call.file, { json: call.json })
    case 'plan-stream':
      return (await import('./plan-stream.ts')).planStream()
  }
}

const misuseSentence = async ({ sentence, typo }: Misuse): Promise<string> => {
  if (typo === undefined) return sentence
  const { nearest } = await import('../../engine/index.ts')
  const near = nearest(typo.typed, typo.known)
  return near === undefined ? sentence : `${sentence}; the nearest is ${typo.prefix}${near}`
}
