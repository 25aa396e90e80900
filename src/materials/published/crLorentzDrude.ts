import type { PublishedMaterial } from '../publishedMaterial.js'

export const crLorentzDrude: PublishedMaterial = {
  title: 'chromium',
  source:
    'A. D. Rakic, A. B. Djurisic, J. M. Elazar, M. L. Majewski, Optical properties of metallic films for vertical-cavity optoelectronic devices, Appl. Opt. 37, 5271-5283 (1998)',
  via: 'companion parameter listings of the CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [248, 62000],
  kind: 'lorentz-drude',
  plasmaEv: 10.75,
  drude: [0.168, 0.047],
  oscillators: [
    [0.151, 3.175, 0.121],
    [0.15, 1.305, 0.543],
    [1.149, 2.676, 1.97],
    [0.825, 1.335, 8.775],
  ],
}
