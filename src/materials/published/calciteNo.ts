import type { PublishedMaterial } from '../publishedMaterial.js'

export const calciteNo: PublishedMaterial = {
  title: 'calcite crystal, ordinary',
  source:
    'G. Ghosh, Dispersion-equation coefficients for the refractive index and birefringence of calcite and quartz crystals, Opt. Commun. 163, 95-102 (1999)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [204, 2172],
  kind: 'sellmeier',
  constant: 0.73358749,
  resonance: 'um2',
  terms: [
    [0.96464345, 0.0194325203],
    [1.82831454, 120],
  ],
}
