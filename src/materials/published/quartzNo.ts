import type { PublishedMaterial } from '../publishedMaterial.js'

export const quartzNo: PublishedMaterial = {
  title: 'alpha-quartz crystal, ordinary',
  source:
    'G. Ghosh, Dispersion-equation coefficients for the refractive index and birefringence of calcite and quartz crystals, Opt. Commun. 163, 95-102 (1999)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [198, 2053.1],
  kind: 'sellmeier',
  constant: 0.28604141,
  resonance: 'um2',
  terms: [
    [1.07044083, 0.0100585997],
    [1.10202242, 100],
  ],
}
