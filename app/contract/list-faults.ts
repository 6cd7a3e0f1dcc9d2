/** Faults in the order of the file, as many as a person can use. */
import { type Fault, type PathStep, pathText, wholeFile } from './fault.ts'
import { offsetsOf } from './json/places.ts'

export interface PlacedFault {
  readonly path: readonly PathStep[]
  readonly message: string
}

/** The most faults listed one by one. */
export const mostFaults = 50

/** Sorted by place, without repeats; those beyond the limit, and those already left out, counted in a last line. */
export const listFaults = (text: string, faults: readonly PlacedFault[], unlisted = 0): readonly Fault[] => {
  if (faults.length === 0) return []
  const offsets = offsetsOf(
    text,
    faults.map((fault) => fault.path),
  )
  const order = faults.map((_, n) => n).sort((a, b) => (offsets[a] ?? 0) - (offsets[b] ?? 0) || a - b)
  const lines = new Map<string, Fault>()
  for (const n of order) {
    const fault = faults[n]
    if (fault === undefined) continue
    const path = pathText(fault.path)
    lines.set(`${path}: ${fault.message}`, { path, message: fault.message })
  }
  const all = [...lines.values()]
  const listed = all.slice(0, mostFaults)
  const more = all.length - listed.length + unlisted
  return more === 0 ? listed : [...listed, { path: wholeFile, message: `and ${more} more` }]
}
