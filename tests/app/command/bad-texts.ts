/** Files that are no scenario at all, each with the line that says why. */
import { type BadInputCase, changed, soundScenario } from './bad-inputs.ts'

/** What is wrong with the text itself. */
export const badTexts: readonly BadInputCase[] = [
  { what: 'an empty file', input: '', lines: ['(file): is empty; a scenario is a JSON object'] },
  { what: 'blanks only', input: ' \n\t\n', lines: ['(file): is empty; a scenario is a JSON object'] },
  {
    what: 'not JSON',
    input: 'dose: 3.5 kg',
    lines: ['(file): line 1, column 1: "dose" is not a value of JSON; put text in double quotation marks'],
  },
  {
    what: 'JSON cut off',
    input: soundScenario.slice(0, 200),
    lines: ['(file): line 5, column 84: a string that begins here is never closed'],
  },
  {
    what: 'a comma too many',
    input: changed('0.9 }', '0.9, }'),
    lines: ['(file): line 16, column 47: a comma stands before the closing bracket; remove the comma'],
  },
  {
    what: 'a comment',
    input: changed('"version": 1,', '"version": 1, // first'),
    lines: ['(file): line 2, column 50: comments are not part of JSON; remove them'],
  },
  {
    what: 'two documents',
    input: `${soundScenario}\n{}`,
    lines: ['(file): line 18, column 1: something follows the end of the JSON value'],
  },
  {
    what: 'a list',
    input: '[1, 2]',
    lines: [
      '(file): found a list of 2; a scenario must be an object with format, version, title, feed, enzyme, programme, costs, spreads, ask',
    ],
  },
  {
    what: 'a number',
    input: '42',
    lines: [
      '(file): found 42; a scenario must be an object with format, version, title, feed, enzyme, programme, costs, spreads, ask',
    ],
  },
  {
    what: 'null',
    input: 'null',
    lines: [
      '(file): found null; a scenario must be an object with format, version, title, feed, enzyme, programme, costs, spreads, ask',
    ],
  },
  {
    what: 'binary',
    input: Uint8Array.from({ length: 4096 }, (_, i) => (i * 7919) % 256),
    lines: ['(file): holds bytes of value 0, so it is not a text in UTF-8'],
  },
  {
    what: 'a NUL',
    input: `${soundScenario.slice(0, -1)}\0}`,
    lines: ['(file): holds bytes of value 0, so it is not a text in UTF-8'],
  },
  {
    what: 'Latin-1',
    input: Buffer.from(changed('a sound one', 'für Käse'), 'latin1'),
    lines: ['(file): is not valid UTF-8; save it in UTF-8'],
  },
  {
    what: 'UTF-16',
    input: Buffer.from(`\ufeff${soundScenario}`, 'utf16le'),
    lines: ['(file): is in UTF-16; save it in UTF-8'],
  },
  {
    what: '100,000-deep nesting',
    input: changed('"a sound one"', '['.repeat(100_000) + ']'.repeat(100_000)),
    lines: ['(file): line 2, column 122: nests deeper than 64 levels'],
  },
  {
    what: '100,000 open brackets',
    input: '['.repeat(100_000),
    lines: ['(file): line 1, column 65: nests deeper than 64 levels'],
  },
  {
    what: 'a key given twice',
    input: changed('"Km": "8 g/L"', '"Km": "8 g/L", "Km": "9 g/L"'),
    lines: ['enzyme.rate.Km: the key is given more than once; keep one of them'],
  },
  {
    what: 'NaN',
    input: changed('0.9 }', 'NaN }'),
    lines: ['(file): line 16, column 42: NaN is not a number of JSON; only finite numbers are'],
  },
  {
    what: 'a line feed in a key',
    input: changed('"Ea": "45 kJ/mol"', '"Ea": "45 kJ/mol", "a\\nb\\u001b[31m": 1'),
    lines: [
      'enzyme.temperature.a\\u000ab\\u001b[31m: the key "a\\u000ab\\u001b[31m" is not known here; known here: Ea, Q10, from, reversibleLoss',
    ],
  },
]
