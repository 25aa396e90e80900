import { EXIT } from './exitCode.js'

/** Ctrl-C: the first asks the study to stop and keep what it has, the second leaves at once. */
export class Interrupt {
  private asked = false

  private armed = false

  constructor(private readonly onFirst: () => void) {}

  /** Until then Ctrl-C ends the program, as usual. */
  arm(): void {
    if (this.armed) return
    this.armed = true
    for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => this.receive())
  }

  readonly stopped = (): boolean => this.asked

  private receive(): void {
    if (this.asked) process.exit(EXIT.interrupted)
    this.asked = true
    this.onFirst()
  }
}
