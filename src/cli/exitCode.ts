/** What the command tells the shell. */
export const EXIT = {
  done: 0,
  /** A fault of the program. */
  fault: 1,
  /** The input is wrong, or the output has no place to go; nothing was written. */
  input: 2,
  /** Done, but a limit of the file is not met. */
  limitMissed: 3,
  /** Stopped by the user; the best so far was kept. */
  interrupted: 130,
} as const

export type ExitCode = (typeof EXIT)[keyof typeof EXIT]
