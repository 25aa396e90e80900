import type { Quantity } from '../charts/quantity.js'
import { displayUnit, type QuantityKind } from '../units/quantity.js'

/** How a parameter is shown whose values are those of a study: nm, degrees, fractions. */
export function axisQuantity(path: string, kind: QuantityKind): Quantity {
  const unit = kind === 'angle' ? '°' : displayUnit(kind)
  return { label: path, unit, factor: kind === 'share' ? 100 : 1 }
}
