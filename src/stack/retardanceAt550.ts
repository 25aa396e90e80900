import { interpolateLinear } from '../numeric/interpolate.js'
import type { RetarderLayer } from './stack.js'

/** Wavelength at which Re and Rth are quoted, nm (common practice, no source). */
export const REFERENCE_NM = 550

/** Re at 550 nm, nm. */
export function retardanceAt550({ retardance }: Pick<RetarderLayer, 'retardance'>): number {
  if (typeof retardance === 'number') return retardance
  return interpolateLinear(retardance.wavelength_nm, retardance.value, REFERENCE_NM)
}

/** Rth at 550 nm, nm, from whichever of rth and nz the film is described by. */
export function rthAt550(layer: Pick<RetarderLayer, 'retardance' | 'rth' | 'nz'>): number {
  return layer.rth ?? retardanceAt550(layer) * ((layer.nz ?? 1) - 0.5)
}
