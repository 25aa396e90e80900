/**
 * A retardation film from its trade parameters: Re, Rth (or Nz), thickness d, mean index n̄, dispersion g.
 *
 *   Re = (nx - ny) d,  Rth = ((nx + ny)/2 - nz) d,  Nz = (nx - nz)/(nx - ny) = Rth/Re + ½,  all at 550 nm;
 *   Δ = Re g/d,  δ = Rth g/d + Δ/2:  nx = n̄ + (Δ + δ)/3,  ny = nx - Δ,  nz = nx - δ   (the mean of the three is n̄).
 */
import { interpolateLinear } from '../numeric/interpolate.js'
import type { IndexSpectrum } from '../optics/opticalLayer.js'
import { REFERENCE_NM, retardanceAt550, rthAt550 } from '../stack/retardanceAt550.js'
import type { RetarderLayer } from '../stack/stack.js'

/** nx, ny, nz over wavelength; `meanIndex` is n̄, its k is that of all three axes. */
export function retarderIndices(
  layer: RetarderLayer,
  meanIndex: IndexSpectrum,
  wavelengthsNm: Float64Array,
): [IndexSpectrum, IndexSpectrum, IndexSpectrum] {
  const count = wavelengthsNm.length
  const re = retardanceAt550(layer)
  const rth = rthAt550(layer)
  const g = dispersionAt(layer, wavelengthsNm)
  const nx = new Float64Array(count)
  const ny = new Float64Array(count)
  const nz = new Float64Array(count)
  for (let i = 0; i < count; i++) {
    // A film of no thickness has no retardance to speak of.
    const perThickness = layer.thickness > 0 ? g[i] / layer.thickness : 0
    const delta = re * perThickness
    const out = rth * perThickness + delta / 2
    nx[i] = meanIndex.n[i] + (delta + out) / 3
    ny[i] = nx[i] - delta
    nz[i] = nx[i] - out
  }
  const k = meanIndex.k
  return [
    { n: nx, k },
    { n: ny, k },
    { n: nz, k },
  ]
}

/** g(λ) = Re(λ)/Re(550): 1 when flat. */
function dispersionAt(layer: RetarderLayer, wavelengthsNm: Float64Array): Float64Array {
  const { retardance, dispersion } = layer
  const table = typeof retardance === 'number' ? dispersion : retardance
  if (table === undefined) return new Float64Array(wavelengthsNm.length).fill(1)
  if ('re450' in table) return threePointDispersion(table.re450, table.re650, wavelengthsNm)
  const reference = interpolateLinear(table.wavelength_nm, table.value, REFERENCE_NM)
  return wavelengthsNm.map((nm) => interpolateLinear(table.wavelength_nm, table.value, nm) / reference)
}

/** g = a + b/λ² + c/λ⁴ exactly through (450, re450), (550, 1), (650, re650). */
function threePointDispersion(re450: number, re650: number, wavelengthsNm: Float64Array): Float64Array {
  const u = (nm: number) => (REFERENCE_NM / nm) ** 2
  const [u450, u650] = [u(450), u(650)]
  // Newton's form in u = (550/λ)², nodes 1, u450, u650.
  const first = (re450 - 1) / (u450 - 1)
  const second = ((re650 - 1) / (u650 - 1) - first) / (u650 - u450)
  return wavelengthsNm.map((nm) => {
    const x = u(nm)
    return 1 + (x - 1) * (first + (x - u450) * second)
  })
}
