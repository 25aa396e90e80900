/** What a study may ask of the outside while it runs; all optional, so that a study is a pure function without them. */
export interface Hooks {
  /** Work done, a fraction in [0, 1], and a word about it (e.g. the best so far). */
  readonly progress?: (done: number, note?: string) => void
  /** Polled between steps; true asks the study to stop and return what it has, marked `interrupted`. */
  readonly stopped?: () => boolean
}
