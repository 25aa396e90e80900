import type { PublishedMaterial } from '../publishedMaterial.js'

export const cycloOlefin: PublishedMaterial = {
  title: 'cyclo-olefin polymer, optical grade (20 C)',
  source:
    'N. Sultanova, S. Kasarova, I. Nikolov, Dispersion properties of optical polymers, Acta Phys. Pol. A 116, 585-587 (2009); one-term Sellmeier fit of the measured indices by M. N. Polyanskiy',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [436.8, 1052],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um2',
  terms: [[1.2969, 0.011721]],
}
