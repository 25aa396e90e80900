/** Scale on which sheets of 10 nm and of 1 mm can be drawn on one another: a constant, and a step for each decade. */
const LEAST_PX = 28
const DECADE_PX = 11
/** Thinner sheets are all as high as this one, nm. */
const THINNEST_NM = 100

export const THICKNESS_MARKS_NM: readonly number[] = [100, 1e3, 1e4, 1e5, 1e6]

export function sheetHeightPx(thicknessNm: number): number {
  return LEAST_PX + DECADE_PX * Math.log10(Math.max(THINNEST_NM, thicknessNm) / THINNEST_NM)
}

/** In the unit a person would use: `85 nm`, `25 µm`, `0.7 mm`. */
export function thicknessText(thicknessNm: number): string {
  const short = (value: number): string => String(Number(value.toPrecision(4)))
  if (thicknessNm < 1000) return `${short(thicknessNm)} nm`
  return thicknessNm < 5e5 ? `${short(thicknessNm / 1e3)} µm` : `${short(thicknessNm / 1e6)} mm`
}
