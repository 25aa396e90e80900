import type { PublishedMaterial } from '../publishedMaterial.js'

export const water: PublishedMaterial = {
  title: 'water, distilled, 20.0 C',
  source:
    'M. Daimon, A. Masumura, Measurement of the refractive index of distilled water from the near-infrared region to the ultraviolet region, Appl. Opt. 46, 3811-3820 (2007)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [182, 1129],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um2',
  terms: [
    [0.5684027565, 0.005101829712],
    [0.1726177391, 0.01821153936],
    [0.02086189578, 0.02620722293],
    [0.1130748688, 10.69792721],
  ],
}
