/** Where a report comes from, passed in by whoever has a clock and a disk. */
export interface ReportOrigin {
  /** The stack file, without its folder. */
  readonly file: string
  /** Of the bytes of the stack file, hexadecimal. */
  readonly sha256: string
  /** `path=value` set for this run. */
  readonly sets: readonly string[]
  readonly version: string
  /** `2026-03-14`. */
  readonly date: string
}
