import type { PublishedMaterial } from '../publishedMaterial.js'

export const cr: PublishedMaterial = {
  title: 'chromium, evaporated',
  source:
    'P. B. Johnson, R. W. Christy, Optical constants of transition metals: Ti, V, Cr, Mn, Fe, Co, Ni, and Pd, Phys. Rev. B 9, 5056-5070 (1974)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [368, 821],
  kind: 'table',
  rows: [
    [368, 1.87, 2.69],
    [381, 1.92, 2.74],
    [397, 2, 2.83],
    [413, 2.08, 2.93],
    [431, 2.19, 3.04],
    [451, 2.33, 3.14],
    [471, 2.51, 3.24],
    [496, 2.75, 3.3],
    [521, 2.94, 3.33],
    [549, 3.18, 3.33],
    [582, 3.22, 3.3],
    [617, 3.17, 3.3],
    [659, 3.09, 3.34],
    [704, 3.05, 3.39],
    [756, 3.08, 3.42],
    [821, 3.2, 3.48],
  ],
}
