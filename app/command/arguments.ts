/** Reads the command line's arguments into one call, or one sentence about what is wrong with them. */
import { parseArgs } from 'node:util'
import { failed, type Outcome, success } from '../../engine/outcome.ts'
import { flagsEverywhere, type Verb, verbNamed, verbs } from './verbs.ts'

/** What the arguments ask for. */
export type Call =
  | { readonly verb: 'help'; readonly about: Verb | undefined }
  | { readonly verb: 'version' }
  | { readonly verb: 'schema' }
  | { readonly verb: 'plan'; readonly file: string; readonly json: boolean }
  | { readonly verb: 'plan-stream' }

/** Arguments that no verb takes. */
export interface Misuse {
  readonly kind: 'misuse'
  readonly sentence: string
  /** The word that is not known and the words that are: what is needed to name the nearest one. */
  readonly typo?: { readonly typed: string; readonly known: readonly string[]; readonly prefix: string }
}

type Read = Outcome<Call, Misuse>

const misuse = (sentence: string): Read => failed({ kind: 'misuse', sentence })

const known = [...new Set([...flagsEverywhere, ...verbs.flatMap((verb) => verb.flags)])]

const options = {
  ...Object.fromEntries(known.map((name) => [name, { type: 'boolean' as const }])),
  help: { type: 'boolean' as const, short: 'h' },
}

const unknown = (what: string, typed: string, words: readonly string[], prefix = ''): Read =>
  failed({
    kind: 'misuse',
    sentence: `${what}; what fits: ${words.map((word) => `${prefix}${word}`).join(', ')}`,
    typo: { typed, known: words, prefix },
  })

const unknownVerb = (typed: string): Read =>
  unknown(
    `${typed}: there is no such verb`,
    typed,
    verbs.map((verb) => verb.name),
  )

/** Reads the arguments after the program's name. */
export const readArguments = (args: readonly string[]): Read => {
  const { tokens, positionals } = parseArgs({
    args: [...args],
    options,
    allowPositionals: true,
    strict: false,
    tokens: true,
  })
  const [name, ...operands] = positionals
  const verb = name === undefined ? undefined : verbNamed(name)
  const given = tokens.filter((token) => token.kind === 'option')

  if (name !== undefined && verb === undefined) return unknownVerb(name)
  for (const flag of given) {
    const fits = verb === undefined ? known : [...verb.flags, ...flagsEverywhere]
    if (!fits.includes(flag.name)) {
      const where = verb === undefined ? '' : ` of ${verb.name}`
      return unknown(`${flag.rawName}: there is no such flag${where}`, flag.name, fits, '--')
    }
    if (flag.value !== undefined) return misuse(`${flag.rawName}: takes no value, found ${flag.value}`)
  }
  const has = (flag: string): boolean => given.some((token) => token.name === flag)
  if (has('help')) return success({ verb: 'help', about: verb?.name === 'help' ? undefined : verb })
  if (has('version')) return success({ verb: 'version' })
  if (verb === undefined) {
    return misuse(`a verb is missing; what fits: ${verbs.map((each) => each.name).join(', ')}`)
  }
  return readOperands(verb, operands, { json: has('json'), stream: has('stream') })
}

const readOperands = (
  verb: Verb,
  operands: readonly string[],
  flags: { readonly json: boolean; readonly stream: boolean },
): Read => {
  const [first, second] = operands
  if (verb.name === 'help') {
    if (second !== undefined) return misuse(`${second}: help takes one verb`)
    const about = first === undefined ? undefined : verbNamed(first)
    if (first !== undefined && about === undefined) return unknownVerb(first)
    return success({ verb: 'help', about })
  }
  if (verb.name === 'plan' && flags.stream) {
    return first === undefined
      ? success({ verb: 'plan-stream' })
      : misuse(`${first}: plan --stream reads standard input and takes no FILE`)
  }
  if (verb.name === 'plan') {
    if (first === undefined) return misuse('plan: FILE is missing; a scenario file fits, - or --stream')
    if (second !== undefined) return misuse(`${second}: plan takes one FILE`)
    return success({ verb: 'plan', file: first, json: flags.json })
  }
  if (first !== undefined) return misuse(`${first}: ${verb.name} takes no more words`)
  return success(verb.name === 'schema' ? { verb: 'schema' } : { verb: 'version' })
}
