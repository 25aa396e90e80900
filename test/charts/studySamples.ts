import type { BudgetBarsData } from '../../src/charts/budgetBars.js'
import type { EllipseRowData } from '../../src/charts/ellipseRow.js'
import type { EyewearRollData } from '../../src/charts/eyewearRoll.js'
import type { HistogramData } from '../../src/charts/histogram.js'
import type { ParetoFrontData } from '../../src/charts/paretoFront.js'
import type { PoincareData } from '../../src/charts/poincare.js'
import { DEGREES, METRIC_QUANTITIES, NANOMETERS } from '../../src/charts/quantity.js'
import type { ResidualsData } from '../../src/charts/residuals.js'
import type { SensitivityBarsData } from '../../src/charts/sensitivityBars.js'
import type { SweepLinesData } from '../../src/charts/sweepLines.js'
import type { SweepMapData } from '../../src/charts/sweepMap.js'
import { DEGREE, steps } from './steps.js'

/** Invented data, shaped like the studies' answers; no display was measured or computed. */

const slowAxisRad = steps(35, 55, 1).map((deg) => deg * DEGREE)
const retardanceNm = steps(120, 156, 3)
const bowl = (axisRad: number, nm: number): number =>
  0.0425 + 0.55 * Math.sin(2 * (axisRad - 44.2 * DEGREE)) ** 2 + 0.9 * ((nm - 138) / 138) ** 2

export const sweepMapData: SweepMapData = {
  title: 'Invented dive computer: two films turned and stretched',
  x: { quantity: { label: 'quarter.slow_axis', ...DEGREES }, values: slowAxisRad },
  y: { quantity: { label: 'quarter.retardance', ...NANOMETERS }, values: retardanceNm },
  metric: METRIC_QUANTITIES.luminous_reflectance,
  values: retardanceNm.map((nm) => slowAxisRad.map((rad) => bowl(rad, nm))),
  current: { x: 45 * DEGREE, y: 144 },
}

export const sweepLinesData: SweepLinesData = {
  title: 'Invented dive computer: turning the quarter-wave film',
  parameter: { label: 'quarter.slow_axis', ...DEGREES },
  values: slowAxisRad,
  current: 45 * DEGREE,
  metrics: [
    {
      name: 'luminous reflectance, θ 0°',
      quantity: METRIC_QUANTITIES.luminous_reflectance,
      values: slowAxisRad.map((rad) => bowl(rad, 141)),
      limit: 0.05,
    },
    {
      name: 'luminous reflectance, θ 45°, φ 90°',
      quantity: METRIC_QUANTITIES.luminous_reflectance,
      values: slowAxisRad.map((rad) => bowl(rad + 2 * DEGREE, 128)),
    },
    {
      name: 'chroma, θ 0°',
      quantity: METRIC_QUANTITIES.chroma,
      values: slowAxisRad.map((rad) => 2.5 + 0.3 * Math.abs(rad / DEGREE - 43)),
      limit: 6,
    },
  ],
}

const binEdges = steps(0.042, 0.054, 0.0004)
export const histogramData: HistogramData = {
  title: 'Invented dive computer: what production will measure',
  notes: ['2000 samples; yield 96.1 % (95 % interval 95.1 to 96.9 %)'],
  metric: METRIC_QUANTITIES.luminous_reflectance,
  edges: binEdges,
  counts: binEdges.slice(1).map((edge) => Math.round(420 * Math.exp(-(((edge - 0.0458) / 0.0024) ** 2)) + 3)),
  percentiles: { p05: 0.0432, p50: 0.0457, p95: 0.0494 },
  limit: { max: 0.05 },
}

const share = (value: number, half: number) => ({ value, low: value - half, high: value + half })
export const sensitivityBarsData: SensitivityBarsData = {
  title: 'Invented dive computer: which spread makes the scatter',
  parameters: [
    { name: 'quarter.slow_axis', firstOrder: share(0.52, 0.04), total: share(0.58, 0.05) },
    { name: 'quarter.retardance', firstOrder: share(0.24, 0.03), total: share(0.31, 0.04) },
    { name: 'polarizer.absorption_axis', firstOrder: share(0.09, 0.03), total: share(0.13, 0.03) },
    { name: 'half.retardance', firstOrder: share(0.01, 0.02), total: share(0.02, 0.02) },
  ],
}

const directions: readonly (readonly [string, number])[] = [
  ['θ 8°, φ 0°', 0],
  ['θ 45°, φ 0°', 0.006],
  ['θ 45°, φ 90°', 0.012],
]
const fitNm = steps(400, 760, 15)
const ripple = (i: number, phase: number): number =>
  0.0006 * Math.sin(7.3 * i + phase) + 0.0004 * Math.cos(12.9 * i * i)
export const residualsData: ResidualsData = {
  title: 'Invented sample: fit of two angles and two retardances',
  noise: 0.0006,
  directions: directions.map(([label, offset], k) => {
    const model = fitNm.map((nm) => 0.042 + offset + 0.06 * ((nm - 560 + 20 * k) / 200) ** 2)
    return { label, wavelengthNm: fitNm, model, measured: model.map((value, i) => value + ripple(i, k)) }
  }),
}

const draw = (i: number, k: number): number => ((i * 7919 + k * 104729) % 1009) / 1009
const offers = steps(0, 34, 1).map((i) => {
  const price = 4 + 26 * draw(i, 1)
  const reflectance = 0.0425 + 0.11 / price + 0.02 * draw(i, 2) ** 2
  return { label: `film ${i + 1}`, x: price, y: reflectance, limitsMet: reflectance < 0.06 }
})
export const paretoFrontData: ParetoFrontData = {
  title: 'Invented films on offer: darkness against price',
  x: { quantity: { label: 'price', unit: 'per m²', factor: 1 }, better: 'low' },
  y: { quantity: METRIC_QUANTITIES.luminous_reflectance, better: 'low' },
  candidates: offers.map((offer) => ({
    ...offer,
    onFront: !offers.some((other) => other !== offer && other.x <= offer.x && other.y <= offer.y),
  })),
}

export const budgetBarsData: BudgetBarsData = {
  title: 'Invented dive computer: where the light comes from',
  metric: METRIC_QUANTITIES.luminous_reflectance,
  total: 0.0502,
  terms: [
    { name: 'front face', alone: 0.0401, ifRemoved: 0.0398 },
    { name: 'dispersion', alone: 0.0043, ifRemoved: 0.0039 },
    { name: 'retardance off at 550 nm', alone: 0.0016, ifRemoved: 0.0021 },
    { name: 'axis error', alone: 0.0008, ifRemoved: 0.001 },
    { name: 'inner faces', alone: 0.0019, ifRemoved: 0.0017 },
    { name: 'polarizer leakage', alone: 0.0002, ifRemoved: -0.0003 },
    { name: 'depolarized share', alone: 0.0011, ifRemoved: 0.0011 },
  ],
}

const stokesOf = (azimuthDeg: number, ellipticityDeg: number): readonly [number, number, number] => {
  const [a, e] = [2 * azimuthDeg * DEGREE, 2 * ellipticityDeg * DEGREE]
  return [Math.cos(e) * Math.cos(a), Math.cos(e) * Math.sin(a), Math.sin(e)]
}
export const poincareData: PoincareData = {
  title: 'Invented dive computer: the light’s way over the sphere, 550 nm',
  ways: [
    {
      name: 'going in',
      states: [
        { label: 'polarizer', stokes: stokesOf(0, 0) },
        { label: 'half', stokes: stokesOf(30, 0) },
        { label: 'quarter', stokes: stokesOf(75, 43) },
      ],
      between: [
        steps(5, 175, 5).map((turn) => {
          // Turn of (1, 0, 0) about the half-wave film's axis at 15°.
          const [c, s, t] = [Math.cos(30 * DEGREE), Math.sin(30 * DEGREE), turn * DEGREE]
          return [c * c + s * s * Math.cos(t), c * s * (1 - Math.cos(t)), s * Math.sin(t)]
        }),
        steps(2, 41, 3).map((e) => stokesOf(30 + e, e)),
      ],
    },
    {
      name: 'coming back',
      states: [
        { label: 'panel', stokes: stokesOf(-75, -43) },
        { label: 'quarter', stokes: stokesOf(-62, -2) },
        { label: 'half', stokes: stokesOf(92, 2) },
      ],
      between: [steps(2, 41, 3).map((e) => stokesOf(-75 + 13 * (e / 41), -43 + e)), []],
    },
  ],
}

const state = (share: number, azimuthDeg: number, ellipticityDeg: number, degree = 1) => ({
  share,
  azimuthRad: azimuthDeg * DEGREE,
  ellipticityRad: ellipticityDeg * DEGREE,
  degree,
})
export const ellipseRowData: EllipseRowData = {
  title: 'Invented dive computer: the light on its way, 550 nm, θ 0°',
  layers: [
    { name: 'hard_coat', goingIn: state(0.958, 0, 0, 0), comingBack: state(0.0021, 0, 0.5, 0.99) },
    { name: 'polarizer', goingIn: state(0.412, 0, 0), comingBack: state(0.0023, 0, 0) },
    { name: 'adhesive', goingIn: state(0.411, 0, 0), comingBack: state(0.186, 92, 1.5, 0.98) },
    { name: 'half', goingIn: state(0.41, 30, 0), comingBack: state(0.186, 92, 1.5, 0.98) },
    { name: 'adhesive_2', goingIn: state(0.41, 30, 0), comingBack: state(0.187, -62, -2, 0.98) },
    { name: 'quarter', goingIn: state(0.409, 75, 42), comingBack: state(0.188, -62, -2, 0.98) },
    { name: 'barrier_stack_upper', goingIn: state(0.408, 75, 42), comingBack: state(0.189, 75, -42, 0.98) },
  ],
}

const rollRad = steps(0, 180, 3).map((deg) => deg * DEGREE)
export const eyewearRollData: EyewearRollData = {
  title: 'Invented dive computer behind a polarized lens',
  rollRad,
  brightness: { label: 'luminance', unit: 'cd/m²', factor: 1 },
  screens: [
    {
      name: 'OLED',
      through: rollRad.map((roll) => 150 + 60 * Math.cos(2 * roll - 0.4)),
      colorShift: rollRad.map((roll) => 0.004 + 0.003 * Math.sin(roll) ** 2),
      xyz: rollRad.map((roll) => {
        const y = 0.72 + 0.28 * Math.cos(2 * roll - 0.4)
        return [0.95 * y, y, 1.09 * y * (1 - 0.1 * Math.sin(roll) ** 2)]
      }),
    },
    {
      name: 'LCD',
      through: rollRad.map((roll) => 2 + 240 * Math.cos(roll - 45 * DEGREE) ** 2),
      colorShift: rollRad.map((roll) => 0.01 + 0.02 * Math.sin(roll - 45 * DEGREE) ** 4),
      xyz: rollRad.map((roll) => {
        const y = Math.cos(roll - 45 * DEGREE) ** 2
        return [0.95 * y, y, 1.09 * y]
      }),
    },
  ],
}
