import { dispersionAt, type IndexArrays } from './dispersion.js'
import type { Provenance } from './publishedMaterial.js'
import { PUBLISHED } from './publishedTables.js'

/** What is told of a published material: everything but its figures. */
export interface Material extends Provenance {
  readonly name: string
  /** How its figures go on outside `rangeNm`. */
  readonly outside: 'formula continued' | 'end values held'
}

export const MATERIAL_NAMES: readonly string[] = Object.keys(PUBLISHED)

export function findMaterial(name: string): Material | undefined {
  if (!Object.hasOwn(PUBLISHED, name)) return undefined
  const { title, source, via, note, rangeNm, kind } = PUBLISHED[name]
  const outside = kind === 'table' ? 'end values held' : 'formula continued'
  return { name, title, source, via, ...(note !== undefined && { note }), rangeNm, outside }
}

/** n and k of a published material; throws on a name that is not one of `MATERIAL_NAMES`. */
export function materialIndexAt(name: string, wavelengthsNm: Float64Array): IndexArrays {
  if (!Object.hasOwn(PUBLISHED, name)) throw new Error(`no published material "${name}"`)
  return dispersionAt(PUBLISHED[name], wavelengthsNm)
}
