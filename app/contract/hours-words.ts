/** Where the hours go, in words: one sentence, and the lines of a table. */
import { formatNumber, formatQuantity, type HoursLedger } from '../../engine/index.ts'
import { hoursCauseSentence, percent } from './sentences.ts'

/** The largest part of the hold that a change of plan could avoid, in one sentence. */
export const ledgerSentence = (ledger: HoursLedger): string => {
  const total = formatQuantity(ledger.total, 'time', 'h')
  const worst = ledger.lines.find((line) => line.cause === ledger.largestAvoidable)
  if (worst === undefined || !(ledger.total > 0))
    return `Of ${total}, nothing stands out that a change of plan could avoid.`
  const share = percent(worst.time / ledger.total, 2)
  return `Of ${total}, ${formatQuantity(worst.time, 'time', 'h')} (${share}) go to ${hoursCauseSentence(worst.cause)}, the largest part that a change of plan could avoid.`
}

/** The ledger as a table whose numbers align on the decimal point; lines that would read 0 are left out. */
export const ledgerTable = (ledger: HoursLedger): readonly string[] => {
  const decimals = decimalsFor(ledger.total / 3600)
  const rows = [
    ...ledger.lines
      .filter((line) => Math.abs(line.time / 3600) >= 0.5 * 10 ** -decimals)
      .map((line) => [hoursCauseSentence(line.cause), line.time / 3600] as const),
    ['in all', ledger.total / 3600] as const,
  ].map(([words, value]) => [words, withDecimals(value, decimals)] as const)
  const wide = Math.max(...rows.map(([words]) => words.length))
  const long = Math.max(...rows.map(([, number]) => number.length))
  return rows.map(([words, number]) => `  ${words.padEnd(wide)}  ${number.padStart(long)} h`)
}

const decimalsFor = (largest: number): number => {
  if (!(largest > 0) || largest >= 1000) return 0
  return largest >= 100 ? 1 : Math.min(20, Math.max(2, 2 - Math.floor(Math.log10(largest))))
}

const withDecimals = (value: number, decimals: number): string => {
  if (Math.abs(value) >= 1e6) return formatNumber(value)
  const text = value.toFixed(decimals)
  return Number(text) === 0 ? (0).toFixed(decimals) : text
}
