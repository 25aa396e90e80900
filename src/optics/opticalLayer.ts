/**
 * What the optics work on: numbers over wavelength, no file, no name. A `Medium` is immutable, so its identity stands
 * for its content: the solver keeps a layer's matrices while medium, angles and thickness are the same.
 */
export interface Medium {
  /**
   * Principal relative permittivities over wavelength, `6 n` numbers, component after component:
   * Re ε1, Im ε1, Re ε2, Im ε2, Re ε3, Im ε3 (axis 1 at the layer's azimuth, axis 2 in the film across it, axis 3 along
   * the normal when untilted).
   */
  readonly permittivity: Float64Array
  /** ε1 = ε2 at every wavelength: an untilted layer acts alike at every azimuth. */
  readonly inPlaneIsotropic: boolean
  /** All three equal: tilt means nothing. */
  readonly isotropic: boolean
}

export interface OpticalLayer {
  readonly medium: Medium
  /** Azimuth of axis 1 in the display frame, rad. */
  readonly azimuthRad: number
  /** Elevation of axis 1 out of the film plane towards the viewer, rad. */
  readonly tiltRad: number
  readonly thicknessNm: number
  /** Joined to its neighbors by amplitudes (true) or by intensities (false, a thick layer). */
  readonly coherent: boolean
}

export interface MirrorEnd {
  readonly kind: 'mirror'
  /** Lossless immersion index over wavelength, n numbers >= 1. */
  readonly index: Float64Array
  /** Reflectance of the mirror over wavelength, fractions. */
  readonly reflectance: Float64Array
  /** Share of it that returns unpolarized, fractions over wavelength. */
  readonly depolarized: Float64Array
}

export interface MetalEnd {
  readonly kind: 'metal'
  readonly medium: Medium
}

/** Immutable, like a medium. */
export type PanelEnd = MirrorEnd | MetalEnd

/** One complex index over wavelength for each principal axis; pass the same object thrice for an isotropic medium. */
export interface IndexSpectrum {
  readonly n: Float64Array
  readonly k: Float64Array
}

export function createMedium(axis1: IndexSpectrum, axis2: IndexSpectrum, axis3: IndexSpectrum): Medium {
  const count = axis1.n.length
  const permittivity = new Float64Array(6 * count)
  const axes = [axis1, axis2, axis3]
  for (let axis = 0; axis < 3; axis++) {
    const { n, k } = axes[axis]
    for (let i = 0; i < count; i++) {
      permittivity[2 * axis * count + i] = n[i] * n[i] - k[i] * k[i]
      permittivity[(2 * axis + 1) * count + i] = 2 * n[i] * k[i]
    }
  }
  const inPlaneIsotropic = sameAxes(permittivity, count, 0, 1)
  return { permittivity, inPlaneIsotropic, isotropic: inPlaneIsotropic && sameAxes(permittivity, count, 1, 2) }
}

function sameAxes(permittivity: Float64Array, count: number, axisA: number, axisB: number): boolean {
  for (let i = 0; i < 2 * count; i++) {
    if (permittivity[2 * axisA * count + i] !== permittivity[2 * axisB * count + i]) return false
  }
  return true
}
