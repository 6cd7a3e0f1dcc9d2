/** `plan FILE`: one scenario in, one answer out. */
import { readableAnswer, writeAnswer } from '../contract/index.ts'
import { answerBytes } from './answer-bytes.ts'
import { exitCode } from './exit-code.ts'
import { readInput } from './input.ts'
import { complain, print } from './streams.ts'

/** Answers the scenario in a file, or on standard input for `-`, and gives the exit code. */
export const planFile = async (file: string, { json }: { readonly json: boolean }): Promise<number> => {
  const input = await readInput(file)
  if (!input.ok) {
    complain(input.failure.sentence)
    return exitCode.wrongInput
  }
  const answered = answerBytes(input.value)
  switch (answered.kind) {
    case 'wrong':
      for (const { path, message } of answered.faults) complain(`${path}: ${message}`)
      return exitCode.wrongInput
    case 'failed':
      complain(answered.sentence)
      return exitCode.internal
    case 'answer': {
      const { answer, read } = answered
      const text = json ? JSON.stringify(writeAnswer(answer, read), null, 2) : readableAnswer(answer, read)
      await print(`${text}\n`)
      return exitCode.answered
    }
  }
}
