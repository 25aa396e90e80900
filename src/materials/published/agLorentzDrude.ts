import type { PublishedMaterial } from '../publishedMaterial.js'

export const agLorentzDrude: PublishedMaterial = {
  title: 'silver',
  source:
    'A. D. Rakic, A. B. Djurisic, J. M. Elazar, M. L. Majewski, Optical properties of metallic films for vertical-cavity optoelectronic devices, Appl. Opt. 37, 5271-5283 (1998)',
  via: 'companion parameter listings of the CC0 refractive-index database of M. N. Polyanskiy',
  note: 'reflects about 3 % too little in the visible: prefer ag',
  rangeNm: [248, 12400],
  kind: 'lorentz-drude',
  plasmaEv: 9.01,
  drude: [0.845, 0.048],
  oscillators: [
    [0.065, 3.886, 0.816],
    [0.124, 0.452, 4.481],
    [0.011, 0.065, 8.185],
    [0.84, 0.916, 9.083],
    [5.646, 2.419, 20.29],
  ],
}
