import type { PublishedMaterial } from '../publishedMaterial.js'

export const si3n4: PublishedMaterial = {
  title: 'silicon nitride film, CVD',
  source:
    'H. R. Philipp, Optical properties of silicon nitride, J. Electrochem. Soc. 120, 295-300 (1973); dispersion formula: T. Baak, Silicon oxynitride; a material for GRIN optics, Appl. Opt. 21, 1069-1072 (1982)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [207, 1240],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um',
  terms: [[2.8939, 0.13967]],
}
