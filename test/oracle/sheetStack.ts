import type { PlainRetarder, PlainStack } from './stackFile.js'

/** Films as sheets of index 1 and 10 mm, whose faces reflect less than 1e-7: Jones calculus is what remains. */
const SHEET = { index: 1, thickness: '10 mm' } as const

export interface SheetRetarder {
  readonly axisDeg: number
  readonly retardanceNm: number
  readonly dispersion?: PlainRetarder['dispersion']
}

export const retarderSheet = (film: SheetRetarder, id: string): PlainRetarder => ({
  ...SHEET,
  id,
  kind: 'retarder',
  slow_axis: film.axisDeg,
  retardance: film.retardanceNm,
  dispersion: film.dispersion,
})

/** `passed` and `absorbed` are internal principal transmittances. */
export const polarizerSheet = (transmissionAxisDeg: number, id: string, passed = 1, absorbed = 1e-12) =>
  ({
    ...SHEET,
    id,
    kind: 'polarizer',
    absorption_axis: transmissionAxisDeg + 90,
    transmission_axis_transmittance: passed,
    absorption_axis_transmittance: absorbed,
  }) as const

export const sheetStack = (layers: PlainStack['layers'], panelReflectance: number): PlainStack => ({
  title: 'sheets',
  layers,
  panel: { kind: 'mirror', index: 1, reflectance: panelReflectance },
})
