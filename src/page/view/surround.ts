/**
 * The room the screen is judged in. As in a viewing booth everything but the light under judgment is a neutral gray: the
 * surround sets the eye's adaptation, and a tinted one would tint a neutral black. CIELAB lightness L*, a* = b* = 0.
 */
import { DARK, PAPER, type Theme } from '../../charts/theme.js'
import { linearRgbToSrgb, srgbToHex } from '../../color/srgb.js'

export type Lighting = 'light' | 'dark'

/** Of the page around the sheets. */
export const SURROUND_LIGHTNESS: Readonly<Record<Lighting, number>> = { light: 84, dark: 5 }
/** Of the sheets that carry text and charts. */
const SHEET_LIGHTNESS: Readonly<Record<Lighting, number>> = { light: 97, dark: 12 }
/** The laminate is a dark slab in either room. */
const SLAB_LIGHTNESS: Readonly<Record<Lighting, number>> = { light: 16, dark: 18 }

const TYPE = { family: 'Arial', titleSize: 13, textSize: 11, smallSize: 11, lineWidth: 1.75, markerRadius: 4 } as const

export function chartTheme(lighting: Lighting): Theme {
  return { ...(lighting === 'light' ? PAPER : DARK), ...TYPE, paper: neutralGray(SHEET_LIGHTNESS[lighting]) }
}

/** Hands the grays to the style sheet. */
export function lightRoom(root: HTMLElement, lighting: Lighting): void {
  const { ink, muted, faint, limit, series } = chartTheme(lighting)
  const grays = {
    surround: neutralGray(SURROUND_LIGHTNESS[lighting]),
    sheet: neutralGray(SHEET_LIGHTNESS[lighting]),
    slab: neutralGray(SLAB_LIGHTNESS[lighting]),
    ink,
    // The slab has inks of its own; what stands in the room above it has this.
    'room-ink': ink,
    muted,
    faint,
    accent: limit,
    bar: series[0].color,
  }
  for (const [name, color] of Object.entries(grays)) root.style.setProperty(`--${name}`, color)
  root.style.colorScheme = lighting
}

/** `#rrggbb` of the gray of that L*. */
export function neutralGray(lightness: number): string {
  const luminance = lightness > 8 ? ((lightness + 16) / 116) ** 3 : (lightness * 27) / 24389
  return srgbToHex(linearRgbToSrgb([luminance, luminance, luminance]))
}
