/** Longest expression read, characters, and deepest nesting of parentheses: far beyond any dispersion formula. */
export const FORMULA_LIMITS = { length: 500, depth: 40 } as const

/** A function of a formula, and how many arguments it takes. */
export interface FormulaFunction {
  readonly apply: (...args: number[]) => number
  readonly least: number
  readonly most: number
}

const one = (apply: (x: number) => number): FormulaFunction => ({ apply, least: 1, most: 1 })

export const FUNCTIONS: ReadonlyMap<string, FormulaFunction> = new Map([
  ['sqrt', one(Math.sqrt)],
  ['exp', one(Math.exp)],
  ['log', one(Math.log)],
  ['log10', one(Math.log10)],
  ['sin', one(Math.sin)],
  ['cos', one(Math.cos)],
  ['tan', one(Math.tan)],
  ['atan', one(Math.atan)],
  ['abs', one(Math.abs)],
  ['pow', { apply: Math.pow, least: 2, most: 2 }],
  ['min', { apply: Math.min, least: 1, most: 8 }],
  ['max', { apply: Math.max, least: 1, most: 8 }],
])

export const CONSTANTS: ReadonlyMap<string, number> = new Map([
  ['pi', Math.PI],
  ['e', Math.E],
])

/** What a formula over these variables may hold, for the user. */
export function allowedIn(variables: readonly string[]): string {
  const names = [...variables, ...CONSTANTS.keys()].join(', ')
  return `numbers, ${names}, + - * / ^, parentheses, and the functions ${[...FUNCTIONS.keys()].join(', ')}`
}
