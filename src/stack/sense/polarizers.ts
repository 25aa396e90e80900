/**
 * Whether a polarizer's faces can give what was measured in air: K = (1-ρ)² T/(1-ρ² T²) rises with T and is (1-ρ)/(1+ρ) at
 * T = 1, so that K must lie above 0 and at most there.
 */
import { indexAt } from '../../materials/indexAt.js'
import { spectrumAt } from '../../materials/spectrumAt.js'
import { formatQuantity } from '../../units/quantity.js'
import type { Fault, PlacedFault } from '../fault.js'
import type { PolarizerLayer } from '../stack.js'
import { wavelengthsOf } from '../wavelengths.js'
import type { Sense } from './sense.js'

export function polarizerFaults({ draft }: Sense): PlacedFault[] {
  const { conditions } = draft
  if (conditions === undefined) return []
  const wavelengths = wavelengthsOf(conditions)
  return draft.layers.flatMap((layer, i): PlacedFault[] => {
    if (layer?.kind !== 'polarizer') return []
    const found = faultOf(layer, wavelengths)
    return found === undefined ? [] : [{ at: ['layers', i, found.field], ...found.fault }]
  })
}

interface FieldFault {
  readonly field: keyof PolarizerLayer
  readonly fault: Fault
}

function faultOf(layer: PolarizerLayer, wavelengths: Float64Array): FieldFault | undefined {
  const inside = layer.transmission_axis_transmittance !== undefined
  const fields = inside
    ? (['transmission_axis_transmittance', 'absorption_axis_transmittance'] as const)
    : layer.k1 !== undefined
      ? (['k1', 'k2'] as const)
      : (['single_transmittance', 'polarization_efficiency'] as const)
  const [first, second] = fields.map((field) => spectrumAt(layer[field] ?? Number.NaN, wavelengths))
  const isPair = fields[0] === 'single_transmittance'
  const along = isPair ? first.map((ts, i) => ts * (1 + second[i])) : first
  const across = isPair ? first.map((ts, i) => ts * (1 - second[i])) : second
  const most = inside ? undefined : mostInAir(layer, wavelengths)
  for (let i = 0; i < wavelengths.length; i++) {
    const nm = wavelengths[i]
    if (most !== undefined && along[i] > most[i])
      return { field: fields[0], fault: tooClear(nm, along[i], most[i], isPair) }
    if (!inside && across[i] <= 0) return { field: fields[1], fault: perfect(nm, isPair) }
    if (across[i] > along[i]) return { field: fields[1], fault: exchanged(nm) }
  }
  return undefined
}

/** Largest transmittance of a clear film of this index in air. */
function mostInAir({ index }: PolarizerLayer, wavelengths: Float64Array): Float64Array {
  return indexAt(index, wavelengths).n.map((n) => {
    const rho = ((n - 1) / (n + 1)) ** 2
    return (1 - rho) / (1 + rho)
  })
}

const percent = (share: number) => formatQuantity(share, 'share', 4)

function tooClear(nm: number, k1: number, most: number, isPair: boolean): Fault {
  return {
    code: 'faces',
    message: `the faces of the film alone reflect more than this leaves (at ${nm} nm)`,
    received: `K1 = ${percent(k1)} along the transmission axis`,
    allowed: `at most ${percent(most)} for this index, as the two faces reflect the rest`,
    next: isPair
      ? 'lower single_transmittance, or give internal transmittances'
      : 'lower k1, or give internal transmittances',
  }
}

function perfect(nm: number, isPair: boolean): Fault {
  return {
    code: 'faces',
    message: `nothing passes along the absorption axis at ${nm} nm, which no film of finite absorption gives`,
    received: isPair ? 'a polarization efficiency of 100 %' : 'k2 = 0',
    allowed: isPair ? 'below 100 %, such as 99.99 %' : 'above 0, such as 0.005 %',
    next: 'state the leakage the film has',
  }
}

function exchanged(nm: number): Fault {
  return {
    code: 'out_of_range',
    message: `more passes along the absorption axis than along the transmission axis at ${nm} nm`,
    next: 'exchange the two, or turn the axis by 90 deg',
  }
}
