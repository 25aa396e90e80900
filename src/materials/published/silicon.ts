import type { PublishedMaterial } from '../publishedMaterial.js'

export const silicon: PublishedMaterial = {
  title: 'crystalline silicon',
  source:
    'D. E. Aspnes, A. A. Studna, Dielectric functions and optical parameters of Si, Ge, GaP, GaAs, GaSb, InP, InAs, and InSb from 1.5 to 6.0 eV, Phys. Rev. B 27, 985-1009 (1983)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  note: 'single crystal; a stand-in for polycrystalline silicon',
  rangeNm: [364.7, 826.6],
  kind: 'table',
  rows: [
    [364.7, 6.522, 2.705],
    [375.7, 6.709, 1.32],
    [387.5, 6.062, 0.63],
    [399.9, 5.57, 0.387],
    [413.3, 5.222, 0.269],
    [427.5, 4.961, 0.203],
    [442.8, 4.753, 0.163],
    [459.2, 4.583, 0.13],
    [476.9, 4.442, 0.09],
    [495.9, 4.32, 0.073],
    [516.6, 4.215, 0.06],
    [539.1, 4.123, 0.048],
    [563.6, 4.042, 0.032],
    [590.4, 3.969, 0.03],
    [619.9, 3.906, 0.022],
    [652.5, 3.847, 0.016],
    [688.8, 3.796, 0.013],
    [729.3, 3.752, 0.01],
    [774.9, 3.714, 0.008],
    [826.6, 3.673, 0.005],
  ],
}
