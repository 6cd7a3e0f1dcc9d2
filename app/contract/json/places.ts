/** Where in a text things stand: lines and columns, and the offset of each path. */
import { type PathStep, pathText, wholeFile } from '../fault.ts'
import { walkJson } from './walk.ts'

/** "line 3, column 14", both from 1. */
export const lineAndColumn = (text: string, at: number): string => {
  let line = 1
  let start = 0
  for (let end = text.indexOf('\n'); end !== -1 && end < at; end = text.indexOf('\n', start)) {
    line++
    start = end + 1
  }
  return `line ${line}, column ${Array.from(text.slice(start, Math.min(at, start + 1_000_000))).length + 1}`
}

/** The offset of each path asked for; a path that is not in the text has that of its nearest holder. */
export const offsetsOf = (text: string, paths: readonly (readonly PathStep[])[]): readonly number[] => {
  const wanted = new Map<string, number>([[wholeFile, 0]])
  for (const path of paths) for (let n = 1; n <= path.length; n++) wanted.set(pathText(path.slice(0, n)), -1)
  const lastSteps = new Set(paths.flat())
  walkJson(text, (path, at) => {
    const last = path.at(-1)
    if (last === undefined || !lastSteps.has(last)) return
    const written = pathText(path)
    if (wanted.get(written) === -1) wanted.set(written, at)
  })
  return paths.map((path) => {
    for (let n = path.length; n > 0; n--) {
      const at = wanted.get(pathText(path.slice(0, n))) ?? -1
      if (at >= 0) return at
    }
    return 0
  })
}
