import type { PublishedMaterial } from '../publishedMaterial.js'

export const agJohnson: PublishedMaterial = {
  title: 'silver, evaporated',
  source: 'P. B. Johnson, R. W. Christy, Optical constants of the noble metals, Phys. Rev. B 6, 4370-4379 (1972)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [367.9, 821.1],
  kind: 'table',
  rows: [
    [367.9, 0.07, 1.657],
    [381.5, 0.05, 1.864],
    [397.4, 0.05, 2.07],
    [413.3, 0.05, 2.275],
    [430.5, 0.04, 2.462],
    [450.9, 0.04, 2.657],
    [471.4, 0.05, 2.869],
    [495.9, 0.05, 3.093],
    [520.9, 0.05, 3.324],
    [548.6, 0.06, 3.586],
    [582.1, 0.05, 3.858],
    [616.8, 0.06, 4.152],
    [659.5, 0.05, 4.483],
    [704.5, 0.04, 4.838],
    [756, 0.03, 5.242],
    [821.1, 0.04, 5.727],
  ],
}
