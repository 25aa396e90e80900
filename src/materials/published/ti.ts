import type { PublishedMaterial } from '../publishedMaterial.js'

export const ti: PublishedMaterial = {
  title: 'titanium, evaporated',
  source:
    'P. B. Johnson, R. W. Christy, Optical constants of transition metals: Ti, V, Cr, Mn, Fe, Co, Ni, and Pd, Phys. Rev. B 9, 5056-5070 (1974)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [368, 821],
  kind: 'table',
  rows: [
    [368, 1.9, 2.9],
    [381, 1.99, 2.93],
    [397, 2.08, 2.95],
    [413, 2.14, 2.98],
    [431, 2.21, 3.01],
    [451, 2.27, 3.04],
    [471, 2.32, 3.1],
    [496, 2.36, 3.19],
    [521, 2.44, 3.3],
    [549, 2.54, 3.43],
    [582, 2.6, 3.58],
    [617, 2.67, 3.72],
    [659, 2.76, 3.84],
    [704, 2.86, 3.96],
    [756, 3, 4.01],
    [821, 3.21, 4.01],
  ],
}
