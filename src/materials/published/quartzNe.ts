import type { PublishedMaterial } from '../publishedMaterial.js'

export const quartzNe: PublishedMaterial = {
  title: 'alpha-quartz crystal, extraordinary',
  source:
    'G. Ghosh, Dispersion-equation coefficients for the refractive index and birefringence of calcite and quartz crystals, Opt. Commun. 163, 95-102 (1999)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [198, 2053.1],
  kind: 'sellmeier',
  constant: 0.28851804,
  resonance: 'um2',
  terms: [
    [1.09509924, 0.0102101864],
    [1.15662475, 100],
  ],
}
