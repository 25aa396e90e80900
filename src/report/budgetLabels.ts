import type { Imperfection } from '../studies/idealized.js'

/** The terms of the light budget in words. */
export const BUDGET_LABELS: Readonly<Record<Imperfection, string>> = {
  front_face: 'front face',
  inner_faces: 'inner faces',
  polarizer_leakage: 'polarizer leakage',
  retardance_550: 'retardance off at 550 nm',
  dispersion: 'dispersion',
  axis_error: 'axis error',
  depolarized: 'depolarized share',
  oblique: 'oblique geometry',
}
