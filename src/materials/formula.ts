/**
 * Expressions in stack files and links, such as `1.5 + 4500 / wavelength_nm^2`. mathjs parses them; of its syntax tree only
 * numbers, the variables offered, + - * / ^ and a few functions are let through, and a closure of our own evaluates what is
 * left: no import, no assignment, no object or array, no function definition, no unit.
 */

/** Longest expression read, characters, and deepest nesting of brackets: far beyond any dispersion formula. */
export const FORMULA_LIMITS = { length: 500, depth: 40 } as const

export interface FormulaFault {
  readonly message: string
  /** 1-based column in the expression, where known. */
  readonly column?: number
  readonly allowed: string
}

type Evaluate = (values: Readonly<Record<string, number>>) => number

const FUNCTIONS: Readonly<Record<string, (...args: number[]) => number>> = {
  sqrt: Math.sqrt,
  exp: Math.exp,
  log: Math.log,
  log10: Math.log10,
  sin: Math.sin,
  cos: Math.cos,
  tan: Math.tan,
  atan: Math.atan,
  abs: Math.abs,
  pow: Math.pow,
  min: Math.min,
  max: Math.max,
}

const ARGUMENTS: Readonly<Record<string, readonly [number, number]>> = { pow: [2, 2], min: [1, 8], max: [1, 8] }

const CONSTANTS: Readonly<Record<string, number>> = { pi: Math.PI, e: Math.E }

const OPERATORS: Readonly<Record<string, (a: number, b: number) => number>> = {
  add: (a, b) => a + b,
  subtract: (a, b) => a - b,
  multiply: (a, b) => a * b,
  divide: (a, b) => a / b,
  pow: (a, b) => a ** b,
}

/** Variables of a formula for a refractive index. */
export const INDEX_VARIABLES = ['wavelength_nm', 'wavelength_um'] as const

const prepared = new Map<string, Evaluate>()

/** Compiles an expression so that `formulaAt` can be used; the fault says what is not let through. Names may hold dots. */
export async function prepareFormula(
  text: string,
  variables: readonly string[] = INDEX_VARIABLES,
): Promise<FormulaFault | undefined> {
  if (prepared.has(keyOf(text, variables))) return undefined
  const allowed = `numbers, ${variables.join(', ')}, pi, e, + - * / ^ and ${Object.keys(FUNCTIONS).join(', ')}`
  const tooMuch = exceedsLimits(text)
  if (tooMuch !== undefined) return { message: tooMuch, allowed }
  const { parse } = await import('mathjs/number')
  try {
    const { plain, names } = hideDots(text, variables)
    prepared.set(keyOf(text, variables), compile(parse(plain) as unknown as Node, names))
    return undefined
  } catch (error) {
    return { message: faultMessage(error), ...columnOf(error), allowed }
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

function exceedsLimits(text: string): string | undefined {
  if (text.length > FORMULA_LIMITS.length) {
    return `the formula has ${text.length} characters; ${FORMULA_LIMITS.length} are allowed`
  }
  let depth = 0
  for (const character of text) {
    if ('([{'.includes(character)) depth++
    if (')]}'.includes(character)) depth--
    if (depth > FORMULA_LIMITS.depth) return `the formula nests brackets deeper than ${FORMULA_LIMITS.depth}`
  }
  return undefined
}

/** Paths such as `half.slow_axis` are single names to us, but property access to the parser. */
function hideDots(text: string, variables: readonly string[]): { plain: string; names: ReadonlyMap<string, string> } {
  const names = new Map(variables.filter((name) => !name.includes('.')).map((name) => [name, name]))
  const plain = text.replace(/(?<![\w.])[A-Za-z_]\w*(?:\.\w+)+/g, (path) => {
    const index = variables.indexOf(path)
    if (index < 0) throw new NotAllowed(`"${path}" is not a known name`)
    const alias = `path_${index}`.padEnd(path.length, '_')
    names.set(alias, path)
    return alias
  })
  return { plain, names }
}

/** The part of mathjs's syntax tree that is let through. */
interface Node {
  readonly type: string
  readonly value?: unknown
  readonly name?: string
  readonly fn?: unknown
  readonly args?: readonly Node[]
  readonly content?: Node
}

class NotAllowed extends Error {}

function compile(node: Node, names: ReadonlyMap<string, string>): Evaluate {
  switch (node.type) {
    case 'ConstantNode':
      return constant(node.value)
    case 'ParenthesisNode':
      return compile(node.content as Node, names)
    case 'SymbolNode':
      return symbol(node.name as string, names)
    case 'OperatorNode':
      return operator(node, names)
    case 'FunctionNode':
      return call(node, names)
    default:
      throw new NotAllowed(`${describeNode(node.type)} is not allowed in a formula`)
  }
}

function constant(value: unknown): Evaluate {
  if (typeof value !== 'number') throw new NotAllowed(`${JSON.stringify(value)} is not a number`)
  return () => value
}

function symbol(name: string, names: ReadonlyMap<string, string>): Evaluate {
  const variable = names.get(name)
  if (variable !== undefined) return (values) => values[variable]
  if (!Object.hasOwn(CONSTANTS, name)) throw new NotAllowed(`"${name}" is not a known name`)
  const value = CONSTANTS[name]
  return () => value
}

function operator(node: Node, names: ReadonlyMap<string, string>): Evaluate {
  const args = (node.args ?? []).map((arg) => compile(arg, names))
  if (node.fn === 'unaryMinus') return (values) => -args[0](values)
  if (node.fn === 'unaryPlus') return args[0]
  const apply = Object.hasOwn(OPERATORS, String(node.fn)) ? OPERATORS[String(node.fn)] : undefined
  if (apply === undefined) throw new NotAllowed(`the operator "${String(node.fn)}" is not allowed in a formula`)
  // The parser joins a + b + c into one node of three.
  return (values) => args.slice(1).reduce((sum, arg) => apply(sum, arg(values)), args[0](values))
}

function call(node: Node, names: ReadonlyMap<string, string>): Evaluate {
  const fn = node.fn as Node
  const name = fn.type === 'SymbolNode' ? String(fn.name) : ''
  if (!Object.hasOwn(FUNCTIONS, name)) throw new NotAllowed(`the function "${name}" is not allowed in a formula`)
  const args = (node.args ?? []).map((arg) => compile(arg, names))
  const [least, most] = ARGUMENTS[name] ?? [1, 1]
  if (args.length < least || args.length > most) {
    throw new NotAllowed(
      `the function "${name}" takes ${least === most ? least : `${least} to ${most}`} arguments, not ${args.length}`,
    )
  }
  const apply = FUNCTIONS[name]
  return (values) => apply(...args.map((arg) => arg(values)))
}

function describeNode(type: string): string {
  return type
    .replace(/Node$/, '')
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase()
}

function faultMessage(error: unknown): string {
  if (error instanceof NotAllowed) return error.message
  return error instanceof Error ? `cannot be read as a formula: ${error.message}` : 'cannot be read as a formula'
}

function columnOf(error: unknown): { column?: number } {
  const at = typeof error === 'object' && error !== null && 'char' in error ? Number(error.char) : Number.NaN
  return Number.isFinite(at) ? { column: at } : {}
}
