import type { PublishedMaterial } from '../publishedMaterial.js'

export const pva: PublishedMaterial = {
  title: 'poly(vinyl alcohol), 10 um film on glass (24 C)',
  source:
    'I. Bodurov, I. Vlaeva, A. Viraneva, T. Yovcheva, S. Sainov, Modified design of a laser refractometer, Nanosci. Nanotechnol. 16, 31-33 (2016)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [405, 635],
  kind: 'sellmeier',
  constant: 0,
  resonance: 'um',
  terms: [[1.149, 0.1234783]],
}
