/** What the program's exit code says. */
export const exitCode = {
  /** There is an answer; "cannot be reached" is one. */
  answered: 0,
  /** The program, not the input, is at fault. */
  internal: 1,
  /** The input is wrong; every fault stands on standard error. */
  wrongInput: 2,
} as const
