import type { PublishedMaterial } from '../publishedMaterial.js'

export const fusedSilica: PublishedMaterial = {
  title: 'fused silica SiO2 (bulk, 20 C)',
  source:
    'I. H. Malitson, Interspecimen comparison of the refractive index of fused silica, J. Opt. Soc. Am. 55, 1205-1208 (1965)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [210, 6700],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um',
  terms: [
    [0.6961663, 0.0684043],
    [0.4079426, 0.1162414],
    [0.8974794, 9.896161],
  ],
}
