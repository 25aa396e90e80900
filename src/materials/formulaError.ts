/** What is wrong with a formula, and the 1-based column where it was found. */
export class FormulaError extends Error {
  constructor(
    message: string,
    readonly column: number,
  ) {
    super(message)
  }
}
