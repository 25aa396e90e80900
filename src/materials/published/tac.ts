import type { PublishedMaterial } from '../publishedMaterial.js'

export const tac: PublishedMaterial = {
  title: 'cellulose optical polymer (20 C), standing in for triacetyl cellulose',
  source:
    'N. Sultanova, S. Kasarova, I. Nikolov, Dispersion properties of optical polymers, Acta Phys. Pol. A 116, 585-587 (2009); one-term Sellmeier fit of the measured indices by M. N. Polyanskiy',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  note: 'a stand-in: cellulose, NOT triacetate, the nearest polymer with published data',
  rangeNm: [436.8, 1052],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um2',
  terms: [[1.124, 0.011087]],
}
