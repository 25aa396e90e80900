/**
 * Fields of a layer that say the same thing in different ways: of each list one entry (a set of fields that belong
 * together) may be given.
 */
import { isMapping, type PathKey, type PlacedFault } from './fault.js'

type Alternatives = readonly (readonly string[])[]

const BY_KIND: Readonly<Record<string, { readonly alternatives: Alternatives; readonly required: boolean }>> = {
  retarder: { alternatives: [['nz'], ['rth']], required: false },
  polarizer: {
    alternatives: [
      ['single_transmittance', 'polarization_efficiency'],
      ['k1', 'k2'],
      ['transmission_axis_transmittance', 'absorption_axis_transmittance'],
    ],
    required: true,
  },
}

const ALL: Alternatives = Object.values(BY_KIND).flatMap(({ alternatives }) => alternatives)

/** Fields that giving `field` puts out of force. */
export function rivalsOf(field: string): readonly string[] {
  for (const { alternatives } of Object.values(BY_KIND)) {
    if (alternatives.some((fields) => fields.includes(field))) {
      return alternatives.filter((fields) => !fields.includes(field)).flat()
    }
  }
  return []
}

/** Fields that must be given together with `field`. */
export function partnersOf(field: string): readonly string[] {
  return ALL.find((fields) => fields.includes(field))?.filter((other) => other !== field) ?? []
}

/** Rivals both given, a partner missing, or none given where one is needed. */
export function exclusiveFaults(layer: unknown, at: readonly PathKey[]): PlacedFault[] {
  const rule = isMapping(layer) && typeof layer.kind === 'string' ? ruleOf(layer.kind) : undefined
  if (!isMapping(layer) || rule === undefined) return []
  const given = (fields: readonly string[]) => fields.filter((field) => Object.hasOwn(layer, field))
  const touched = rule.alternatives.filter((fields) => given(fields).length > 0)
  const allowed = `one of: ${rule.alternatives.map((fields) => fields.join(' with ')).join('; ')}`
  if (touched.length > 1) {
    const [first, second] = touched.map((fields) => given(fields)[0])
    return [{ at: [...at, second], key: true, ...rivalFault(first, second, allowed) }]
  }
  if (touched.length === 0) return rule.required ? [{ at, ...noneFault(allowed) }] : []
  const missing = touched[0].filter((field) => !Object.hasOwn(layer, field))
  const [present] = given(touched[0])
  return missing.map((field) => ({ at: [...at, present], key: true, ...partnerFault(present, field, allowed) }))
}

function ruleOf(kind: string) {
  return Object.hasOwn(BY_KIND, kind) ? BY_KIND[kind] : undefined
}

function rivalFault(first: string, second: string, allowed: string): Omit<PlacedFault, 'at'> {
  const message = `${first} and ${second} say the same thing in two ways`
  return { code: 'exclusive', message, received: `${first}, ${second}`, allowed, next: 'remove one of them' }
}

function partnerFault(present: string, missing: string, allowed: string): Omit<PlacedFault, 'at'> {
  const message = `${present} needs ${missing} beside it`
  return { code: 'missing_partner', message, received: `${present} alone`, allowed, next: `add ${missing}` }
}

function noneFault(allowed: string): Omit<PlacedFault, 'at'> {
  const message = 'the polarizer does not say what it transmits'
  return { code: 'missing_key', message, allowed, next: 'give one of the pairs' }
}
