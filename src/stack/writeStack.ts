import { isMapping, type PathKey, valueAt } from './fault.js'
import { limitsOfPath } from './fieldLimits.js'
import { applyOverride, placeOf, readOverrides } from './overrides.js'
import { styledQuantity } from './quantityStyle.js'
import { Source } from './source.js'
import type { Stack } from './stack.js'
import { editYaml } from './yamlEdits.js'

/**
 * The text of a stack file with new values for some parameters (nm, rad, fractions): comments, order, anchors, quoting and
 * units stay. `stack` is what the text was read as; a field that it has from a film card or by default is written on the
 * layer itself. `sets` are options (`path=value`) to be written first, as when the stack was read with them.
 * Throws where a path is not a parameter of the stack.
 */
export function applyToText(
  text: string,
  stack: Stack,
  values: Readonly<Record<string, number>>,
  sets: readonly string[] = [],
): string {
  const { raw } = Source.parse('', text).source.plain()
  const withSets = readOverrides(sets, raw).overrides.reduce(
    (data, { at, value }) => change(withCardField(data, at, stack), at, value),
    raw,
  )
  const after = byDepth(Object.entries(values)).reduce((data, [path, value]) => {
    const at = placeOf(path.split('.'), data)
    const limits = limitsOfPath(path)
    if (!Array.isArray(at) || limits === undefined) throw new Error(`not a parameter of this stack: ${path}`)
    const seeded = withCardField(data, at, stack)
    return change(seeded, at, styledQuantity(value, limits, valueAt(seeded, at)))
  }, withSets)
  return editYaml(text, raw, after)

  function change(data: unknown, at: readonly PathKey[], value: unknown): unknown {
    const result = applyOverride(data, { text: at.join('.'), at, value })
    if ('fault' in result) throw new Error(`${at.join('.')}: ${result.fault.message}`)
    return result.raw
  }
}

/** An index before its k, which makes a pair of it. */
function byDepth(entries: [string, number][]): [string, number][] {
  const depth = ([path]: [string, number]) => path.split('.').length
  return entries.sort((a, b) => depth(a) - depth(b))
}

/** A path into a field that the layer has from its film card: the whole field comes onto the layer. */
function withCardField(raw: unknown, at: readonly PathKey[], stack: Stack): unknown {
  const [section, place, field] = at
  if (section !== 'layers' || at.length < 4) return raw
  const own = valueAt(raw, at.slice(0, 2))
  const checked = stack.layers[Number(place)] as unknown as Readonly<Record<string, unknown>>
  if (!isMapping(own) || Object.hasOwn(own, field) || checked[field] === undefined) return raw
  const result = applyOverride(raw, { text: '', at: at.slice(0, 3), value: checked[field] })
  return 'raw' in result ? result.raw : raw
}
