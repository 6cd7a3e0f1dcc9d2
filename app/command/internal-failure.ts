/** What to say when the program itself is at fault: one sentence, no stack. */
export const sentenceFor = (error: unknown): string => {
  const what = error instanceof Error ? `${error.name}: ${error.message}` : String(error)
  return `internal failure, please report it with the scenario: ${what}`
}
