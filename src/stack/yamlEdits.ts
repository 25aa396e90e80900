/**
 * Changes in a YAML text that leave every other character as it is. An edit is found by comparing plain data before and
 * after; each is spliced into the text, and the text is parsed anew for the next.
 */
import {
  type Alias,
  isAlias,
  isCollection,
  isNode,
  isScalar,
  type Node,
  type Pair,
  parseDocument,
  Scalar,
  stringify,
  visit,
  type YAMLMap,
} from 'yaml'
import { isMapping, type PathKey } from './fault.js'
import { childOf } from './source.js'

type Edit =
  | { readonly kind: 'replace'; readonly at: readonly PathKey[]; readonly value: unknown }
  | { readonly kind: 'insert'; readonly at: readonly PathKey[]; readonly key: string; readonly value: unknown }
  | { readonly kind: 'remove'; readonly at: readonly PathKey[]; readonly key: string }
  /** Another key and value in the place of a pair. */
  | {
      readonly kind: 'rename'
      readonly at: readonly PathKey[]
      readonly from: string
      readonly key: string
      readonly value: unknown
    }

/** The text with `before` turned into `after`; `before` is what the text holds. */
export function editYaml(text: string, before: unknown, after: unknown): string {
  return editsBetween(before, after, []).reduce((edited, edit) => applyEdit(edited, edit), text)
}

function editsBetween(before: unknown, after: unknown, at: readonly PathKey[]): Edit[] {
  if (Object.is(before, after)) return []
  if (Array.isArray(before) && Array.isArray(after) && before.length === after.length) {
    return before.flatMap((item, i) => editsBetween(item, after[i], [...at, i]))
  }
  if (!isMapping(before) || !isMapping(after)) return [{ kind: 'replace', at, value: after }]
  const removed = Object.keys(before).filter((key) => !Object.hasOwn(after, key))
  const added = Object.keys(after).filter((key) => !Object.hasOwn(before, key))
  const common = Object.keys(before).filter((key) => Object.hasOwn(after, key))
  return [
    ...common.flatMap((key) => editsBetween(before[key], after[key], [...at, key])),
    ...added.map((key, i): Edit => {
      const value = after[key]
      return i < removed.length
        ? { kind: 'rename', at, from: removed[i], key, value }
        : { kind: 'insert', at, key, value }
    }),
    ...removed.slice(added.length).map((key): Edit => ({ kind: 'remove', at, key })),
  ]
}

interface Splice {
  readonly start: number
  readonly end: number
  readonly text: string
}

function applyEdit(text: string, edit: Edit): string {
  const free = freeOfAliases(
    text,
    edit.kind === 'replace' ? edit.at : [...edit.at, 'from' in edit ? edit.from : edit.key],
  )
  const { start, end, text: put } = spliceOf(free, edit)
  return free.slice(0, start) + put + free.slice(end)
}

function spliceOf(text: string, edit: Edit): Splice {
  const write = writerFor(text)
  const root = parseDocument(text).contents
  const node = edit.at.reduce<unknown>((parent, key) => nodeOf(childOf(parent, key)), root)
  if (edit.kind === 'replace')
    return replaced(text, root, edit.at, write(edit.value, isScalar(node) ? node : undefined))
  const map = node as YAMLMap
  if (edit.kind === 'insert') return inserted(text, map, write.pair(edit.key, edit.value))
  const place = map.items.findIndex((pair) => keyText(pair) === (edit.kind === 'rename' ? edit.from : edit.key))
  const pair = map.items[place]
  if (edit.kind === 'rename')
    return { start: startOf(pair.key), end: pairEnd(pair), text: write.pair(edit.key, edit.value) }
  return removed(text, map, place)
}

/** A value, or nothing behind its key, gives way to the new text. */
function replaced(text: string, root: unknown, at: readonly PathKey[], put: string): Splice {
  const parent = at.slice(0, -1).reduce<unknown>((node, key) => nodeOf(childOf(node, key)), root)
  const child = childOf(parent, at[at.length - 1])
  const node = nodeOf(child)
  if (isNode(node) && node.range && node.range[1] > node.range[0]) {
    const end = contentEnd(node)
    return { start: node.range[0], end: text.slice(0, end).trimEnd().length, text: put }
  }
  const end = text.indexOf(':', endOf((child as Pair).key)) + 1
  return { start: end, end, text: ` ${put}` }
}

function inserted(text: string, map: YAMLMap, put: string): Splice {
  const last = map.items[map.items.length - 1]
  if (map.flow) {
    const start = last === undefined ? startOf(map) + 1 : pairEnd(last)
    return { start, end: start, text: last === undefined ? put : `, ${put}` }
  }
  const [first] = map.items
  const indent = startOf(first.key) - (text.lastIndexOf('\n', startOf(first.key) - 1) + 1)
  const end = text.slice(0, pairEnd(last)).trimEnd().length
  const lineEnd = /\r?\n|$/g
  lineEnd.lastIndex = end
  const start = lineEnd.exec(text)?.index ?? text.length
  return { start, end: start, text: `${text.includes('\r\n') ? '\r\n' : '\n'}${' '.repeat(indent)}${put}` }
}

function removed(text: string, map: YAMLMap, place: number): Splice {
  const [before, pair, next] = [map.items[place - 1], map.items[place], map.items[place + 1]]
  const start = startOf(pair.key)
  const lineStart = text.lastIndexOf('\n', start - 1) + 1
  const ownLine = !map.flow && text.slice(lineStart, start).trim() === ''
  if (ownLine) {
    const lineEnd = text.indexOf('\n', text.slice(0, pairEnd(pair)).trimEnd().length)
    return { start: lineStart, end: lineEnd < 0 ? text.length : lineEnd + 1, text: '' }
  }
  if (next !== undefined) return { start, end: startOf(next.key), text: '' }
  return { start: before === undefined ? start : pairEnd(before), end: pairEnd(pair), text: '' }
}

/**
 * The text with those aliases written out that the path goes through, and those to anchors on the path or at its end: what
 * is changed there must change nowhere else.
 */
function freeOfAliases(text: string, path: readonly PathKey[]): string {
  const document = parseDocument(text)
  const anchors = new Set<string>()
  let node: unknown = document.contents
  for (const key of path) {
    note(node)
    if (isAlias(node)) break
    node = nodeOf(childOf(node, key))
  }
  note(node)
  const through = isAlias(node) ? node : undefined
  if (isCollection(node)) visit(node, { Node: (_, inner) => note(inner) })
  const write = writerFor(text)
  const splices: Splice[] = []
  visit(document, {
    Alias: (_, alias: Alias) => {
      if (alias !== through && !anchors.has(alias.source)) return
      const value = alias.resolve(document)?.toJS(document)
      splices.push({ start: startOf(alias), end: endOf(alias), text: write(value) })
    },
  })
  if (splices.length === 0) return text
  const [last] = splices.sort((a, b) => b.start - a.start)
  return freeOfAliases(text.slice(0, last.start) + last.text + text.slice(last.end), path)

  function note(inner: unknown): void {
    if (isNode(inner) && !isAlias(inner) && 'anchor' in inner && inner.anchor) anchors.add(inner.anchor)
  }
}

/** Writes values on one line; JSON stays JSON. */
function writerFor(text: string) {
  const isJson = text.trimStart().startsWith('{') && text.trimEnd().endsWith('}') && text.includes('"')
  const write = (value: unknown, old?: Scalar): string => {
    if (isJson) return JSON.stringify(value)
    const quoted = old?.type === Scalar.QUOTE_DOUBLE || old?.type === Scalar.QUOTE_SINGLE
    if (quoted && typeof value === 'string') return old?.type === Scalar.QUOTE_DOUBLE ? `"${value}"` : `'${value}'`
    const list = stringify([value], { collectionStyle: 'flow', lineWidth: 0, flowCollectionPadding: false })
    return list.trim().slice(1, -1)
  }
  return Object.assign(write, { pair: (key: string, value: unknown) => `${write(key)}: ${write(value)}` })
}

function nodeOf(child: Node | Pair | undefined): unknown {
  return isNode(child) ? child : child?.value
}

function keyText({ key }: Pair): string {
  return String(isScalar(key) ? key.value : key)
}

function startOf(node: unknown): number {
  return (node as Node).range?.[0] ?? 0
}

function endOf(node: unknown): number {
  return (node as Node).range?.[1] ?? 0
}

function pairEnd({ key, value }: Pair): number {
  return Math.max(endOf(key), isNode(value) ? contentEnd(value) : 0)
}

/** End of the last text of a node: a block collection's own range runs on into what follows. */
function contentEnd(node: Node): number {
  if (!isCollection(node) || node.flow) return endOf(node)
  const last = node.items[node.items.length - 1]
  if (isNode(last)) return contentEnd(last)
  return last === undefined ? endOf(node) : pairEnd(last as Pair)
}
