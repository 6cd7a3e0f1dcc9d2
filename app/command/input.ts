/** Reads a whole scenario file or standard input, up to a limit, or says in a sentence why not. */
import { open } from 'node:fs/promises'
import { failed, type Outcome, success } from '../../engine/outcome.ts'
import { largestFile } from '../contract/read-scenario.ts'

/** Says that a file or a line is longer than a scenario may be; it was not kept. */
export const tooLongSentence = `is longer than ${largestFile / 1e6} MB, the most that a scenario may be`

interface Unreadable {
  readonly kind: 'unreadable'
  readonly sentence: string
}

const sentences: Readonly<Record<string, string>> = {
  ENOENT: 'there is no such file',
  ENOTDIR: 'there is no such file',
  EISDIR: 'is a folder; a scenario file fits',
  EACCES: 'may not be read (permission denied)',
  EPERM: 'may not be read (permission denied)',
  ENAMETOOLONG: 'the name is too long for a file',
  ELOOP: 'the link leads back to itself',
}

const unreadable = (name: string, error: unknown): Outcome<never, Unreadable> => {
  const code = error instanceof Error && 'code' in error ? String(error.code) : ''
  const known = sentences[code]
  if (known === undefined && code === '') throw error
  return failed({ kind: 'unreadable', sentence: `${name}: ${known ?? `cannot be read (${code})`}` })
}

/** Reads a file, or standard input where the name is `-`. */
export const readInput = async (name: string): Promise<Outcome<Buffer, Unreadable>> => {
  const chunks: Buffer[] = []
  let length = 0
  try {
    for await (const chunk of name === '-' ? process.stdin : await fileStream(name)) {
      chunks.push(chunk)
      length += chunk.length
      if (length > largestFile) {
        return failed({ kind: 'unreadable', sentence: `${shown(name)}: ${tooLongSentence}` })
      }
    }
  } catch (error) {
    return unreadable(shown(name), error)
  }
  return success(Buffer.concat(chunks))
}

const shown = (name: string): string => (name === '-' ? 'standard input' : name)

const fileStream = async (name: string): Promise<AsyncIterable<Buffer>> => {
  if (name.includes('\0')) throw Object.assign(new Error('NUL in a name'), { code: 'ENOENT' })
  return (await open(name)).createReadStream({ highWaterMark: 256 * 1024 })
}
