/** The state of the page in its address, behind the `#`: nothing of it is ever sent. */
import type { ParameterInfo } from '../../stack/parameters.js'
import { fromPlain, toPlain } from '../../units/quantity.js'
import type { Values } from '../engine/messages.js'
import type { OpenedFile, Place } from '../files/place.js'
import { packText, unpackText } from './packText.js'

export interface LinkedState {
  readonly token: string | null
  /** In the served folder, or among the demo stacks. */
  readonly served: string | null
  readonly demo: string | null
  /** A file that no other has: the link carries it. */
  readonly carried: OpenedFile | undefined
  /** nm, degrees, fractions, as written. */
  readonly plain: ReadonlyMap<string, number>
}

/** A parameter path has a dot, the other keys have none. */
const isPath = (key: string): boolean => key.includes('.')

export async function readLink(hash: string): Promise<LinkedState> {
  const asked = new URLSearchParams(hash.replace(/^#/, ''))
  const carried = asked.get('carried')
  const numbers = [...asked].filter(([key]) => isPath(key)).map(([key, text]) => [key, Number(text)] as const)
  return {
    token: asked.get('token'),
    served: asked.get('file'),
    demo: asked.get('demo'),
    carried: carried === null ? undefined : await unpackText(carried).then(JSON.parse, () => undefined),
    plain: new Map(numbers.filter(([, value]) => Number.isFinite(value))),
  }
}

/** Values of those paths that the stack has, within what is possible. */
export function valuesOfLink({ plain }: LinkedState, parameters: readonly ParameterInfo[]): Values {
  const found = parameters.flatMap(({ path, kind, range }) => {
    const value = plain.get(path)
    if (value === undefined) return []
    return [[path, Math.min(range[1], Math.max(range[0], fromPlain(value, kind)))] as const]
  })
  return Object.fromEntries(found)
}

export async function writeLink(
  place: Place['kind'],
  opened: OpenedFile,
  values: Values,
  parameters: readonly ParameterInfo[],
): Promise<string> {
  const link = new URLSearchParams()
  if (place === 'served') link.set('file', opened.file)
  else if (place === 'demo') link.set('demo', opened.file)
  else link.set('carried', await packText(JSON.stringify(opened)))
  for (const { path, kind } of parameters) {
    if (values[path] !== undefined) link.set(path, String(toPlain(values[path], kind)))
  }
  return `#${link}`
}
