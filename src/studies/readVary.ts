/** `--vary path=from:to:step[,other=expression…]`: axes of a sweep and the parameters that follow them, from text. */
import { formulaAt, prepareFormula } from '../materials/formula.js'
import type { Fault } from '../stack/fault.js'
import { findParameter } from '../stack/parameters.js'
import { InputError, type Problem } from '../stack/problem.js'
import { pathFault } from '../stack/sense/paths.js'
import type { Stack } from '../stack/stack.js'
import { formatQuantity, fromPlain, isFault, parseQuantity, type QuantityKind, toPlain } from '../units/quantity.js'
import type { SweepAxis, SweepLink } from './sweep.js'

export interface VaryReading {
  readonly axes: readonly SweepAxis[]
  readonly links: readonly SweepLink[]
}

/** Points of one sweep. */
const MOST_POINTS = 1_000_000
const FORM = 'path=from:to:step, e.g. quarter.slow_axis=40deg:50deg:1deg'

/** @throws InputError with every problem found */
export async function readVary(stack: Stack, texts: readonly string[]): Promise<VaryReading> {
  const problems: Problem[] = []
  const axes: SweepAxis[] = []
  const linkTexts: { readonly option: string; readonly assignment: string }[] = []
  const tell = (option: string, fault: Fault) => problems.push(optionProblem(`--vary ${option}`, fault))
  for (const option of texts) {
    const [first, ...rest] = splitAtCommas(option)
    const axis = readAxis(stack, first)
    if ('code' in axis) tell(option, axis)
    else axes.push(axis)
    linkTexts.push(...rest.map((assignment) => ({ option, assignment })))
  }
  const whole = problems.length === 0 ? gridFault(axes, texts.length) : undefined
  if (whole !== undefined) tell(texts.join(' --vary '), whole)
  const links: SweepLink[] = []
  for (const { option, assignment } of problems.length === 0 ? linkTexts : []) {
    const link = await readLink(stack, assignment, axes)
    if ('code' in link) tell(option, link)
    else links.push(link)
  }
  const repeated = repeatedPath([...axes, ...links])
  if (repeated !== undefined) tell(texts.join(' --vary '), twiceFault(repeated))
  if (problems.length > 0) throw new InputError(problems)
  return { axes, links }
}

export function optionProblem(option: string, fault: Fault): Problem {
  return { severity: 'error', file: option, path: '', ...fault }
}

/** Commas between parentheses belong to a function. */
function splitAtCommas(text: string): string[] {
  const parts = ['']
  let depth = 0
  for (const character of text) {
    if (character === '(') depth++
    if (character === ')') depth--
    if (character === ',' && depth === 0) parts.push('')
    else parts[parts.length - 1] += character
  }
  return parts
}

interface Swept {
  readonly kind: QuantityKind
  readonly range: readonly [number, number]
}

function readAxis(stack: Stack, text: string): SweepAxis | Fault {
  const match = /^\s*([^=\s]+)\s*=\s*([^:]+):([^:]+):([^:]+)$/.exec(text)
  if (match === null) {
    return { code: 'bad_option', message: 'this names no range to go through', received: text, allowed: FORM }
  }
  const path = match[1]
  const swept = sweptQuantity(stack, path)
  if ('code' in swept) return swept
  const numbers = match.slice(2).map((part) => parseQuantity(part.trim(), swept.kind))
  const wrong = numbers.find(isFault)
  if (wrong !== undefined) {
    return {
      code: 'bad_quantity',
      message: wrong.hint ?? 'this is no such quantity',
      received: wrong.received,
      allowed: wrong.allowed,
    }
  }
  const [from, to, step] = numbers as number[]
  return rangeFault(from, to, step, swept) ?? { path, kind: swept.kind, values: steps(from, to, step) }
}

/** Parameters of the stack, and the three that belong to the view. */
function sweptQuantity(stack: Stack, path: string): Swept | Fault {
  const { from, to } = stack.conditions.wavelengths
  if (path === 'theta') return { kind: 'angle', range: [0, (89.9 * Math.PI) / 180] }
  if (path === 'phi') return { kind: 'angle', range: [-2 * Math.PI, 2 * Math.PI] }
  if (path === 'wavelength') return { kind: 'length', range: [from, to] }
  return findParameter(stack, path) ?? unknownPath(stack, path)
}

function unknownPath(stack: Stack, path: string): Fault {
  const { layers, panel, emission } = stack
  const fault = pathFault(path, { draft: { layers, panel, emission }, raw: stack })
  if (fault === undefined) throw new Error(`a parameter that is none: ${path}`)
  return { ...fault, next: `${fault.next}; theta, phi and wavelength can be varied too` }
}

function rangeFault(from: number, to: number, step: number, { kind, range }: Swept): Fault | undefined {
  const shown = (value: number) => formatQuantity(value, kind, 6)
  const received = `${shown(from)}:${shown(to)}:${shown(step)}`
  if (!(step > 0 && to > from)) {
    return { code: 'out_of_range', message: 'the range must rise in steps above zero', received, allowed: FORM }
  }
  if (to - from < step * (1 - 1e-9)) {
    return { code: 'out_of_range', message: 'the step is wider than the range', received, next: 'give a smaller step' }
  }
  const [least, most] = range
  if (from >= least && to <= most) return undefined
  const allowed = `from ${shown(least)} to ${shown(most)}`
  return { code: 'out_of_range', message: 'the range leaves what makes sense for this parameter', received, allowed }
}

function steps(from: number, to: number, step: number): number[] {
  const count = Math.floor((to - from) / step + 1e-9) + 1
  return Array.from({ length: Math.min(count, MOST_POINTS + 1) }, (_, k) => from + k * step)
}

function gridFault(axes: readonly SweepAxis[], count: number): Fault | undefined {
  if (count < 1 || count > 2) {
    const received = `${count}`
    return { code: 'bad_option', message: 'a sweep has one axis or two', received, allowed: 'one or two --vary' }
  }
  const points = axes.reduce((product, { values }) => product * values.length, 1)
  if (points <= MOST_POINTS) return undefined
  const message = 'the sweep has too many points'
  return { code: 'out_of_range', message, allowed: `at most ${MOST_POINTS}`, next: 'give larger steps' }
}

function repeatedPath(parts: readonly { readonly path: string }[]): string | undefined {
  const paths = parts.map(({ path }) => path)
  return paths.find((path, k) => paths.indexOf(path) !== k)
}

function twiceFault(received: string): Fault {
  return { code: 'duplicate_path', message: 'the parameter is set twice', received, next: 'name it once' }
}

async function readLink(stack: Stack, text: string, axes: readonly SweepAxis[]): Promise<SweepLink | Fault> {
  const split = text.indexOf('=')
  const path = text.slice(0, Math.max(0, split)).trim()
  const expression = text.slice(split + 1).trim()
  if (path === '' || expression === '') {
    const allowed = 'path=expression, e.g. quarter.slow_axis=half.slow_axis+60'
    return { code: 'bad_option', message: 'this links nothing', received: text, allowed }
  }
  const parameter = findParameter(stack, path)
  if (parameter === undefined) return unknownPath(stack, path)
  const variables = axes.map((axis) => axis.path)
  const fault = await prepareFormula(expression, variables)
  if (fault !== undefined) {
    const message = `the expression cannot be read at column ${fault.column}: ${fault.message}`
    return { code: 'bad_formula', message, received: expression, allowed: fault.allowed }
  }
  const link = { path, kind: parameter.kind, expression }
  return linkFault(link, axes, parameter) ?? link
}

/** A link must stay in range at the corners of the grid; one that leaves it between them gives what the engine makes of it. */
function linkFault({ expression, kind }: SweepLink, axes: readonly SweepAxis[], { range }: Swept): Fault | undefined {
  for (const corner of corners(axes)) {
    const plain = formulaAt(
      expression,
      corner,
      axes.map((axis) => axis.path),
    )
    const value = fromPlain(plain, kind)
    // Angles of any size are angles.
    if (Number.isFinite(value) && (kind === 'angle' || (value >= range[0] && value <= range[1]))) continue
    const received = `${expression} = ${plain} at ${Object.entries(corner)
      .map(([path, at]) => `${path} ${at}`)
      .join(', ')}`
    const allowed = `from ${formatQuantity(range[0], kind, 6)} to ${formatQuantity(range[1], kind, 6)}`
    const next = 'a link computes in nm, degrees and fractions'
    return { code: 'out_of_range', message: 'the linked parameter leaves what makes sense', received, allowed, next }
  }
  return undefined
}

/** Ends of the axes combined, in nm, degrees, fractions. */
function corners(axes: readonly SweepAxis[]): Record<string, number>[] {
  return axes.reduce<Record<string, number>[]>(
    (found, { path, kind, values }) =>
      found.flatMap((corner) =>
        [values[0], values[values.length - 1]].map((value) => ({ ...corner, [path]: toPlain(value, kind) })),
      ),
    [{}],
  )
}
