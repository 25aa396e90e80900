import { createMedium, type Medium, type OpticalLayer, type PanelEnd } from '../../src/optics/opticalLayer.js'

/** The laminates of the speed figures: two, eleven and twenty layers; invented values. */
export interface BenchStack {
  readonly name: string
  readonly layers: readonly OpticalLayer[]
  readonly panel: PanelEnd
  /** A thick film whose angle or retardance the searches move. */
  readonly film: number
}

export function benchStacks(wavelengthsNm: Float64Array): BenchStack[] {
  const flat = (value: number) => new Float64Array(wavelengthsNm.length).fill(value)
  const index = (n: number, k = 0) => ({ n: flat(n), k: flat(k) })
  const isotropic = (n: number) => createMedium(index(n), index(n), index(n))
  const polarizer = createMedium(index(1.5, 0.002), index(1.5, 1e-5), index(1.5, 1e-5))
  const layer = (medium: Medium, thicknessNm: number, azimuthDeg = 0): OpticalLayer => ({
    medium,
    azimuthRad: (azimuthDeg * Math.PI) / 180,
    tiltRad: 0,
    thicknessNm,
    coherent: thicknessNm < 5000,
  })
  const retarder = (birefringence: number, thicknessNm: number, azimuthDeg: number) =>
    layer(createMedium(index(1.55 + birefringence), index(1.55), index(1.55)), thicknessNm, azimuthDeg)
  const adhesive = () => layer(isotropic(1.475), 15000)
  const panel: PanelEnd = { kind: 'mirror', index: flat(1.7), reflectance: flat(0.45), depolarized: flat(0.01) }
  const eleven = [
    layer(isotropic(1.36), 90),
    layer(isotropic(1.51), 6000),
    layer(isotropic(1.48), 40000),
    layer(polarizer, 12000, 90),
    adhesive(),
    retarder(0.0055, 25000, 45),
    adhesive(),
    retarder(0.09, 1300, 75),
    retarder(0.1, 700, 15),
    adhesive(),
    layer(isotropic(1.7), 800),
  ]
  const films = Array.from({ length: 8 }, (_, k) => [retarder(0.005, 25000, 20 * k), adhesive()]).flat()
  return [
    { name: 'two layers', layers: [layer(polarizer, 12000, 90), retarder(0.0055, 25000, 45)], panel, film: 1 },
    { name: 'eleven layers', layers: eleven, panel, film: 5 },
    { name: 'twenty layers', layers: [...eleven.slice(0, 4), ...films], panel, film: 8 },
  ]
}

/** A retarder's medium with another birefringence: what a search for its retardance makes anew each time. */
export function retarderMedium(wavelengthsNm: Float64Array, birefringence: number): Medium {
  const flat = (value: number) => ({
    n: new Float64Array(wavelengthsNm.length).fill(value),
    k: new Float64Array(wavelengthsNm.length),
  })
  return createMedium(flat(1.55 + birefringence), flat(1.55), flat(1.55))
}
