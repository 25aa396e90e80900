import fc from 'fast-check'
import {
  createMedium,
  type IndexSpectrum,
  type Medium,
  type OpticalLayer,
  type PanelEnd,
} from '../../src/optics/opticalLayer.js'

/** Wavelengths of the random-stack tests, nm. */
export const WAVELENGTHS_NM = Float64Array.from([380, 437, 550, 633, 780])

/** One layer as plain numbers: [n, k] of each principal axis, radians, nm. */
export interface PlainLayer {
  readonly axes: readonly [readonly [number, number], readonly [number, number], readonly [number, number]]
  readonly azimuthRad: number
  readonly tiltRad: number
  readonly thicknessNm: number
  readonly coherent: boolean
}

export type PlainPanel =
  | { readonly kind: 'mirror'; readonly index: number; readonly reflectance: number; readonly depolarized: number }
  | { readonly kind: 'metal'; readonly index: readonly [number, number] }

export interface PlainStack {
  readonly layers: readonly PlainLayer[]
  readonly panel: PlainPanel
  readonly thetaRad: number
  readonly phiRad: number
}

export function opticalLayer(layer: PlainLayer, wavelengthsNm = WAVELENGTHS_NM): OpticalLayer {
  const [a, b, c] = layer.axes.map(([n, k]) => constantIndex(n, k, wavelengthsNm.length))
  return { ...layer, medium: createMedium(a, b, c) }
}

export function panelEnd(panel: PlainPanel, wavelengthsNm = WAVELENGTHS_NM): PanelEnd {
  const count = wavelengthsNm.length
  if (panel.kind === 'metal') return { kind: 'metal', medium: isotropicMedium(panel.index[0], panel.index[1], count) }
  const constant = (value: number) => new Float64Array(count).fill(value)
  return {
    kind: 'mirror',
    index: constant(panel.index),
    reflectance: constant(panel.reflectance),
    depolarized: constant(panel.depolarized),
  }
}

function isotropicMedium(n: number, k: number, count: number): Medium {
  const index = constantIndex(n, k, count)
  return createMedium(index, index, index)
}

function constantIndex(n: number, k: number, count: number): IndexSpectrum {
  return { n: new Float64Array(count).fill(n), k: new Float64Array(count).fill(k) }
}

const real = (min: number, max: number) => fc.double({ min, max, noNaN: true })

const extinction = (lossy: boolean) => (lossy ? fc.oneof(fc.constant(0), real(0, 0.002)) : fc.constant(0))

function index(lossy: boolean): fc.Arbitrary<[number, number]> {
  return fc.tuple(real(1.35, 1.9), extinction(lossy))
}

/** Isotropic, film with axes in and along the normal, or tilted crystal; coherent or thick. */
function layer(lossy: boolean): fc.Arbitrary<PlainLayer> {
  const axes = fc.oneof(
    index(lossy).map((i): PlainLayer['axes'] => [i, i, i]),
    fc.tuple(index(lossy), real(-0.02, 0.02), real(-0.02, 0.02)).map(([[n, k], dy, dz]): PlainLayer['axes'] => [
      [n, k],
      [n + dy, k],
      [n + dz, k],
    ]),
    fc.tuple(index(lossy), index(lossy), index(lossy)),
  )
  const angle = real(-Math.PI, Math.PI)
  const tiltRad = fc.oneof(fc.constant(0), real(-Math.PI / 2, Math.PI / 2))
  return fc.tuple(axes, angle, tiltRad, fc.boolean(), real(0, 1)).map(([a, azimuthRad, tilt, coherent, u]) => ({
    axes: a,
    azimuthRad,
    tiltRad: tilt,
    coherent,
    thicknessNm: coherent ? 20 + 2000 * u : 5000 + 60000 * u,
  }))
}

function panel(lossy: boolean): fc.Arbitrary<PlainPanel> {
  const mirror = fc
    .tuple(real(1.3, 1.9), lossy ? real(0, 1) : fc.constant(1), real(0, 1))
    .map(([n, reflectance, depolarized]): PlainPanel => ({ kind: 'mirror', index: n, reflectance, depolarized }))
  const metal = fc.tuple(real(0.3, 2), real(2, 8)).map(([n, k]): PlainPanel => ({ kind: 'metal', index: [n, k] }))
  return lossy ? fc.oneof(mirror, metal) : mirror
}

/** Seeded random stacks of 0 to 7 layers; lossless ones end in an ideal mirror. */
export function randomStack(lossy: boolean): fc.Arbitrary<PlainStack> {
  return fc
    .tuple(
      fc.array(layer(lossy), { maxLength: 7 }),
      panel(lossy),
      fc.oneof(fc.constant(0), real(0, (85 * Math.PI) / 180)),
      real(-Math.PI, Math.PI),
    )
    .map(([layers, end, thetaRad, phiRad]) => ({ layers, panel: end, thetaRad, phiRad }))
}
