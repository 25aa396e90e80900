import type { PublishedMaterial } from '../publishedMaterial.js'

export const calciteNe: PublishedMaterial = {
  title: 'calcite crystal, extraordinary',
  source:
    'G. Ghosh, Dispersion-equation coefficients for the refractive index and birefringence of calcite and quartz crystals, Opt. Commun. 163, 95-102 (1999)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [204, 2172],
  kind: 'sellmeier',
  constant: 0.35859695,
  resonance: 'um2',
  terms: [
    [0.8242783, 0.0106689543],
    [0.14429128, 120],
  ],
}
