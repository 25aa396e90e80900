import type { ExitCode } from './exitCode.js'
import type { Interrupt } from './interrupt.js'
import type { Terminal } from './terminal.js'

/** What every verb is called with. */
export interface Context<Options = object> {
  /** FILE as the user wrote it; empty for verbs that take none. */
  readonly file: string
  readonly options: SharedOptions & Options
  readonly terminal: Terminal
  readonly interrupt: Interrupt
}

export interface SharedOptions {
  /** `path=value`, in the order given. */
  readonly set: readonly string[]
  readonly json: boolean
  /** Folder for files. */
  readonly out?: string
  readonly workers: number
  readonly quiet: boolean
}

export interface VerbModule<Options> {
  readonly run: (context: Context<Options>) => Promise<ExitCode>
}
