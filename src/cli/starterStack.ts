/** What `offblack new` writes: the smallest laminate worth looking at, with the choices told in comments. */
export const STARTER_STACK = `# A stack file for offblack: one laminate over a panel, and the questions asked of it.
#
# Lengths, angles and shares take a unit: 138 nm, 25 um, 0.7 mm, 45 deg, 43.2 %. A bare number means nm, degrees, a fraction.
# Azimuths run counter-clockwise as the viewer sees them, 0 deg at three o'clock.
#
#   offblack check    this file     is it right?
#   offblack evaluate this file     how dark, how neutral, at what cost?
#   offblack optimize this file --out out
#   offblack schema > stack.schema.json     and the next line makes an editor complete and check:
# yaml-language-server: $schema=stack.schema.json
format: 1
title: My laminate

conditions:
  wavelengths: {from: 380 nm, to: 780 nm, step: 5 nm}
  observer: 2 deg                  # or 10 deg
  illuminant: D65                  # D65 D50 A E FL2 FL11 LED-B3 LED-B5, {cct: 5000} or {file: lamp.csv}
  directions:                      # where the eye stands: theta from the normal, phi its azimuth
    - {theta: 0 deg, phi: 0 deg}
    - {theta: 45 deg, phi: 90 deg}

# From the viewer's side to the panel. Layers thinner than 5 um are joined by amplitudes (they show fringes) unless they say
# coherent: false.
layers:
  - {id: hard_coat, kind: isotropic, index: 1.49, thickness: 5 um}   # or index: {material: sio2}; offblack materials lists them
  - id: polarizer
    kind: polarizer
    absorption_axis: 90 deg
    thickness: 12 um
    index: 1.5
    single_transmittance: 43.2 %     # measured in air
    polarization_efficiency: 99.98 %
  - {id: adhesive_1, kind: isotropic, index: 1.475, thickness: 15 um}
  - id: quarter
    kind: retarder
    slow_axis: 45 deg
    retardance: 138 nm               # at 550 nm
    nz: 1.0                          # or rth: 69 nm
    thickness: 25 um
    index: 1.53                      # mean of the three
    dispersion: {re450: 1.01, re650: 0.995}   # Re(450)/Re(550), Re(650)/Re(550); leave out for a flat film
  - {id: adhesive_2, kind: isotropic, index: 1.475, thickness: 25 um}

# What lies under the laminate: a measured reflectance (a number, or {file: panel.csv}), or {kind: metal, index: {material: al}}.
panel: {kind: mirror, index: 1.5, reflectance: 45 %, depolarized: 1 %}

emission: {luminance: 600, spectrum: D65, polarization: none}   # cd/m2 at the eye, on axis
ambient: [500, 10000, 50000]                                    # lx, for the contrast

limits:
  - {metric: luminous_reflectance, theta: 0 deg, phi: 0 deg, max: 5 %}
  - {metric: chroma, theta: 0 deg, phi: 0 deg, max: 6}
  - {metric: emission_transmittance, theta: 0 deg, phi: 0 deg, min: 40 %}

optimize:
  vary:
    quarter.slow_axis: {from: 0 deg, to: 180 deg}     # or {values: [15 deg, 45 deg, 75 deg]}
    quarter.retardance: {from: 90 nm, to: 190 nm}
  minimize:
    metric: color_weighted_reflectance
    views: [{theta: 0 deg, phi: 0 deg, weight: 1}]

tolerance:
  samples: 2000
  seed: 1
  vary:
    polarizer.absorption_axis: {uniform: 0.5 deg}     # half-width
    quarter.slow_axis: {normal: 0.5 deg}              # standard deviation
    quarter.retardance: {normal: 2 nm, limit: 6 nm}   # cut off at plus or minus limit
`
