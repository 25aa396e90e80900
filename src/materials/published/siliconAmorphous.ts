import type { PublishedMaterial } from '../publishedMaterial.js'

export const siliconAmorphous: PublishedMaterial = {
  title: 'amorphous silicon, 60 nm film',
  source:
    'D. T. Pierce, W. E. Spicer, Electronic structure of amorphous Si from photoemission and optical studies, Phys. Rev. B 5, 3017-3029 (1972); digits from E. D. Palik (ed.), Handbook of Optical Constants of Solids, Academic Press (1985)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  rangeNm: [364.7, 826.6],
  kind: 'table',
  rows: [
    [364.7, 3.9, 2.66],
    [387.5, 4.17, 2.38],
    [413.3, 4.38, 2.02],
    [442.8, 4.47, 1.64],
    [476.9, 4.49, 1.28],
    [496, 4.47, 1.12],
    [516.6, 4.46, 0.969],
    [563.6, 4.36, 0.69],
    [619.9, 4.23, 0.461],
    [652.6, 4.17, 0.363],
    [688.8, 4.09, 0.271],
    [729.3, 4.01, 0.199],
    [774.9, 3.93, 0.136],
    [826.6, 3.86, 0.0812],
  ],
}
