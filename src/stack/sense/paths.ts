import { SOBOL_DIMENSIONS } from '../../numeric/sobol.js'
import { type Fault, isMapping, type PathKey, type PlacedFault, shortList, valueAt } from '../fault.js'
import { emissionFields, type Field, layerFields, panelFields } from '../fields.js'
import { nearestName } from '../nearestName.js'
import { layerIds } from './layerIds.js'
import type { Sense } from './sense.js'

const VARIED = ['optimize', 'tolerance', 'fit'] as const

/** Parameter paths in the questions must name a numeric field of a layer, the panel or the emission. */
export function pathFaults(sense: Sense): PlacedFault[] {
  const varied = VARIED.flatMap((question) => {
    const vary = valueAt(sense.raw, [question, 'vary'])
    const paths = isMapping(vary) ? Object.keys(vary) : []
    const unknown = paths.flatMap((path) => placed(pathFault(path, sense), [question, 'vary', path], true))
    return [...unknown, ...sameFaults(paths, [question, 'vary']), ...countFaults(paths, [question, 'vary'])]
  })
  return [...varied, ...togetherFaults(sense)]
}

/** The even points of searches and draws have so many coordinates. */
function countFaults(paths: readonly string[], at: readonly PathKey[]): PlacedFault[] {
  if (paths.length <= SOBOL_DIMENSIONS) return []
  const message = 'too many parameters move at once'
  const received = String(paths.length)
  return [{ at: [...at], key: true, code: 'too_large', message, received, allowed: `at most ${SOBOL_DIMENSIONS}` }]
}

/** Endings of paths that mean the same of a layer. */
const SAME = [
  ['rth', 'nz'],
  ['index.n', 'index'],
] as const

function sameFaults(paths: readonly string[], base: readonly PathKey[]): PlacedFault[] {
  return paths.flatMap((path) =>
    SAME.flatMap(([ending, other]): PlacedFault[] => {
      const twin = path.slice(0, -ending.length) + other
      if (!path.endsWith(`.${ending}`) || !paths.includes(twin)) return []
      const message = 'two paths move the same quantity'
      const received = `${twin}, ${path}`
      return [{ at: [...base, path], key: true, code: 'exclusive', message, received, next: 'remove one of them' }]
    }),
  )
}

function placed(fault: Fault | undefined, at: readonly PathKey[], key: boolean): PlacedFault[] {
  return fault === undefined ? [] : [{ at, key, ...fault }]
}

/** What is wrong with a parameter path; undefined where nothing is, or where its owner could not be read. */
export function pathFault(path: string, { draft, raw }: Sense): Fault | undefined {
  const dot = path.indexOf('.')
  const id = dot < 0 ? path : path.slice(0, dot)
  const field = dot < 0 ? '' : path.slice(dot + 1)
  const ids = layerIds(raw)
  const place = ids.indexOf(id)
  if (id === 'panel') return draft.panel && fieldFault(id, field, panelFields(draft.panel), draft.panel)
  if (id === 'emission') return draft.emission && fieldFault(id, field, emissionFields(draft.emission), draft.emission)
  if (place < 0)
    return unknownId(id, field, [...new Set(ids.filter((known) => known !== undefined)), 'panel', 'emission'])
  const layer = draft.layers[place]
  return layer && fieldFault(id, field, layerFields(layer), layer)
}

function unknownId(id: string, field: string, known: readonly string[]): Fault {
  const near = nearestName(id, known)
  return {
    code: 'unknown_id',
    message: `there is no layer "${id.slice(0, 60)}"`,
    received: field === '' ? id.slice(0, 60) : `${id}.${field}`.slice(0, 80),
    allowed: shortList(known),
    ...(near !== undefined && { suggestion: field === '' ? near : `${near}.${field}` }),
    next: 'write the id of a layer, a dot and one of its fields',
  }
}

function fieldFault(id: string, field: string, fields: readonly Field[], owner: object): Fault | undefined {
  const known = fields.map(({ path }) => path)
  if (known.includes(field)) return undefined
  const allowed = known.map((path) => `${id}.${path}`).join(', ') || `nothing: no field of ${id} is a single number`
  const stands = field !== '' && valueAt(owner, field.split('.')) !== undefined
  if (stands) {
    return {
      code: 'not_numeric',
      message: `"${field}" of ${id} is not a single number`,
      received: `${id}.${field}`,
      allowed,
      next: 'vary a field that is one number; a spectrum, a material or a name cannot be varied',
    }
  }
  const near = nearestName(field, known)
  return {
    code: 'unknown_field',
    message: field === '' ? `the path does not say which field of ${id}` : `${id} has no field "${field.slice(0, 60)}"`,
    received: field === '' ? id : `${id}.${field}`.slice(0, 80),
    allowed,
    ...(near !== undefined && { suggestion: `${id}.${near}` }),
    next: 'choose one of the fields of this kind',
  }
}

/** Paths that share a draw must be varied, and can share but one. */
function togetherFaults({ draft: { tolerance } }: Sense): PlacedFault[] {
  if (tolerance === undefined) return []
  const varied = Object.keys(tolerance.vary)
  const seen = new Set<string>()
  return tolerance.together.flatMap((group, g) =>
    group.flatMap((path, i): PlacedFault[] => {
      const at = ['tolerance', 'together', g, i]
      const again = seen.has(path)
      seen.add(path)
      if (again) {
        const next = 'leave it in one group'
        return [{ at, code: 'duplicate_path', message: 'the path stands in a group already', received: path, next }]
      }
      return placed(varied.includes(path) ? undefined : notVaried(path, varied), at, false)
    }),
  )
}

function notVaried(path: string, varied: readonly string[]): Fault {
  const suggestion = nearestName(path, varied)
  return {
    code: 'unknown_id',
    message: 'the path has no spread under tolerance.vary',
    received: path.slice(0, 80),
    allowed: shortList(varied),
    ...(suggestion !== undefined && { suggestion }),
    next: 'give it a spread, or take it out of the group',
  }
}
