/** One thing wrong with an input, as data; its sentence is made in `report/problemText`. */
export interface Problem {
  readonly severity: 'error' | 'warning'
  /** What kind of fault, e.g. `unknown_key`, `wrong_type`, `out_of_range`, `unknown_id`, `yaml`. */
  readonly code: string
  /** Path in the file, e.g. `layers.2.retardance` or `half.slow_axis`; empty for the whole file. */
  readonly path: string
  /** File as the user named it, or `--set …` for an option. */
  readonly file: string
  /** 1-based place of the offending text in `file`; absent for options. */
  readonly range?: {
    readonly line: number
    readonly column: number
    readonly endLine: number
    readonly endColumn: number
  }
  /** What is wrong, one plain sentence without the place. */
  readonly message: string
  readonly received?: string
  readonly allowed?: string
  /** Nearest known name. */
  readonly suggestion?: string
  /** What to do next. */
  readonly next?: string
}

/** Thrown at the door when an input cannot be used; the command prints the problems and exits with 2. */
export class InputError extends Error {
  constructor(
    readonly problems: readonly Problem[],
    /** Texts of the files the problems point into, by file name. */
    readonly texts: ReadonlyMap<string, string> = new Map(),
  ) {
    super(problems.map((p) => p.message).join('; '))
    this.name = 'InputError'
  }
}
