import type { PublishedMaterial } from '../publishedMaterial.js'

export const lc5cbNo: PublishedMaterial = {
  title: "nematic 4-cyano-4'-pentylbiphenyl, ordinary",
  source:
    'J. Li, C.-H. Wen, S. Gauza, R. Lu, S.-T. Wu, Refractive indices of liquid crystals for display applications, J. Disp. Technol. 1, 51-61 (2005) (three-coefficient extended Cauchy, 25 C, fitted 450-656 nm)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [450, 656],
  kind: 'cauchy',
  terms: [
    [1.5139, 0],
    [0.0052, -2],
    [0.0008, -4],
  ],
}
