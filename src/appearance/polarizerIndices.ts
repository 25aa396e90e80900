/**
 * A polarizer as a uniaxial absorber: the absorption axis carries n + i k2, the other two axes n + i k1, with
 * k = -λ ln T/(4π d) from the internal principal transmittances T1 (transmission axis) and T2 (absorption axis).
 *
 * The trade's single transmittance Ts and polarization efficiency P are measured in air: K1 = Ts (1 + P),
 * K2 = Ts (1 - P), and with the face reflectance ρ = ((n - 1)/(n + 1))² the internal T solves K = (1 - ρ)² T/(1 - ρ² T²).
 */
import { spectrumAt } from '../materials/spectrumAt.js'
import type { IndexSpectrum } from '../optics/opticalLayer.js'
import type { PolarizerLayer, Spectrum } from '../stack/stack.js'

/** Indices of the absorption axis and of the other two; the film's own index gives n (its k is not used). */
export function polarizerIndices(
  layer: PolarizerLayer,
  index: IndexSpectrum,
  wavelengthsNm: Float64Array,
): { absorption: IndexSpectrum; transmission: IndexSpectrum } {
  const [t1, t2] = internalTransmittances(layer, index.n, wavelengthsNm)
  const extinction = (t: Float64Array) =>
    t.map((value, i) =>
      // A film of no thickness passes everything.
      layer.thickness > 0 ? (-wavelengthsNm[i] * Math.log(value)) / (4 * Math.PI * layer.thickness) : 0,
    )
  return {
    absorption: { n: index.n, k: extinction(t2) },
    transmission: { n: index.n, k: extinction(t1) },
  }
}

/** Internal principal transmittances [T1, T2] over wavelength, fractions; `n` is the film's index. */
export function internalTransmittances(
  layer: PolarizerLayer,
  n: Float64Array,
  wavelengthsNm: Float64Array,
): [Float64Array, Float64Array] {
  const at = (spectrum: Spectrum | undefined) => spectrumAt(spectrum ?? 1, wavelengthsNm)
  if (layer.transmission_axis_transmittance !== undefined) {
    return [at(layer.transmission_axis_transmittance), at(layer.absorption_axis_transmittance)]
  }
  if (layer.k1 !== undefined) {
    return [
      at(layer.k1).map((k1, i) => internalFromAir(k1, n[i])),
      at(layer.k2).map((k2, i) => internalFromAir(k2, n[i])),
    ]
  }
  const ts = at(layer.single_transmittance)
  const efficiency = at(layer.polarization_efficiency)
  return [
    ts.map((value, i) => internalFromAir(value * (1 + efficiency[i]), n[i])),
    ts.map((value, i) => internalFromAir(value * (1 - efficiency[i]), n[i])),
  ]
}

/** Least internal transmittance taken: ln 0 has no k. */
export const SMALLEST_TRANSMITTANCE = 1e-12

/**
 * T of K = (1 - ρ)² T/(1 - ρ² T²): the positive root of ρ² K T² + (1 - ρ)² T - K = 0, written so that nothing cancels.
 * Above 1 where the faces cannot give K (refused when the file is read; a search that strays there is held at 1).
 */
function internalFromAir(k: number, n: number): number {
  const rho = ((n - 1) / (n + 1)) ** 2
  const b = (1 - rho) ** 2
  const t = (2 * k) / (b + Math.sqrt(b * b + 4 * rho * rho * k * k))
  return Math.min(1, Math.max(SMALLEST_TRANSMITTANCE, t))
}
