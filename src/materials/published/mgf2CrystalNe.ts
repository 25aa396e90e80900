import type { PublishedMaterial } from '../publishedMaterial.js'

export const mgf2CrystalNe: PublishedMaterial = {
  title: 'magnesium fluoride crystal, extraordinary (19 C)',
  source: 'M. J. Dodge, Refractive properties of magnesium fluoride, Appl. Opt. 23, 1980-1985 (1984)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [200, 7000],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um',
  terms: [
    [0.41344023, 0.03684262],
    [0.50497499, 0.09076162],
    [2.4904862, 23.771995],
  ],
}
