import type { PublishedMaterial } from '../publishedMaterial.js'

export const cu: PublishedMaterial = {
  title: 'copper, evaporated',
  source: 'P. B. Johnson, R. W. Christy, Optical constants of the noble metals, Phys. Rev. B 6, 4370-4379 (1972)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [367.9, 821.1],
  kind: 'table',
  rows: [
    [367.9, 1.36, 1.975],
    [381.5, 1.33, 2.045],
    [397.4, 1.32, 2.116],
    [413.3, 1.28, 2.207],
    [430.5, 1.25, 2.305],
    [450.9, 1.24, 2.397],
    [471.4, 1.25, 2.483],
    [495.9, 1.22, 2.564],
    [520.9, 1.18, 2.608],
    [548.6, 1.02, 2.577],
    [582.1, 0.7, 2.704],
    [616.8, 0.3, 3.205],
    [659.5, 0.22, 3.747],
    [704.5, 0.21, 4.205],
    [756, 0.24, 4.665],
    [821.1, 0.26, 5.18],
  ],
}
