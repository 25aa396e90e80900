import type { Problem } from '../stack/problem.js'
import type { Paint } from './paint.js'
import { visible } from './wording.js'

type Range = NonNullable<Problem['range']>

const LINES_BEFORE = 2
const LINES_AFTER = 1
const WIDTH = 100

/** A few lines of a file about a place, with carets under it; what is too wide is cut about the place. */
export function excerpt(text: string, range: Range, paint: Paint): string[] {
  const lines = text.split(/\r\n|\r|\n/)
  const first = Math.max(1, range.line - LINES_BEFORE)
  const last = Math.min(lines.length, range.line + LINES_AFTER)
  const gutter = String(last).length
  const left = range.column > WIDTH - 20 ? range.column - WIDTH / 2 : 1
  const cut = (line: string): string => visible(line.slice(left - 1, left - 1 + WIDTH))
  const out: string[] = []
  for (let number = first; number <= last; number++) {
    const line = cut(lines[number - 1] ?? '')
    const head = `${number === range.line ? '>' : ' '} ${String(number).padStart(gutter)} |`
    out.push(`${paint.faint(head)} ${line}`.trimEnd())
    if (number === range.line) out.push(`${paint.faint(`  ${' '.repeat(gutter)} |`)} ${carets(range, left, paint)}`)
  }
  return out
}

function carets({ line, column, endLine, endColumn }: Range, left: number, paint: Paint): string {
  const length = line === endLine ? Math.max(1, endColumn - column) : 1
  const room = WIDTH - (column - left)
  return ' '.repeat(column - left) + paint.bad('^'.repeat(Math.min(length, Math.max(1, room))))
}
