import { isMapping } from './fault.js'
import { Source } from './source.js'
import { editYaml } from './yamlEdits.js'

/** Keys whose text is the path of a file. */
const FILE_KEYS = ['file', 'film']

/**
 * The text of a stack file that is to stand in another folder: `moved` turns each path it names (files, film cards, patterns of
 * cards to compare), relative to the old place, into one relative to the new. All else stays as it is.
 */
export function rebaseFiles(text: string, moved: (path: string) => string): string {
  const { raw } = Source.parse('', text).source.plain()
  return editYaml(text, raw, rebased(raw, moved, []))
}

function rebased(raw: unknown, moved: (path: string) => string, at: readonly string[]): unknown {
  if (typeof raw === 'string') return isPath(at) ? moved(raw) : raw
  if (Array.isArray(raw)) return raw.map((item) => rebased(item, moved, [...at, '*']))
  if (!isMapping(raw)) return raw
  return Object.fromEntries(Object.entries(raw).map(([key, item]) => [key, rebased(item, moved, [...at, key])]))
}

function isPath(at: readonly string[]): boolean {
  const isPattern = at.length === 4 && at[0] === 'compare' && at[1] === 'slots' && at[3] === '*'
  return isPattern || FILE_KEYS.includes(at[at.length - 1])
}
