/** Looks into a file of which parts may not have been read: nothing found is undefined, never an exception. */

/** A plain object's keys, or undefined for anything else. */
export const fieldsOf = (value: unknown): Readonly<Record<string, unknown>> | undefined =>
  typeof value === 'object' && value !== null && !Array.isArray(value)
    ? (value as Readonly<Record<string, unknown>>)
    : undefined

/** What lies at a path, if anything. */
export const part = (value: unknown, ...keys: readonly string[]): unknown => {
  let at = value
  for (const key of keys) {
    const fields = fieldsOf(at)
    if (fields === undefined || !Object.hasOwn(fields, key)) return undefined
    at = fields[key]
  }
  return at
}

/** The phases of a programme, or none. */
export const phasesOf = (file: unknown): readonly unknown[] => {
  const phases = part(file, 'programme', 'phases')
  return Array.isArray(phases) ? phases : []
}
