import type { PublishedMaterial } from '../publishedMaterial.js'

export const mo: PublishedMaterial = {
  title: 'molybdenum single crystal',
  source:
    'M. M. Kirillova, L. V. Nomerovannaya, M. M. Noskov, Optical properties of molybdenum single crystals, Sov. Phys. JETP 33, 1210-1214 (1971)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [365, 800],
  kind: 'table',
  rows: [
    [365, 2.65, 3.5],
    [404, 2.66, 3.41],
    [425, 2.71, 3.41],
    [450, 2.84, 3.51],
    [475, 2.95, 3.64],
    [500, 3.15, 3.73],
    [525, 3.22, 3.74],
    [550, 3.47, 3.56],
    [575, 3.42, 3.55],
    [600, 3.38, 3.56],
    [650, 3.45, 3.67],
    [675, 3.47, 3.74],
    [700, 3.48, 3.7],
    [725, 3.5, 3.8],
    [750, 3.52, 3.65],
    [775, 3.47, 3.57],
    [800, 3.46, 3.65],
  ],
}
