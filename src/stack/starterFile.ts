/** What `offblack new` writes: a commented two-film laminate over an OLED panel, with invented values. */
export const STARTER_FILE = `# A stack file for offblack: one laminate, from the viewer's side to the panel, and the questions asked of it.
# All values here are invented. Replace them by those of your films; then:
#   offblack check FILE       is the file right?
#   offblack evaluate FILE    how dark, how neutral, at what cost?
#   offblack optimize FILE    which angles and retardances?
#   offblack schema > stack.schema.json     and the next line makes an editor complete and check:
# yaml-language-server: $schema=stack.schema.json
#
# Lengths, angles and shares take a unit (138 nm, 25 um, 45 deg, 43.2 %); a bare number means nm, degrees, fraction.
# Azimuths run counter-clockwise as the viewer sees them, 0 deg at three o'clock.
format: 1
title: Two-film laminate over an OLED panel (invented values)

conditions:
  wavelengths: {from: 380 nm, to: 780 nm, step: 5 nm}
  observer: 2 deg                 # or 10 deg
  illuminant: D65                 # D65 D50 A E FL2 FL11 LED-B3 LED-B5, {cct: 5000} or {file: lamp.csv}
  directions:                     # where the eye stands: theta from the normal, phi its azimuth
    - {theta: 0 deg, phi: 0 deg}
    - {theta: 45 deg, phi: 90 deg}

layers:
  - id: cover                     # the name in paths such as cover.thickness
    kind: isotropic
    index: {material: glass}      # or a number, {n: 1.5, k: 0}, {cauchy_nm: [A, B, C]}, {formula: "..."}, {file: nk.csv}
    thickness: 0.5 mm
  - id: polarizer
    kind: polarizer
    absorption_axis: 90 deg
    single_transmittance: 43.2 %  # in air, faces included
    polarization_efficiency: 99.98 %
    index: 1.5
    thickness: 12 um
  - id: half
    kind: retarder
    slow_axis: 105 deg
    retardance: 272 nm            # at 550 nm
    nz: 1                         # or rth: 136 nm
    index: 1.55                   # mean of the three principal indices
    thickness: 30 um
    dispersion: {re450: 1.01, re650: 0.995}   # leave out for a flat film
  - {id: adhesive, kind: isotropic, index: 1.475, thickness: 15 um}
  - id: quarter
    kind: retarder
    slow_axis: 165 deg
    retardance: 138 nm
    nz: 1
    index: 1.55
    thickness: 22 um
    dispersion: {re450: 1.01, re650: 0.995}

panel: {kind: mirror, index: 1.5, reflectance: 45 %, depolarized: 1 %}   # or {kind: metal, index: {material: al}}
emission: {luminance: 600 cd/m2, spectrum: D65, polarization: none}       # at the eye, on axis
ambient: [500 lx, 10000 lx]       # for the contrast

limits:
  - {metric: luminous_reflectance, max: 5 %}
  - {metric: chroma, theta: 45 deg, phi: 90 deg, max: 6}
  - {metric: emission_transmittance, min: 40 %}

optimize:
  vary:
    half.slow_axis: {from: 0 deg, to: 180 deg}
    quarter.slow_axis: {from: 0 deg, to: 180 deg}      # or the angles on offer: [15 deg, 45 deg, 75 deg]
    quarter.retardance: {from: 110 nm, to: 170 nm}
  minimize: {metric: color_weighted_reflectance}
  subject_to:
    - {metric: emission_transmittance, min: 40 %}

tolerance:                        # how production scatters about the values above
  samples: 2000
  seed: 1
  vary:
    half.slow_axis: {normal: 0.5 deg}                  # standard deviation
    quarter.slow_axis: {normal: 0.5 deg}
    quarter.retardance: {normal: 2 nm, limit: 6 nm}    # cut off beyond the limit
    polarizer.absorption_axis: {uniform: 0.5 deg}      # half-width
`
