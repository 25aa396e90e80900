import type { PublishedMaterial } from '../publishedMaterial.js'

export const tiLorentzDrude: PublishedMaterial = {
  title: 'titanium',
  source:
    'A. D. Rakic, A. B. Djurisic, J. M. Elazar, M. L. Majewski, Optical properties of metallic films for vertical-cavity optoelectronic devices, Appl. Opt. 37, 5271-5283 (1998)',
  via: 'companion parameter listings of the CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [248, 31000],
  kind: 'lorentz-drude',
  plasmaEv: 7.29,
  drude: [0.148, 0.082],
  oscillators: [
    [0.899, 2.276, 0.777],
    [0.393, 2.518, 1.545],
    [0.187, 1.663, 2.509],
    [0.001, 1.762, 19.43],
  ],
}
