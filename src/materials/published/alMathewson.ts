import type { PublishedMaterial } from '../publishedMaterial.js'

export const alMathewson: PublishedMaterial = {
  title: 'aluminum, 298 K',
  source:
    'A. G. Mathewson, H. P. Myers, Absolute values of the optical constants of some pure metals, Phys. Scr. 4, 291-292 (1971)',
  via: 'CC0 refractive-index database of M. N. Polyanskiy',
  note: 'starts at 495.94 nm: use al for the whole visible range',
  rangeNm: [495.94, 799.9],
  kind: 'table',
  rows: [
    [495.94, 0.77909, 5.84012],
    [506.06, 0.81783, 5.93033],
    [516.6, 0.85227, 6.10134],
    [527.59, 0.89107, 6.22848],
    [539.06, 0.94408, 6.35541],
    [551.04, 1.00461, 6.51991],
    [563.56, 1.06864, 6.64394],
    [576.67, 1.14503, 6.76839],
    [590.4, 1.21981, 6.92733],
    [604.8, 1.30548, 7.0855],
    [619.92, 1.40111, 7.20855],
    [635.82, 1.50675, 7.36684],
    [652.55, 1.6281, 7.49338],
    [670.18, 1.77579, 7.65855],
    [688.8, 1.94186, 7.82757],
    [708.48, 2.13059, 8.00246],
    [729.32, 2.33676, 8.15233],
    [751.42, 2.57452, 8.25398],
    [774.9, 2.87316, 8.23135],
    [799.9, 3.03948, 8.07703],
  ],
}
