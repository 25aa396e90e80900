/**
 * The second gate: of the parser's syntax tree only numbers, names, parentheses, five operators and a few functions are
 * turned into a closure of our own; nothing that the parser's library could evaluate is ever evaluated by it.
 */
import type { ConstantNode, FunctionNode, MathNode, OperatorNode, ParenthesisNode, SymbolNode } from 'mathjs'
import { CONSTANTS, FUNCTIONS } from './formulaVocabulary.js'

type AllowedNode = ConstantNode | ParenthesisNode | SymbolNode | OperatorNode | FunctionNode

/** Value of a formula for values of its variables. */
export type Evaluate = (values: Readonly<Record<string, number>>) => number

const OPERATORS: ReadonlyMap<string, (a: number, b: number) => number> = new Map([
  ['add', (a, b) => a + b],
  ['subtract', (a, b) => a - b],
  ['multiply', (a, b) => a * b],
  ['divide', (a, b) => a / b],
  ['pow', (a, b) => a ** b],
])

/** Compiles a tree whose symbols are constants or keys of `variables`, which leads to the users' names; throws on all else. */
export function closureOf(tree: MathNode, variables: ReadonlyMap<string, string>): Evaluate {
  // The library's base type is not a union: the cast lets the switch below narrow it, its default refuses the rest.
  const node = tree as AllowedNode
  switch (node.type) {
    case 'ConstantNode':
      return constant(node.value)
    case 'ParenthesisNode':
      return closureOf(node.content, variables)
    case 'SymbolNode':
      return symbol(node.name, variables)
    case 'OperatorNode':
      return operator(node, variables)
    case 'FunctionNode':
      return call(node, variables)
    default:
      throw new Error(`${tree.type} is not allowed in a formula`)
  }
}

function constant(value: unknown): Evaluate {
  if (typeof value !== 'number') throw new Error(`${String(value)} is not a number`)
  return () => value
}

function symbol(name: string, variables: ReadonlyMap<string, string>): Evaluate {
  const variable = variables.get(name)
  if (variable !== undefined) return (values) => values[variable]
  const value = CONSTANTS.get(name)
  if (value === undefined) throw new Error(`"${name}" is not a known name`)
  return () => value
}

function operator(node: OperatorNode, variables: ReadonlyMap<string, string>): Evaluate {
  const [left, right] = node.args.map((arg) => closureOf(arg, variables))
  if (node.fn === 'unaryMinus') return (values) => -left(values)
  if (node.fn === 'unaryPlus') return left
  const apply = OPERATORS.get(node.fn)
  if (apply === undefined || node.args.length !== 2) throw new Error(`the operator "${node.op}" is not allowed`)
  return (values) => apply(left(values), right(values))
}

function call(node: FunctionNode, variables: ReadonlyMap<string, string>): Evaluate {
  const name = node.fn.name
  const known = FUNCTIONS.get(name)
  if (known === undefined) throw new Error(`the function "${name}" is not allowed`)
  const { apply } = known
  const args = node.args.map((arg) => closureOf(arg, variables))
  return (values) => apply(...args.map((arg) => arg(values)))
}
