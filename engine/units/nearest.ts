/**
 * The known word nearest to one that was typed, if any is near enough to be what was meant.
 *
 * Shapes   a word and the known ones; one of the known ones or undefined.
 * Source   edit distance with neighbours swapped counting once (optimal string alignment).
 */
export const nearest = (typed: string, known: readonly string[]): string | undefined => {
  if (typed.length > 60) return undefined
  const lower = typed.toLowerCase()
  let best: string | undefined
  let least = Number.POSITIVE_INFINITY
  for (const candidate of known) {
    const far = candidate.toLowerCase() === lower ? 0.5 : distance(lower, candidate.toLowerCase())
    if (far < least) [best, least] = [candidate, far]
  }
  return best !== undefined && least <= Math.max(1, Math.floor(Math.max(best.length, typed.length) / 3))
    ? best
    : undefined
}

const distance = (a: string, b: string): number => {
  let before: number[] = []
  let last = Array.from({ length: b.length + 1 }, (_, j) => j)
  for (let i = 1; i <= a.length; i++) {
    const row = [i]
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1]
      let cost = Math.min((last[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1, (last[j - 1] ?? 0) + (same ? 0 : 1))
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) {
        cost = Math.min(cost, (before[j - 2] ?? 0) + 1)
      }
      row.push(cost)
    }
    before = last
    last = row
  }
  return last[b.length] ?? 0
}
