/**
 * Expressions in stack files and links, such as `1.5 + 4500 / wavelength_nm^2` or `half.slow_axis + 45`: + - * / ^ (which
 * binds to the right and before a sign: -2^2 = -4), numbers, a few functions and the variables offered, nothing else.
 * `formulaTokens` lets through only known names and signs, mathjs parses, `formulaClosure` evaluates.
 */
import { closureOf, type Evaluate } from './formulaClosure.js'
import { FormulaError } from './formulaError.js'
import { checkNeighbors, checkParentheses } from './formulaOrder.js'
import { type FormulaToken, readTokens } from './formulaTokens.js'
import { allowedIn } from './formulaVocabulary.js'

export interface FormulaFault {
  readonly message: string
  /** 1-based column in the expression. */
  readonly column: number
  readonly allowed: string
}

/** Variables of a formula for a refractive index. */
const INDEX_VARIABLES = ['wavelength_nm', 'wavelength_um'] as const

/** Compiled formulas of this thread; a worker prepares its own. */
const prepared = new Map<string, Evaluate>()

/**
 * Compiles an expression so that `formulaAt` can be used, or tells what is wrong with it. A variable's name may be a
 * parameter path with dots. The parser is loaded at the first formula.
 */
export async function prepareFormula(
  text: string,
  variables: readonly string[] = INDEX_VARIABLES,
): Promise<FormulaFault | undefined> {
  try {
    const tokens = readTokens(text, variables)
    checkNeighbors(tokens)
    checkParentheses(tokens)
    const key = keyOf(text, variables)
    if (!prepared.has(key)) prepared.set(key, await compile(tokens, variables))
    return undefined
  } catch (error) {
    if (!(error instanceof FormulaError)) throw error
    return { message: error.message, column: error.column, allowed: allowedIn(variables) }
  }
}

/** Value of a prepared expression; throws where it was not prepared. */
export function formulaAt(
  text: string,
  values: Readonly<Record<string, number>>,
  variables: readonly string[] = INDEX_VARIABLES,
): number {
  const evaluate = prepared.get(keyOf(text, variables))
  if (evaluate === undefined) throw new Error(`formula not prepared: ${text}`)
  return evaluate(values)
}

function keyOf(text: string, variables: readonly string[]): string {
  return `${variables.join(' ')}\n${text}`
}

/** Variables go to the parser as v0, v1, …: a path with dots would be property access to it. */
async function compile(tokens: readonly FormulaToken[], variables: readonly string[]): Promise<Evaluate> {
  const words = tokens.map(({ kind, text }) => (kind === 'variable' ? `v${variables.indexOf(text)}` : text))
  const { parse } = await import('mathjs/number')
  try {
    return closureOf(parse(words.join(' ')), new Map(variables.map((name, i) => [`v${i}`, name])))
  } catch (error) {
    throw located(error, tokens, words)
  }
}

/** The parser tells a 1-based place in the words joined by blanks; the user wants it in the text. */
function located(error: unknown, tokens: readonly FormulaToken[], words: readonly string[]): FormulaError {
  const { message } = error as Error
  const last = tokens[tokens.length - 1]
  if (!(error instanceof SyntaxError && 'char' in error)) return new FormulaError(message, tokens[0].column)
  let end = 0
  const at = words.findIndex((word) => {
    end += word.length + 1
    return end > Number(error.char)
  })
  const column = at < 0 ? last.column + last.text.length : tokens[at].column
  const reason = message.replace(/ \(char \d+\)$/, '')
  return new FormulaError(`cannot be read as a formula: ${reason[0].toLowerCase()}${reason.slice(1)}`, column)
}
