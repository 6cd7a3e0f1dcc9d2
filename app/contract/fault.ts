/**
 * What is wrong with an input, where: the lines that a reader of standard error sees as `path: message`.
 *
 * Shapes   a path is keys joined by dots, places in a list in brackets from 0: `programme.phases[1].amount`;
 *          the file as a whole is `(file)`.
 */
export interface Fault {
  readonly path: string
  readonly message: string
}

/** The input cannot be read; `more` counts the faults beyond those listed. */
export interface BadInput {
  readonly kind: 'bad-input'
  readonly faults: readonly Fault[]
}

export type PathStep = string | number

/** The name of the file as a whole. */
export const wholeFile = '(file)'

/** A path as written in a fault line. */
export const pathText = (steps: readonly PathStep[]): string => {
  let text = ''
  for (const step of steps) {
    text += typeof step === 'number' ? `[${step}]` : `${text === '' ? '' : '.'}${visible(step, 60)}`
  }
  return text === '' ? wholeFile : text
}

/** Text shortened and with every control character escaped, so that it stays on its line. */
export const visible = (text: string, longest = 40): string => {
  const characters = Array.from(text.slice(0, longest * 2 + 2))
  const short =
    characters.length > longest ? `${characters.slice(0, longest).join('')}…` : characters.join('')
  return short.replace(unsafe, (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, '0')}`)
}

/** A found value for a message: quoted, shortened, escaped. */
export const found = (value: unknown): string => {
  if (typeof value === 'string') return `"${visible(value)}"`
  if (typeof value === 'number')
    return Number.isFinite(value) ? String(value) : 'a number beyond the range of doubles'
  if (value === null || typeof value === 'boolean') return String(value)
  if (value === undefined) return 'nothing'
  return Array.isArray(value) ? `a list of ${value.length}` : 'an object'
}

// Control characters, line and paragraph separators, direction marks, and halves of surrogate pairs.
const unsafe =
  // biome-ignore lint/suspicious/noControlCharactersInRegex: these are what must not reach a terminal
  /[\u0000-\u001f\u007f-\u009f\u2028\u2029\u200e\u200f\u202a-\u202e\u2066-\u2069]|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g
