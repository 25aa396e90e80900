import { type OffStateColorData, offStateColor } from '../charts/offStateColor.js'
import { type ReflectanceSpectrumData, reflectanceSpectrum } from '../charts/reflectanceSpectrum.js'
import { PAPER } from '../charts/theme.js'
import { illuminantAt } from '../color/illuminant.js'
import { observerAt } from '../color/observer.js'
import { createColorWeights } from '../color/weights.js'
import type { Illuminant, Stack } from '../stack/stack.js'
import type { DirectionEvaluation, Evaluation } from '../studies/evaluate.js'
import { given } from './decimals.js'
import type { Sheet } from './sheet.js'

export interface NamedEvaluation {
  readonly name: string
  readonly evaluation: Evaluation
}

/** Directions that get a spectrum of their own; the color chart shows all. */
const MOST_SPECTRA = 4

/** Spectra and colors of one design, or of two (before, after) seen from the same directions. */
export function appearanceSheets(stack: Stack, designs: readonly NamedEvaluation[]): Sheet[] {
  const { directions } = designs[0].evaluation
  const spectra = directions.slice(0, MOST_SPECTRA).map((direction, k) => ({
    name: `reflectance-${given(direction.theta_deg)}-${given(direction.phi_deg)}`,
    chart: reflectanceSpectrum(spectrumData(stack, designs, k), PAPER),
    width: 900,
    height: 540,
  }))
  return [...spectra, colorSheet(stack, designs)]
}

/** Seen from the k-th direction. */
export function spectrumData(stack: Stack, designs: readonly NamedEvaluation[], k: number): ReflectanceSpectrumData {
  const after = designs[designs.length - 1].evaluation.directions[k]
  const { wavelength_nm, front_reflectance } = after.spectrum
  const wavelengths = Float64Array.from(wavelength_nm)
  const { observer, illuminant } = stack.conditions
  const { x, y, z } = observerAt(observer, wavelengths)
  const weights = createColorWeights(wavelengths, observer, illuminantAt(illuminant, wavelengths))
  return {
    title: stack.title,
    direction: { thetaRad: radians(after.theta_deg), phiRad: radians(after.phi_deg) },
    wavelengthNm: wavelength_nm,
    designs: designs.map(({ name, evaluation: { directions } }) => ({
      name,
      reflectance: directions[k].spectrum.reflectance,
      luminousReflectance: directions[k].luminous_reflectance,
      colorWeightedReflectance: directions[k].color_weighted_reflectance,
    })),
    frontReflectance: front_reflectance,
    weighting: { name: `ȳ · ${illuminantText(illuminant)}, weighting (no scale)`, value: Array.from(weights.y) },
    lightXyz: wavelength_nm.map((_, i) => [x[i], y[i], z[i]] as const),
  }
}

function colorSheet(stack: Stack, designs: readonly NamedEvaluation[]): Sheet {
  return { name: 'off-state-color', chart: offStateColor(colorData(stack, designs), PAPER), width: 720, height: 760 }
}

export function colorData(stack: Stack, designs: readonly NamedEvaluation[]): OffStateColorData {
  const after = designs[designs.length - 1].evaluation.directions
  const before = designs.length > 1 ? designs[0].evaluation.directions : undefined
  const limits = stack.limits.flatMap(({ metric, max }) => (metric === 'chroma' && max !== undefined ? [max] : []))
  const { observer, illuminant } = stack.conditions
  return {
    title: `${stack.title}: color of the off-state`,
    notes: [`CIELAB, ${illuminantText(illuminant)}, ${observer}° observer`],
    ...(limits.length > 0 && { limitChroma: Math.min(...limits) }),
    points: after.map((direction, k) => ({
      label: directionLabel(direction),
      after: aStarBStar(direction),
      ...(before !== undefined && { before: aStarBStar(before[k]) }),
    })),
  }
}

function aStarBStar({ lab }: DirectionEvaluation): [number, number] {
  return [lab[1], lab[2]]
}

function directionLabel({ theta_deg, phi_deg }: DirectionEvaluation): string {
  return theta_deg === 0 ? 'θ 0°' : `θ ${given(theta_deg)}°, φ ${given(phi_deg)}°`
}

export function illuminantText(illuminant: Illuminant): string {
  if (typeof illuminant === 'string') return illuminant
  return 'cct' in illuminant ? `daylight ${given(illuminant.cct)} K` : 'lamp of the file'
}

function radians(degrees: number): number {
  return (degrees * Math.PI) / 180
}
