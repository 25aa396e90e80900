/**
 * Sheets of index 1, so thick that what they do to the light needs a difference of indices below 1e-3 only: their
 * faces reflect less than 1e-7, and Jones calculus is what remains of the full wave solution.
 */
import type { OracleLayer, OraclePanel } from './solvePoint.js'

const THICKNESS_NM = 1e7

/** Internal principal transmittances along the axis that is passed and along the one that is absorbed. */
export function sheetPolarizer(
  absorptionAxisRad: number,
  wavelengthNm: number,
  passed = 1,
  absorbed = 1e-12,
): OracleLayer {
  const k = (transmittance: number) => (-wavelengthNm * Math.log(transmittance)) / (4 * Math.PI * THICKNESS_NM)
  const passing = { re: 1, im: k(passed) }
  return {
    principal: [{ re: 1, im: k(absorbed) }, passing, passing],
    azimuthRad: absorptionAxisRad,
    tiltRad: 0,
    thicknessNm: THICKNESS_NM,
    coherent: false,
  }
}

export function sheetRetarder(slowAxisRad: number, retardanceNm: number): OracleLayer {
  const half = retardanceNm / THICKNESS_NM / 2
  return {
    principal: [
      { re: 1 + half, im: 0 },
      { re: 1 - half, im: 0 },
      { re: 1, im: 0 },
    ],
    azimuthRad: slowAxisRad,
    tiltRad: 0,
    thicknessNm: THICKNESS_NM,
    coherent: false,
  }
}

/** A mirror, or with reflectance 0 nothing: the light passes on into empty space. */
export const panelInAir = (reflectance: number): OraclePanel => ({
  kind: 'mirror',
  index: 1,
  reflectance,
  depolarized: 0,
})
