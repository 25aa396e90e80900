import colors from 'picocolors'
import { type Paint, PLAIN } from '../report/paint.js'
import { type Progress, startProgress } from './progress.js'

/** Where the command speaks: results to stdout, all else to stderr. */
export interface Terminal {
  /** Colors where stdout is a terminal that wants them. */
  readonly paint: Paint
  /** The same for stderr. */
  readonly notePaint: Paint
  /** A result. */
  readonly print: (text: string) => void
  /** What the user may want to know; silent with `--quiet`. */
  readonly note: (text: string) => void
  /** What the user has to know. */
  readonly warn: (text: string) => void
  readonly progress: (label: string) => Progress
}

const SILENT: Progress = { update: () => undefined, end: () => undefined }

export function createTerminal(quiet: boolean): Terminal {
  const warn = (text: string): void => {
    process.stderr.write(text)
  }
  return {
    paint: paintFor(process.stdout),
    notePaint: paintFor(process.stderr),
    print: (text) => {
      process.stdout.write(text)
    },
    note: quiet ? () => undefined : warn,
    warn,
    progress: quiet ? () => SILENT : (label) => startProgress(label, process.stderr),
  }
}

/** A reader who has seen enough (`| head`) closes the pipe: no fault, but no reason to go on either. */
export function leaveWhenUnread(): void {
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error
    process.exit()
  })
  process.stderr.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error
  })
}

/** `NO_COLOR` and `FORCE_COLOR` rule; otherwise a terminal gets colors, a file or pipe none. */
function paintFor(stream: NodeJS.WriteStream): Paint {
  const { NO_COLOR, FORCE_COLOR, TERM } = process.env
  const wanted = NO_COLOR ? false : FORCE_COLOR ? FORCE_COLOR !== '0' : stream.isTTY && TERM !== 'dumb'
  if (!wanted) return PLAIN
  const { bold, dim, green, red, yellow } = colors.createColors(true)
  return { strong: bold, faint: dim, good: green, bad: red, caution: yellow }
}
