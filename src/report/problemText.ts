import type { Problem } from '../stack/problem.js'
import { excerpt } from './excerpt.js'
import { type Paint, PLAIN } from './paint.js'
import { plural, visible } from './wording.js'

/** Problems told in full; of more than these only the number is told. */
const MOST_TOLD = 50

/**
 * All problems as a text to be read: where, what, a few lines of the file with the place marked, what came, what is allowed, the
 * nearest known name, what to do next; at the end their number.
 * @param texts the files the problems point into, by name
 */
export function problemText(
  problems: readonly Problem[],
  texts: ReadonlyMap<string, string> = new Map(),
  paint: Paint = PLAIN,
): string {
  const told = problems.slice(0, MOST_TOLD).map((problem) => oneProblem(problem, texts.get(problem.file), paint))
  const rest = problems.length - told.length
  if (rest > 0) told.push(`… and ${plural(rest, 'more problem')}`)
  return `${[...told, paint.strong(countText(problems))].join('\n\n')}\n`
}

function oneProblem(problem: Problem, text: string | undefined, paint: Paint): string {
  const { severity, range, received, allowed, suggestion, next } = problem
  const mark = severity === 'error' ? paint.bad(severity) : paint.caution(severity)
  const frame = range !== undefined && text !== undefined ? excerpt(text, range, paint) : []
  const lines = [
    `${paint.strong(placeText(problem))}  ${mark}: ${visible(problem.message)}`,
    ...frame,
    ...(received !== undefined ? [`  received  ${visible(received)}`] : []),
    ...(allowed !== undefined ? [`  allowed   ${visible(allowed)}`] : []),
    ...(suggestion !== undefined ? [`  nearest   did you mean "${visible(suggestion)}"?`] : []),
    ...(next !== undefined ? [`  next      ${visible(next)}`] : []),
  ]
  return lines.join('\n')
}

function placeText({ file, path, range }: Problem): string {
  const place = range === undefined ? visible(file) : `${visible(file)}:${range.line}:${range.column}`
  return path === '' ? place : `${place} (${visible(path)})`
}

function countText(problems: readonly Problem[]): string {
  const errors = problems.filter(({ severity }) => severity === 'error').length
  const warnings = problems.length - errors
  const counts = [
    ...(errors > 0 ? [plural(errors, 'error')] : []),
    ...(warnings > 0 || errors === 0 ? [plural(warnings, 'warning')] : []),
  ]
  return counts.join(', ')
}
