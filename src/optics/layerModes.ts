/**
 * What a layer needs to be joined to its neighbors: admittance and one-pass propagator of the waves going in and of
 * those coming back, in the tangential field of the solver frame (x' in the plane of incidence, y' across it).
 * Each is a complex 2×2 over wavelength, `8 n` numbers, component after component (row-major, re then im).
 */
export interface LayerModes {
  /** Off-diagonal elements are zero throughout: p and s do not mix. */
  diagonal: boolean
  /** Waves going in and coming back are not mirror images; otherwise `yBack` is -y, `pBack` is p, and both are unused. */
  tilted: boolean
  /** H = Y E of the waves going into the panel. */
  readonly y: Float64Array
  /** E(d) = P E(0) of the waves going in. */
  readonly p: Float64Array
  /** H = yBack E of the waves coming back. */
  readonly yBack: Float64Array
  /** E(0) = pBack E(d) of the waves coming back. */
  readonly pBack: Float64Array
}

export function createLayerModes(count: number): LayerModes {
  return {
    diagonal: true,
    tilted: false,
    y: new Float64Array(8 * count),
    p: new Float64Array(8 * count),
    yBack: new Float64Array(8 * count),
    pBack: new Float64Array(8 * count),
  }
}
