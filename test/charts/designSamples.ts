import type { OffStateColorData } from '../../src/charts/offStateColor.js'
import { METRIC_QUANTITIES } from '../../src/charts/quantity.js'
import type { ReflectanceSpectrumData } from '../../src/charts/reflectanceSpectrum.js'
import type { SearchProgressData } from '../../src/charts/searchProgress.js'
import type { ViewingConeData } from '../../src/charts/viewingCone.js'
import { DEGREE, steps } from './steps.js'

/** Invented data, shaped like the studies' answers; no display was measured or computed. */

const wavelengthNm = steps(380, 780, 5)
const bell = (nm: number, center: number, width: number): number => Math.exp(-(((nm - center) / width) ** 2))

/** Bell curves roughly where the color-matching functions have their maxima: enough to color the strip. */
const lightXyz = wavelengthNm.map(
  (nm) => [bell(nm, 599, 54) + 0.36 * bell(nm, 442, 28), bell(nm, 556, 62), 1.78 * bell(nm, 449, 34)] as const,
)

export const reflectanceSpectrumData: ReflectanceSpectrumData = {
  title: 'Invented dive computer',
  direction: { thetaRad: 0, phiRad: 0 },
  wavelengthNm,
  designs: [
    {
      name: 'before',
      reflectance: wavelengthNm.map((nm) => 0.047 + 0.05 * ((nm - 560) / 180) ** 2 + 0.12 * bell(nm, 380, 40)),
      luminousReflectance: 0.0502,
      colorWeightedReflectance: 0.0614,
    },
    {
      name: 'after',
      reflectance: wavelengthNm.map((nm) => 0.0425 + 0.013 * ((nm - 540) / 180) ** 2 + 0.05 * bell(nm, 380, 30)),
      luminousReflectance: 0.0431,
      colorWeightedReflectance: 0.0452,
    },
  ],
  frontReflectance: wavelengthNm.map((nm) => 0.0352 + 1200 / nm ** 2),
  weighting: { name: 'ȳ · D65, weighting (no scale)', value: lightXyz.map(([, y]) => y) },
  lightXyz,
}

export const offStateColorData: OffStateColorData = {
  title: 'Invented dive computer: color of the off-state',
  notes: ['CIELAB, D65, 2° observer'],
  limitChroma: 6,
  points: [
    { label: 'θ 0°', before: [7.9, -11.2], after: [1.1, -2.4] },
    { label: 'θ 30°, φ 0°', before: [8.6, -9.4], after: [1.9, -2.9] },
    { label: 'θ 45°, φ 0°', before: [9.8, -6.1], after: [3.1, -3.3] },
    { label: 'θ 45°, φ 90°', before: [3.4, -12.7], after: [-1.6, -4.0] },
    { label: 'θ 60°, φ 45°', before: [12.1, 1.8], after: [4.4, 1.2] },
  ],
}

export const searchProgressData: SearchProgressData = {
  title: 'Invented dive computer: search for the darkest laminate',
  objective: METRIC_QUANTITIES.color_weighted_reflectance,
  evaluations: [1, 20, 64, 130, 260, 420, 700, 1100, 1900, 3200],
  best: [0.38, 0.22, 0.12, 0.094, 0.071, 0.058, 0.0491, 0.0457, 0.0453, 0.0452],
  start: 0.38,
  families: [
    { label: 'design 1', objective: 0.0452 },
    { label: 'design 2', objective: 0.0453 },
    { label: 'design 3', objective: 0.0459 },
    { label: 'design 4', objective: 0.0466 },
  ],
}

const thetaRad = steps(0, 80, 5).map((t) => t * DEGREE)
const phiRad = steps(0, 345, 15).map((p) => p * DEGREE)
export const viewingConeData: ViewingConeData = {
  title: 'Invented dive computer: luminous reflectance from every direction',
  quantity: METRIC_QUANTITIES.luminous_reflectance,
  field: {
    thetaRad,
    phiRad,
    values: thetaRad.map((t) =>
      phiRad.map(
        (p) => 0.043 + 0.09 * Math.sin(t) ** 4 * (1 + 0.7 * Math.cos(2 * (p - 0.6))) + 0.02 * Math.sin(t) ** 2,
      ),
    ),
  },
}
