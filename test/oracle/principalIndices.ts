/** From the trade parameters of a film to the complex indices n + ik along its three principal axes. */
import { add, type Complex, real } from './complex.js'
import { solveLinear } from './complexMatrix.js'
import { indexAt, lengthNm, spectrumAt } from './quantities.js'
import type { PlainLayer, PlainPolarizer, PlainRetarder, PlainSpectrum } from './stackFile.js'

/** Trade values of retardance hold at this wavelength. */
const REFERENCE_NM = 550

type Principal = readonly [Complex, Complex, Complex]

/**
 * First, second, third axis. The first is the slow axis of a retarder and the absorption axis of a polarizer; the
 * third is the normal of the film where nothing is tilted.
 */
export function principalIndices(layer: PlainLayer, wavelengthNm: number): Principal {
  switch (layer.kind) {
    case 'isotropic': {
      const n = indexAt(layer.index, wavelengthNm)
      return [n, n, n]
    }
    case 'crystal': {
      const [first, second, third] = layer.indices.map((index) => indexAt(index, wavelengthNm))
      return [first, second, third]
    }
    case 'retarder':
      return retarderIndices(layer, wavelengthNm)
    case 'polarizer':
      return polarizerIndices(layer, wavelengthNm)
  }
}

/** Re = (nx − ny) d, Rth = ((nx + ny)/2 − nz) d, mean of the three = the given index. */
function retarderIndices(layer: PlainRetarder, wavelengthNm: number): Principal {
  const thickness = lengthNm(layer.thickness)
  const reAtReference = spectrumAt(layer.retardance, REFERENCE_NM)
  const rthAtReference = layer.rth === undefined ? reAtReference * ((layer.nz ?? 1) - 0.5) : lengthNm(layer.rth)
  const g = dispersionAt(layer, wavelengthNm)
  const inPlane = (reAtReference * g) / thickness
  const outOfPlane = (rthAtReference * g) / thickness
  // nx − ny = inPlane, (nx + ny)/2 − nz = outOfPlane, nx + ny + nz = 3 · mean
  const [[nx], [ny], [nz]] = solveLinear(
    [
      [real(1), real(-1), real(0)],
      [real(0.5), real(0.5), real(-1)],
      [real(1), real(1), real(1)],
    ],
    [[real(inPlane)], [real(outOfPlane)], [real(0)]],
  )
  const mean = indexAt(layer.index, wavelengthNm)
  return [add(mean, nx), add(mean, ny), add(mean, nz)]
}

/** Re(λ)/Re(550 nm). */
function dispersionAt(layer: PlainRetarder, wavelengthNm: number): number {
  if (typeof layer.retardance === 'object') return relative(layer.retardance, wavelengthNm)
  const { dispersion } = layer
  if (dispersion === undefined) return 1
  if ('value' in dispersion) return relative(dispersion, wavelengthNm)
  const powers = (nm: number) => [real(1), real(nm ** -2), real(nm ** -4)]
  const [[a], [b], [c]] = solveLinear(
    [powers(450), powers(REFERENCE_NM), powers(650)],
    [[real(dispersion.re450)], [real(1)], [real(dispersion.re650)]],
  )
  return a.re + b.re * wavelengthNm ** -2 + c.re * wavelengthNm ** -4
}

const relative = (table: PlainSpectrum, wavelengthNm: number): number =>
  spectrumAt(table, wavelengthNm) / spectrumAt(table, REFERENCE_NM)

/** k = −λ ln T / (4π d), of the internal transmittance along each axis. */
function polarizerIndices(layer: PlainPolarizer, wavelengthNm: number): Principal {
  const n = indexAt(layer.index, wavelengthNm)
  const { alongTransmission, alongAbsorption } = internalTransmittances(layer, wavelengthNm, n.re)
  const k = (t: number) => (-wavelengthNm * Math.log(t)) / (4 * Math.PI * lengthNm(layer.thickness))
  const transmitting: Complex = { re: n.re, im: k(alongTransmission) }
  return [{ re: n.re, im: k(alongAbsorption) }, transmitting, transmitting]
}

function internalTransmittances(layer: PlainPolarizer, wavelengthNm: number, n: number) {
  const at = (spectrum: PlainSpectrum | undefined): number => {
    if (spectrum === undefined) throw new Error(`polarizer ${layer.id}: one of its two transmittances is missing`)
    return spectrumAt(spectrum, wavelengthNm)
  }
  if (layer.transmission_axis_transmittance !== undefined)
    return {
      alongTransmission: at(layer.transmission_axis_transmittance),
      alongAbsorption: at(layer.absorption_axis_transmittance),
    }
  if (layer.k1 !== undefined)
    return { alongTransmission: withoutFaces(at(layer.k1), n), alongAbsorption: withoutFaces(at(layer.k2), n) }
  const single = at(layer.single_transmittance)
  const efficiency = at(layer.polarization_efficiency)
  return {
    alongTransmission: withoutFaces(single * (1 + efficiency), n),
    alongAbsorption: withoutFaces(single * (1 - efficiency), n),
  }
}

/** The T in (0, 1] with K = (1 − ρ)² T / (1 − ρ² T²), found by halving: K grows with T. */
function withoutFaces(inAir: number, n: number): number {
  const rho = ((n - 1) / (n + 1)) ** 2
  const inAirOf = (t: number) => ((1 - rho) ** 2 * t) / (1 - (rho * t) ** 2)
  if (inAir > inAirOf(1)) throw new Error(`the faces allow at most ${inAirOf(1)}, not ${inAir}`)
  let [low, high] = [0, 1]
  for (;;) {
    const middle = (low + high) / 2
    if (middle === low || middle === high) return high
    if (inAirOf(middle) < inAir) low = middle
    else high = middle
  }
}
