/**
 * `plan --stream`: one scenario a line in, one answer a line out, in order and in constant memory. A line that
 * is wrong, or that the engine cannot answer, gives an error on its own line and harms no other.
 */
import { setFlagsFromString } from 'node:v8'
import { type Fault, wholeFile, writeAnswer } from '../contract/index.ts'
import { largestFile } from '../contract/read-scenario.ts'
import { answerBytes } from './answer-bytes.ts'
import { exitCode } from './exit-code.ts'
import { tooLongSentence } from './input.ts'
import { sentenceFor } from './internal-failure.ts'
import { type Line, lineSplitter } from './line-splitter.ts'
import { print } from './streams.ts'

// Answers are written in pieces of about this many characters: a write for each would cost more than the answer.
const piece = 64 * 1024

/** Answers standard input line by line until it ends, and gives the exit code. */
export const planStream = async (): Promise<number> => {
  // Collect early rather than let the heap grow: what is alive after an answer is a tenth of what making it left
  // behind, and by default the collector would let that gather to twice the memory. It costs no time.
  setFlagsFromString('--optimize-for-size')
  const splitter = lineSplitter(largestFile)
  for await (const chunk of process.stdin) await answerAll(splitter.push(chunk))
  await answerAll(splitter.end())
  return exitCode.answered
}

const answerAll = async (lines: Iterable<Line>): Promise<void> => {
  let pending = ''
  for (const line of lines) {
    pending += `${answerLine(line)}\n`
    if (pending.length < piece) continue
    await print(pending)
    pending = ''
  }
  await print(pending)
}

const answerLine = (line: Line): string => {
  if (line === 'too-long') return wrong([{ path: wholeFile, message: tooLongSentence }])
  try {
    const answered = answerBytes(line)
    switch (answered.kind) {
      case 'answer':
        return JSON.stringify(writeAnswer(answered.answer, answered.read))
      case 'wrong':
        return wrong(answered.faults)
      case 'failed':
        return error(answered.sentence, [])
    }
  } catch (thrown) {
    return error(sentenceFor(thrown), [])
  }
}

const wrong = (faults: readonly Fault[]): string =>
  error(faults.map(({ path, message }) => `${path}: ${message}`).join('; '), faults)

const error = (message: string, faults: readonly Fault[]): string =>
  JSON.stringify({ error: { message, faults } })
