/** The help and the version, as text for standard output. */
import { readFileSync } from 'node:fs'
import { type Verb, verbs } from './verbs.ts'

const exits = [
  'Exit code 0: answered, also where the target cannot be reached. 2: the input is wrong; each fault is a line on',
  'standard error, as path: what is wrong. 1: an internal failure.',
]

const cautions = [
  'Predictions support, never replace, validated procedures, assays on the batch itself and the law.',
]

const synopsesOf = (listed: readonly Verb[]): string[] => {
  const all = listed.flatMap((verb) => verb.synopses)
  const width = Math.max(...all.map(({ call }) => call.length))
  return all.map(({ call, does }) => `  dosewright ${call.padEnd(width)}  ${does}`)
}

/** The help on one verb, or on all of them. */
export const helpFor = (about: Verb | undefined): string => {
  const lines = about
    ? [...synopsesOf([about]), ...(about.details.length > 0 ? ['', ...about.details] : [])]
    : [
        'dosewright plans industrial enzyme hydrolysis batches: dose, temperature, pH and hold.',
        '',
        ...synopsesOf(verbs),
        '',
        ...exits,
        ...cautions,
      ]
  return `${lines.join('\n')}\n`
}

/** The version in package.json, which lies two folders up from the sources and from the built program. */
export const version = (): string => {
  const text = readFileSync(new URL('../../package.json', import.meta.url), 'utf8')
  return (JSON.parse(text) as { version: string }).version
}
