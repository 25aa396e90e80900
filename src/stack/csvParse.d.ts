interface CsvRow {
  readonly record: readonly string[]
  /** `lines` counts from 1. */
  readonly info: { readonly lines: number }
}

/** Throws an error with a `lines` property where the quoting is broken. */
export function parse(
  text: string,
  options: {
    readonly bom: boolean
    readonly delimiter: string
    readonly comment: string
    readonly comment_no_infix: boolean
    readonly trim: boolean
    readonly skip_empty_lines: boolean
    readonly skip_records_with_empty_values: boolean
    readonly relax_column_count: boolean
    readonly info: true
    readonly to: number
  },
): CsvRow[]
