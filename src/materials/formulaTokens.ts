/**
 * The first of two gates before a formula is evaluated: every character must belong to a number, a known name or one of
 * `+ - * / ^ ( ) ,` so that the general parser behind it never sees a string, an index, an assignment or a name of its own.
 */
import { FormulaError } from './formulaError.js'
import { CONSTANTS, FORMULA_LIMITS, FUNCTIONS } from './formulaVocabulary.js'

export interface FormulaToken {
  readonly kind: 'number' | 'variable' | 'constant' | 'function' | 'sign'
  readonly text: string
  /** 1-based, in the user's text. */
  readonly column: number
}

const NUMBER = /(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?/y
const NAME = /[\p{L}_][\p{L}\w]*(?:\.[\p{L}\w]+)*/uy
const SIGN = /[-+*/^(),]/y

/** What is meant by signs that look right and are not. */
const MEANT: ReadonlyMap<string, string> = new Map([
  ['×', '*'],
  ['·', '*'],
  ['÷', '/'],
  ['−', '-'],
  ['–', '-'],
  ['²', '^2'],
  ['³', '^3'],
  ['⁴', '^4'],
  ['[', '('],
  [']', ')'],
])

/** Splits a formula into tokens; throws `FormulaError` at the first thing that is not let through. */
export function readTokens(text: string, variables: readonly string[]): FormulaToken[] {
  const { length } = FORMULA_LIMITS
  if (text.length > length) {
    throw new FormulaError(`the formula has ${text.length} characters; at most ${length} are read`, length + 1)
  }
  // The longest first, so that `film.nz` is not found in `film.nz_b`.
  const byLength = [...variables].sort((a, b) => b.length - a.length)
  const tokens: FormulaToken[] = []
  for (let at = skipBlanks(text, 0); at < text.length; ) {
    const token = tokenAt(text, at, byLength)
    tokens.push(token)
    at = skipBlanks(text, at + token.text.length)
  }
  if (tokens.length === 0) throw new FormulaError('the formula is empty', 1)
  return tokens
}

function skipBlanks(text: string, from: number): number {
  let at = from
  while (' \t\r\n'.includes(text.charAt(at)) && at < text.length) at++
  return at
}

function tokenAt(text: string, at: number, variables: readonly string[]): FormulaToken {
  const column = at + 1
  const variable = variables.find(
    (name) => text.startsWith(name, at) && !/[\p{L}\w.]/u.test(text.charAt(at + name.length)),
  )
  if (variable !== undefined) return { kind: 'variable', text: variable, column }
  const number = match(NUMBER, text, at)
  if (number !== undefined) {
    if (!Number.isFinite(Number(number))) throw new FormulaError(`the number ${number} is too large`, column)
    return { kind: 'number', text: number, column }
  }
  const name = match(NAME, text, at)
  if (name !== undefined) return { kind: kindOfName(name, column), text: name, column }
  const sign = match(SIGN, text, at)
  if (sign === undefined) throw unknownSign(String.fromCodePoint(text.codePointAt(at) as number), column)
  return { kind: 'sign', text: sign, column }
}

function match(pattern: RegExp, text: string, at: number): string | undefined {
  pattern.lastIndex = at
  return pattern.exec(text)?.[0]
}

function kindOfName(name: string, column: number): 'constant' | 'function' {
  if (CONSTANTS.has(name)) return 'constant'
  if (FUNCTIONS.has(name)) return 'function'
  throw new FormulaError(`${JSON.stringify(name)} is not a known name`, column)
}

function unknownSign(sign: string, column: number): FormulaError {
  const meant = MEANT.get(sign)
  const hint = meant === undefined ? '' : `; write ${meant}`
  return new FormulaError(`${JSON.stringify(sign)} cannot stand in a formula${hint}`, column)
}
