/** Refractive indices over the wavelengths of the file: formulas that compute, materials in their range, a clear panel. */

import { prepareFormula } from '../../materials/formula.js'
import { indexAt } from '../../materials/indexAt.js'
import type { IndexLaw } from '../../materials/indexLaw.js'
import { outsideRange } from '../../materials/outsideRange.js'
import type { Fault, PathKey, PlacedFault } from '../fault.js'
import { FIELD_LIMITS } from '../fieldLimits.js'
import { wavelengthsOf } from '../wavelengths.js'
import type { Sense } from './sense.js'

interface PlacedLaw {
  readonly at: readonly PathKey[]
  readonly law: IndexLaw
}

/** Compiles the formulas of the stack. */
export async function indexFaults({ draft }: Sense): Promise<PlacedFault[]> {
  const { conditions } = draft
  if (conditions === undefined) return []
  const wavelengths = wavelengthsOf(conditions)
  const laws = lawsOf(draft)
  const faults: PlacedFault[] = []
  for (const { at, law } of laws) {
    const fault = await formulaFault(law)
    if (fault !== undefined) faults.push({ at: [...at, 'formula'], ...fault })
    else faults.push(...valueFaults(law, wavelengths).map((found) => ({ at, ...found })))
  }
  const failed = faults.length > 0
  return [...faults, ...(failed ? [] : clarityFaults(draft, wavelengths)), ...rangeWarnings(laws, wavelengths)]
}

function lawsOf(draft: Sense['draft']): PlacedLaw[] {
  const layers = draft.layers.flatMap((layer, i): PlacedLaw[] => {
    if (layer === undefined) return []
    if (layer.kind !== 'crystal') return [{ at: ['layers', i, 'index'], law: layer.index }]
    return layer.indices.map((law, axis) => ({ at: ['layers', i, 'indices', axis], law }))
  })
  return draft.panel === undefined ? layers : [...layers, { at: ['panel', 'index'], law: draft.panel.index }]
}

async function formulaFault(law: IndexLaw): Promise<Fault | undefined> {
  if (typeof law === 'number' || !('formula' in law)) return undefined
  const fault = await prepareFormula(law.formula)
  if (fault === undefined) return undefined
  const { message, allowed, column } = fault
  const place = column === undefined ? '' : ` (character ${column})`
  const received = law.formula.length > 80 ? `${law.formula.slice(0, 80)}…` : law.formula
  return { code: 'bad_formula', message: message + place, received, allowed, next: 'correct the formula' }
}

/** A formula or Cauchy's law may leave what an index can be. */
function valueFaults(law: IndexLaw, wavelengths: Float64Array): Fault[] {
  if (typeof law === 'number' || 'n' in law || 'material' in law) return []
  const { n } = indexAt(law, wavelengths)
  const bad = n.findIndex((value) => !(value >= FIELD_LIMITS.n.min && value <= FIELD_LIMITS.n.max))
  if (bad < 0) return []
  return [
    {
      code: 'out_of_range',
      message: `the index cannot be used at ${wavelengths[bad]} nm`,
      received: `n = ${Number(n[bad].toPrecision(5))}`,
      allowed: `from ${FIELD_LIMITS.n.min} to ${FIELD_LIMITS.n.max}`,
      next: 'check the coefficients and the unit of the wavelength',
    },
  ]
}

/** Absorption that a medium called lossless may have: published glasses have some 1e-6. */
const CLEAR_K = 1e-3

/** The mirror's medium must be clear; the polarizer's absorption comes from its transmittances. */
function clarityFaults({ panel, layers }: Sense['draft'], wavelengths: Float64Array): PlacedFault[] {
  const faults: PlacedFault[] = []
  if (panel?.kind === 'mirror') {
    const { n, k } = indexAt(panel.index, wavelengths)
    const next = 'use kind: metal for an absorbing half-space'
    const allowed = 'n at least 1, k = 0'
    const fault = { code: 'not_applicable', allowed, next }
    if (k.some((value) => value > CLEAR_K)) {
      faults.push({
        at: ['panel', 'index'],
        ...fault,
        message: 'the medium over the mirror absorbs',
        received: 'k above 0',
      })
    } else if (n.some((value) => value < 1)) {
      const message = 'the medium over the mirror is thinner than air'
      faults.push({ at: ['panel', 'index'], ...fault, message, received: 'n below 1' })
    }
  }
  layers.forEach((layer, i) => {
    if (layer?.kind !== 'polarizer' || !indexAt(layer.index, wavelengths).k.some((value) => value > CLEAR_K)) return
    const message = 'the absorption of a polarizer comes from its transmittances'
    const next = 'give n alone'
    faults.push({ at: ['layers', i, 'index'], code: 'not_applicable', message, received: 'k above 0', next })
  })
  return faults
}

/** Once for each material, and for each table, used outside the wavelengths of its figures. */
function rangeWarnings(laws: readonly PlacedLaw[], wavelengths: Float64Array): PlacedFault[] {
  const told = new Set<string>()
  return laws.flatMap(({ at, law }): PlacedFault[] => {
    const message = outsideRange(law, wavelengths[0], wavelengths[wavelengths.length - 1])
    if (message === undefined) return []
    const material = typeof law === 'object' && 'material' in law ? law.material : undefined
    if (material !== undefined && told.has(material)) return []
    if (material !== undefined) told.add(material)
    const place = material === undefined ? at : [...at, 'material']
    const next = 'take figures beyond the range with caution'
    return [{ at: place, severity: 'warning', code: 'index_range', message, next }]
  })
}
