import { Presets, SingleBar } from 'cli-progress'

export interface Progress {
  /** @param done fraction in [0, 1] @param note a word about it, e.g. the best so far */
  readonly update: (done: number, note?: string) => void
  readonly end: () => void
}

/** A bar on a terminal, a line now and then elsewhere. */
export function startProgress(label: string, stream: NodeJS.WriteStream): Progress {
  return stream.isTTY ? startBar(label, stream) : startLines(label, stream)
}

const PARTS = 1000

function startBar(label: string, stream: NodeJS.WriteStream): Progress {
  const timeLeft = createTimeLeft()
  const format = `${label} {bar} {percentage} %  {left}  {note}`
  const options = { format, stream, hideCursor: true, clearOnComplete: true, gracefulExit: false, barsize: 24, fps: 8 }
  const bar = new SingleBar(options, Presets.shades_classic)
  bar.start(PARTS, 0, { left: '', note: '' })
  // However the program ends, the terminal gets its cursor back.
  const stop = (): void => bar.stop()
  process.once('exit', stop)
  return {
    update: (done, note = '') => bar.update(Math.round(done * PARTS), { left: timeLeft(done), note }),
    end: () => {
      process.off('exit', stop)
      stop()
    },
  }
}

const FIRST_LINE_MS = 2000
const NEXT_LINE_MS = 5000

function startLines(label: string, stream: NodeJS.WriteStream): Progress {
  const timeLeft = createTimeLeft()
  let due = Date.now() + FIRST_LINE_MS
  return {
    update: (done, note) => {
      if (Date.now() < due) return
      due = Date.now() + NEXT_LINE_MS
      const parts = [`${Math.floor(100 * done)} %`, timeLeft(done), note].filter(Boolean)
      stream.write(`${label}: ${parts.join(', ')}\n`)
    },
    end: () => undefined,
  }
}

/** Time left in words, from the time taken so far. */
function createTimeLeft(): (done: number) => string {
  const begun = Date.now()
  return (done) => {
    const takenMs = Date.now() - begun
    if (done <= 0 || done >= 1 || takenMs < 1000) return ''
    return `${durationText((takenMs * (1 - done)) / done / 1000)} left`
  }
}

/** `8 s`, `3 min 20 s`, `2 h 5 min`. */
export function durationText(seconds: number): string {
  const whole = Math.max(1, Math.round(seconds))
  if (whole < 60) return `${whole} s`
  if (whole < 3600) return `${Math.floor(whole / 60)} min ${whole % 60} s`
  return `${Math.floor(whole / 3600)} h ${Math.floor((whole % 3600) / 60)} min`
}
