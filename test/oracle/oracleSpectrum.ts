import { principalIndices } from './principalIndices.js'
import { angleRad, indexAt, lengthNm, spectrumAt } from './quantities.js'
import { type OracleLayer, type OraclePanel, type OracleResult, type SolvePoint, solvePoint } from './solvePoint.js'
import type { PlainLayer, PlainPanel, PlainStack } from './stackFile.js'

/** A layer thinner than this is joined by amplitudes unless its file says otherwise. */
const COHERENT_BELOW_NM = 5000

/** One result per wavelength of a whole stack file, seen from (θ, φ) in radians. */
export const oracleSpectrum = (
  stack: PlainStack,
  wavelengthsNm: readonly number[],
  thetaRad: number,
  phiRad: number,
  solve: SolvePoint = solvePoint,
): readonly OracleResult[] =>
  wavelengthsNm.map((wavelengthNm) =>
    solve({
      wavelengthNm,
      thetaRad,
      phiRad,
      layers: stack.layers.map((layer) => oracleLayer(layer, wavelengthNm)),
      panel: oraclePanel(stack.panel, wavelengthNm),
    }),
  )

function oracleLayer(layer: PlainLayer, wavelengthNm: number): OracleLayer {
  const thicknessNm = lengthNm(layer.thickness)
  return {
    principal: principalIndices(layer, wavelengthNm),
    azimuthRad: firstAxisRad(layer),
    tiltRad: layer.kind === 'crystal' ? angleRad(layer.tilt ?? 0) : 0,
    thicknessNm,
    coherent: layer.coherent ?? thicknessNm < COHERENT_BELOW_NM,
  }
}

function firstAxisRad(layer: PlainLayer): number {
  switch (layer.kind) {
    case 'isotropic':
      return 0
    case 'retarder':
      return angleRad(layer.slow_axis ?? 0)
    case 'polarizer':
      return angleRad(layer.absorption_axis)
    case 'crystal':
      return angleRad(layer.azimuth ?? 0)
  }
}

function oraclePanel(panel: PlainPanel, wavelengthNm: number): OraclePanel {
  const index = indexAt(panel.index, wavelengthNm)
  if (panel.kind === 'metal') return { kind: 'metal', index }
  return {
    kind: 'mirror',
    index: index.re,
    reflectance: spectrumAt(panel.reflectance, wavelengthNm),
    depolarized: spectrumAt(panel.depolarized ?? 0, wavelengthNm),
  }
}
