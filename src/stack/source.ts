import { type Document, isMap, isPair, isScalar, isSeq, LineCounter, type Node, type Pair, parseDocument } from 'yaml'
import type { Fault, PathKey } from './fault.js'
import type { Problem } from './problem.js'

type Range = NonNullable<Problem['range']>

/** Largest YAML file read, characters; long spectra belong into CSV files. */
const LONGEST_TEXT = 2_000_000
/** How often an alias may stand for its anchor. */
const MOST_ALIASES = 2000

const FIRST_PLACE: Range = { line: 1, column: 1, endLine: 1, endColumn: 1 }

/** A YAML text with the places of its nodes. */
export class Source {
  private constructor(
    readonly file: string,
    readonly text: string,
    readonly document: Document,
    private readonly lines: LineCounter,
  ) {}

  /** Never throws; a text that is not YAML gives a source whose `problems` are not empty. */
  static parse(file: string, text: string): { source: Source; problems: Problem[] } {
    const lines = new LineCounter()
    const bounded = text.length > LONGEST_TEXT ? '' : text
    const document = parseDocument(bounded, { lineCounter: lines, prettyErrors: false })
    const source = new Source(file, bounded, document, lines)
    if (bounded !== text) return { source, problems: [source.problem(tooLong(text.length), [])] }
    return { source, problems: withoutSequels(document).map((fault) => source.yamlProblem(fault)) }
  }

  /** The text as plain data. Own keys only, so that `__proto__` is a key like any other. */
  plain(): { raw: unknown; problems: Problem[] } {
    try {
      return { raw: this.document.toJS({ maxAliasCount: MOST_ALIASES }), problems: [] }
    } catch (error) {
      const message = error instanceof Error && error.message.includes('alias') ? aliasFault() : depthFault()
      return { raw: undefined, problems: [this.problem(message, [])] }
    }
  }

  problem(fault: Fault, path: readonly PathKey[], key = false): Problem {
    return { severity: 'error', file: this.file, path: path.join('.'), range: this.rangeOf(path, key), ...fault }
  }

  /**
   * Place of the value (or the key) at a path; where the path ends early, that of the last node on it, as for a key that is
   * missing. Only its first line, so that a whole mapping is not marked.
   */
  rangeOf(path: readonly PathKey[], key = false): Range {
    let node: unknown = this.document.contents
    let pair: Pair | undefined
    for (const step of path) {
      const next = childOf(node, step)
      if (next === undefined) return this.firstLine(pair?.key ?? node) ?? FIRST_PLACE
      pair = isPair(next) ? next : undefined
      node = pair === undefined ? next : pair.value
    }
    const wanted = key && pair !== undefined ? pair.key : (node ?? pair?.key)
    return this.firstLine(wanted) ?? FIRST_PLACE
  }

  private firstLine(node: unknown): Range | undefined {
    const range = (node as Node | null | undefined)?.range
    return range === undefined || range === null ? undefined : this.textRange(range[0], range[1])
  }

  private textRange(start: number, end: number): Range {
    const lineEnd = this.text.indexOf('\n', start)
    const stop = Math.max(start, lineEnd >= 0 && lineEnd < end ? lineEnd : end)
    const from = this.lines.linePos(start)
    const to = this.lines.linePos(stop)
    if (from.line === 0) return FIRST_PLACE
    return { line: from.line, column: from.col, endLine: to.line, endColumn: to.col }
  }

  private isIndentedWithTab(at: number): boolean {
    const lineStart = this.text.lastIndexOf('\n', at - 1) + 1
    return /^ *\t/.test(this.text.slice(lineStart, lineStart + 200))
  }

  private yamlProblem({ code, message, pos }: { code: string; message: string; pos: [number, number] }): Problem {
    if (message.includes('call stack')) return this.problem(depthFault(), [])
    return {
      severity: 'error',
      code: code === 'DUPLICATE_KEY' ? 'duplicate_key' : 'yaml',
      path: '',
      file: this.file,
      range: this.textRange(pos[0], pos[1]),
      message: sentenceOf(code, message),
      next: this.isIndentedWithTab(pos[0]) ? NEXT_STEPS.TAB_AS_INDENT : (NEXT_STEPS[code] ?? CORRECT_HERE),
    }
  }
}

type YamlFault = Document['errors'][number] | Document['warnings'][number]

/** After a fault of syntax the parser has lost its place, and what it finds from there on is mostly a sequel. */
function withoutSequels({ errors, warnings }: Document): YamlFault[] {
  const first = errors.findIndex(({ code }) => code !== 'DUPLICATE_KEY')
  return first < 0 ? [...errors, ...warnings] : errors.slice(0, first + 1)
}

/** The pair of a mapping or the item of a list. */
export function childOf(node: unknown, step: PathKey): Node | Pair | undefined {
  if (isMap(node)) return node.items.find(({ key }) => String(isScalar(key) ? key.value : key) === String(step))
  if (isSeq(node)) return node.items[Number(step)] as Node | undefined
  return undefined
}

const CORRECT_HERE = 'correct the YAML here; all other checks wait for it'

const NEXT_STEPS: Readonly<Record<string, string>> = {
  DUPLICATE_KEY: 'keep one of the two',
  TAB_AS_INDENT: 'indent with spaces, not with a tab',
  TAG_RESOLVE_FAILED: 'leave the tag out: the stack file knows its types',
}

function sentenceOf(code: string, message: string): string {
  if (code === 'DUPLICATE_KEY') return 'the same key stands twice in one mapping'
  const first = message.split('\n')[0]
  return first.charAt(0).toLowerCase() + first.slice(1)
}

function tooLong(length: number): Fault {
  return {
    code: 'too_large',
    message: 'the file is too large to be a stack file',
    received: `${length} characters`,
    allowed: `at most ${LONGEST_TEXT} characters`,
    next: 'keep long spectra in CSV files and name them with {file: …}',
  }
}

function aliasFault(): Fault {
  return {
    code: 'too_large',
    message: 'aliases in the file stand for too much',
    allowed: `at most ${MOST_ALIASES} uses, counted through nested aliases`,
    next: 'write the repeated part out, or use a film card',
  }
}

export function depthFault(): Fault {
  return {
    code: 'too_deep',
    message: 'the file is nested too deeply',
    next: 'a stack file needs fewer than ten levels',
  }
}
