/** Standard output and error: written with back-pressure, and no complaint when the reader has gone. */
import { once } from 'node:events'
import { visible } from '../contract/fault.ts'
import { exitCode } from './exit-code.ts'

const hasNoReader = (error: NodeJS.ErrnoException): boolean =>
  error.code === 'EPIPE' || error.code === 'ERR_STREAM_DESTROYED'

/**
 * Ends the process at once when whoever read its output has gone, as `| head` does; a full disk and its kin
 * end it with a sentence.
 */
export const leaveQuietlyWithoutReader = (): void => {
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (hasNoReader(error)) process.exit(process.exitCode ?? exitCode.answered)
    complain(`standard output: cannot be written (${error.code ?? error.message})`)
    process.exit(exitCode.internal)
  })
  process.stderr.on('error', () => {})
}

/** Writes to standard output and waits while its reader is behind. */
export const print = async (text: string): Promise<void> => {
  if (text !== '' && !process.stdout.write(text)) await once(process.stdout, 'drain')
}

/** One line on standard error, whatever was typed or thrown. */
export const complain = (line: string): void => {
  process.stderr.write(`${visible(line, 2000)}\n`)
}
