/** The verbs and flags of the command line, as data: the argument reader and the help both read them. */

/** One verb: how it is called, what it does and which flags fit. */
export interface Verb {
  readonly name: string
  readonly synopses: readonly { readonly call: string; readonly does: string }[]
  readonly flags: readonly string[]
  /** Said by `help VERB` beneath the synopses. */
  readonly details: readonly string[]
}

/** Every verb, in the order in which the help lists them. */
export const verbs: readonly Verb[] = [
  {
    name: 'plan',
    synopses: [
      { call: 'plan FILE [--json]', does: 'answers the question a scenario file asks' },
      { call: 'plan - [--json]', does: 'the same for a scenario on standard input' },
      { call: 'plan --stream', does: 'one scenario a line in, one answer a line out' },
    ],
    flags: ['json', 'stream'],
    details: [
      '--json prints the answer as one JSON document with full-precision numbers.',
      '--stream reads standard input to its end. Every line in, blank ones too, gives one line out, in order:',
      'an answer, or {"error": {"message": …, "faults": [{"path": …, "message": …}]}} for a line that is wrong.',
      'Lines that are wrong leave the exit code 0.',
    ],
  },
  {
    name: 'schema',
    synopses: [{ call: 'schema', does: 'prints the JSON Schema of scenario files' }],
    flags: [],
    details: ['Every scenario that the schema refuses, plan refuses too.'],
  },
  {
    name: 'help',
    synopses: [{ call: 'help [VERB]', does: 'prints this, or more about one verb' }],
    flags: [],
    details: [],
  },
  {
    name: 'version',
    synopses: [{ call: 'version', does: 'prints the version' }],
    flags: [],
    details: [],
  },
]

/** Flags that fit every verb. */
export const flagsEverywhere: readonly string[] = ['help', 'version']

/** The verb of a name. */
export const verbNamed = (name: string): Verb | undefined => verbs.find((verb) => verb.name === name)
