import { FormulaError } from './formulaError.js'
import type { FormulaToken } from './formulaTokens.js'
import { FORMULA_LIMITS, FUNCTIONS } from './formulaVocabulary.js'

/** Throws where two values stand side by side: the parser would multiply them, and `1/2 a` can be read in two ways. */
export function checkNeighbors(tokens: readonly FormulaToken[]): void {
  tokens.forEach((token, i) => {
    const next = tokens.at(i + 1)
    if (token.kind === 'function') {
      if (next?.text !== '(') throw new FormulaError(`the function ${token.text} needs (…) behind it`, token.column)
    } else if (next !== undefined && endsValue(token) && beginsValue(next)) {
      throw new FormulaError(`an operator is missing between "${token.text}" and "${next.text}"`, next.column)
    }
  })
}

function endsValue({ kind, text }: FormulaToken): boolean {
  return kind !== 'sign' || text === ')'
}

function beginsValue({ kind, text }: FormulaToken): boolean {
  return kind !== 'sign' || text === '('
}

interface Parenthesis {
  readonly column: number
  /** The function whose arguments it holds. */
  readonly called: FormulaToken | undefined
  arguments: number
}

/** Throws where parentheses do not match, nest too deep, or hold the wrong number of arguments. */
export function checkParentheses(tokens: readonly FormulaToken[]): void {
  const open: Parenthesis[] = []
  tokens.forEach(({ text, column }, i) => {
    if (text === '(') {
      const before = tokens[i - 1]
      const called = before?.kind === 'function' ? before : undefined
      open.push({ column, called, arguments: tokens[i + 1]?.text === ')' ? 0 : 1 })
      if (open.length > FORMULA_LIMITS.depth) {
        throw new FormulaError(`parentheses are nested deeper than ${FORMULA_LIMITS.depth}`, column)
      }
    }
    if (text === ',') countArgument(open.at(-1), column)
    if (text === ')') close(open.pop(), column)
  })
  const unclosed = open.at(-1)
  if (unclosed !== undefined) throw new FormulaError('"(" is not closed', unclosed.column)
}

function countArgument(within: Parenthesis | undefined, column: number): void {
  if (within?.called === undefined) {
    throw new FormulaError('a comma stands only between the arguments of a function; decimals are written 1.5', column)
  }
  within.arguments++
}

function close(opened: Parenthesis | undefined, column: number): void {
  if (opened === undefined) throw new FormulaError('")" closes nothing', column)
  const { called } = opened
  const known = called && FUNCTIONS.get(called.text)
  if (called === undefined || known === undefined) return
  const { least, most } = known
  if (opened.arguments >= least && opened.arguments <= most) return
  const wanted = `${least === most ? least : `${least} to ${most}`} ${most === 1 ? 'argument' : 'arguments'}`
  throw new FormulaError(`the function ${called.text} takes ${wanted}, not ${opened.arguments}`, called.column)
}
