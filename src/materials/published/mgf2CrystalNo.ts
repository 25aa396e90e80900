import type { PublishedMaterial } from '../publishedMaterial.js'

export const mgf2CrystalNo: PublishedMaterial = {
  title: 'magnesium fluoride crystal, ordinary (19 C)',
  source: 'M. J. Dodge, Refractive properties of magnesium fluoride, Appl. Opt. 23, 1980-1985 (1984)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [200, 7000],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um',
  terms: [
    [0.48755108, 0.04338408],
    [0.39875031, 0.09461442],
    [2.3120353, 23.793604],
  ],
}
