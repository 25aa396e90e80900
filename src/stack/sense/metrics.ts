import { formatQuantity } from '../../units/quantity.js'
import { type Fault, type PathKey, type PlacedFault, valueAt } from '../fault.js'
import type { Direction, Limit, MetricName } from '../stack.js'
import type { Sense } from './sense.js'

/** Limits and aims must be computable: from a direction of the conditions, over this panel, with these luminances. */
export function metricFaults(sense: Sense): PlacedFault[] {
  const { draft, raw } = sense
  const limits = requestsOf(draft.limits ?? [], ['limits'], sense)
  const constraints = requestsOf(draft.optimize?.subject_to ?? [], ['optimize', 'subject_to'], sense)
  const aim = draft.optimize?.minimize
  if (aim === undefined) return [...limits, ...constraints]
  const at = ['optimize', valueAt(raw, ['optimize', 'minimize']) === undefined ? 'maximize' : 'minimize']
  const faults = [...applicationFaults(aim, at, sense), ...quantileFaults(aim.quantile, at, sense)]
  return [...limits, ...constraints, ...faults]
}

function requestsOf(limits: readonly Limit[], base: readonly PathKey[], sense: Sense): PlacedFault[] {
  return limits.flatMap((limit, i) => [
    ...directionFaults(limit, [...base, i], sense),
    ...applicationFaults(limit, [...base, i], sense),
  ])
}

const SAME_RAD = 1e-9

function directionFaults(limit: Limit, at: readonly PathKey[], { draft, raw }: Sense): PlacedFault[] {
  const directions = draft.conditions?.directions
  if (directions === undefined || directions.some((known) => isSame(known, limit))) return []
  const given = ['theta', 'phi'].find((key) => valueAt(raw, [...at, key]) !== undefined)
  return [
    {
      at: given === undefined ? at : [...at, given],
      code: 'direction_not_computed',
      message: 'the limit looks from a direction that is not computed',
      received: directionText(limit),
      allowed: directions.slice(0, 8).map(directionText).join('; ') + (directions.length > 8 ? '; …' : ''),
      next: `add {${directionText(limit)}} to conditions.directions`,
    },
  ]
}

function isSame(a: Direction, b: Direction): boolean {
  const turn = Math.abs(a.phi - b.phi) % (2 * Math.PI)
  return Math.abs(a.theta - b.theta) < SAME_RAD && Math.min(turn, 2 * Math.PI - turn) < SAME_RAD
}

function directionText({ theta, phi }: Direction): string {
  return `theta: ${formatQuantity(theta, 'angle', 6)}, phi: ${formatQuantity(phi, 'angle', 6)}`
}

interface Request {
  readonly metric: MetricName
  readonly illuminance?: number
}

/** What keeps a metric from being computed for this panel, these luminances, whatever the direction. */
export function applicationFaults(
  { metric, illuminance }: Request,
  at: readonly PathKey[],
  { draft }: Sense,
): PlacedFault[] {
  const faults: PlacedFault[] = []
  const tell = (key: string, fault: Fault) => faults.push({ at: [...at, key], ...fault })
  if (metric === 'emission_transmittance' && draft.panel?.kind === 'metal') tell('metric', noEmission())
  if (metric === 'ambient_contrast') {
    if (draft.emission?.luminance === 0) tell('metric', noLuminance())
    if (illuminance === undefined && draft.ambient?.length === 0) tell('metric', noIlluminance())
  } else if (illuminance !== undefined) tell('illuminance', strayIlluminance(metric))
  return faults
}

function noEmission(): Fault {
  const next = 'use a mirror panel, or another metric'
  const message = 'a metal half-space emits nothing'
  return { code: 'not_applicable', message, received: 'emission_transmittance', next }
}

function noLuminance(): Fault {
  const message = 'the contrast needs the luminance of the screen'
  return { code: 'not_applicable', message, received: 'ambient_contrast', next: 'state emission.luminance' }
}

function noIlluminance(): Fault {
  const message = 'the contrast needs an illuminance'
  return { code: 'not_applicable', message, received: 'ambient_contrast', next: 'add illuminance here, or ambient' }
}

function strayIlluminance(metric: MetricName): Fault {
  const message = `${metric} does not depend on the illuminance`
  return { code: 'not_applicable', message, allowed: 'illuminance with ambient_contrast alone', next: 'remove it' }
}

function quantileFaults(quantile: number | undefined, at: readonly PathKey[], { raw }: Sense): PlacedFault[] {
  if (quantile === undefined) return valueAt(raw, [...at, 'under']) === undefined ? [] : [strayUnder(at)]
  if (valueAt(raw, ['tolerance']) !== undefined) return []
  const message = 'a quantile needs spreads to be drawn from'
  return [{ at: [...at, 'quantile'], code: 'missing_key', message, next: 'add tolerance with the spreads' }]
}

function strayUnder(at: readonly PathKey[]): PlacedFault {
  const message = 'under means nothing without a quantile'
  const next = 'add quantile, such as 95 %, or remove under'
  return { at: [...at, 'under'], code: 'not_applicable', message, allowed: 'under together with quantile', next }
}
