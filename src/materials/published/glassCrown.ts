import type { PublishedMaterial } from '../publishedMaterial.js'

export const glassCrown: PublishedMaterial = {
  title: 'borosilicate crown optical glass, nd=1.51680, Vd=64.17 (glass code 517642)',
  source: 'published catalogue Sellmeier constants for borosilicate crown glass 517642 (2017 edition)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [300, 2500],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um2',
  terms: [
    [1.03961212, 0.00600069867],
    [0.231792344, 0.0200179144],
    [1.01046945, 103.560653],
  ],
  kRows: [
    [380, 2.074e-8],
    [390, 1.3731e-8],
    [400, 1.0227e-8],
    [405, 9.0558e-9],
    [420, 9.3912e-9],
    [436, 1.1147e-8],
    [460, 1.0286e-8],
    [500, 9.5781e-9],
    [546, 6.9658e-9],
    [580, 9.2541e-9],
    [620, 1.1877e-8],
    [660, 1.2643e-8],
    [700, 8.9305e-9],
    [1060, 1.0137e-8],
  ],
}
