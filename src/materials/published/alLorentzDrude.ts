import type { PublishedMaterial } from '../publishedMaterial.js'

export const alLorentzDrude: PublishedMaterial = {
  title: 'aluminum',
  source:
    'A. D. Rakic, A. B. Djurisic, J. M. Elazar, M. L. Majewski, Optical properties of metallic films for vertical-cavity optoelectronic devices, Appl. Opt. 37, 5271-5283 (1998)',
  via: 'companion parameter listings of the CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [62, 248000],
  kind: 'lorentz-drude',
  plasmaEv: 14.98,
  drude: [0.523, 0.047],
  oscillators: [
    [0.227, 0.333, 0.162],
    [0.05, 0.312, 1.544],
    [0.166, 1.351, 1.808],
    [0.03, 3.382, 3.473],
  ],
}
