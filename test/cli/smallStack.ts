/** A small invented stack; each line stands alone, so that a test can spoil one. */
export const SMALL_STACK = `format: 1
title: Invented small stack
conditions:
  wavelengths: {from: 400 nm, to: 700 nm, step: 20 nm}
  observer: 2 deg
  illuminant: D65
  directions: [{theta: 0 deg, phi: 0 deg}]
layers:
  - id: polarizer
    kind: polarizer
    absorption_axis: 90 deg
    thickness: 12 um
    index: 1.5
    single_transmittance: 43 %
    polarization_efficiency: 99.9 %
  - id: quarter
    kind: retarder
    slow_axis: 30 deg
    retardance: 120 nm
    nz: 1
    thickness: 25 um
    index: 1.55
panel: {kind: mirror, index: 1.5, reflectance: 45 %, depolarized: 1 %}
emission: {luminance: 600, spectrum: D65, polarization: none}
ambient: [500]
limits:
  - {metric: luminous_reflectance, theta: 0 deg, phi: 0 deg, max: 5 %}
optimize:
  vary:
    quarter.slow_axis: {from: 0 deg, to: 180 deg}
    quarter.retardance: {from: 90 nm, to: 190 nm}
  minimize: {metric: luminous_reflectance, views: [{theta: 0 deg, phi: 0 deg, weight: 1}]}
`

/** 1-based line at which a spoiled text first differs from the small stack. */
export function firstChangedLine(text: string): number {
  const lines = SMALL_STACK.split('\n')
  return text.split('\n').findIndex((line, k) => line !== lines[k]) + 1
}
