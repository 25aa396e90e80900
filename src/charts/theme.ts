import { darkRamp, paperRamp } from './ramp.js'

/** A data series is told from its neighbors by color, by dash and by marker: any one of the three is enough. */
export interface SeriesStyle {
  readonly color: string
  readonly dash: readonly number[]
  readonly marker: 'circle' | 'triangle' | 'rect' | 'rectRot' | 'star'
}

/** Everything the charts know about appearance. Lengths are pixels at a chart width of 900. */
export interface Theme {
  readonly paper: string
  readonly ink: string
  /** Text of second rank. */
  readonly muted: string
  /** Frames, leader lines, reference circles. */
  readonly faint: string
  readonly grid: string
  /** Filled areas behind the data; translucent, so that areas may lie over one another. */
  readonly wash: string
  /** Limits of the stack file, and what misses them. */
  readonly limit: string
  readonly series: readonly SeriesStyle[]
  /** Color of a map at t in [0, 1]; lightness rises evenly with t. */
  readonly ramp: (t: number) => string
  readonly family: string
  readonly titleSize: number
  readonly textSize: number
  readonly smallSize: number
  readonly lineWidth: number
  readonly markerRadius: number
}

const TYPE = {
  family: 'DejaVu Sans',
  titleSize: 18,
  textSize: 14,
  smallSize: 13,
  lineWidth: 2.25,
  markerRadius: 5,
} as const

const DASHES: readonly (readonly number[])[] = [[], [9, 4], [2, 3], [11, 3, 2, 3], [5, 3]]
const MARKERS = ['circle', 'triangle', 'rect', 'rectRot', 'star'] as const

function seriesOf(colors: readonly string[]): SeriesStyle[] {
  return colors.map((color, i) => ({ color, dash: DASHES[i], marker: MARKERS[i] }))
}

/**
 * The interface is neutral gray, like a viewing booth: only light and data have color.
 * The five data colors (blue, rust, green, plum, ochre) come from a random search in OKLCH for the set whose nearest pair,
 * in CIEDE2000 under simulated deuteranopia, protanopia and normal vision, lies farthest apart with a contrast of at least
 * 3:1 against the paper; the tests check both again.
 */
export const PAPER: Theme = {
  ...TYPE,
  paper: '#ffffff',
  ink: '#1a1a1a',
  muted: '#555555',
  faint: '#9a9a9a',
  grid: '#e6e6e6',
  wash: 'rgba(0, 0, 0, 0.07)',
  limit: '#771d00',
  series: seriesOf(['#1d7ebc', '#771d00', '#007c59', '#67005e', '#a88800']),
  ramp: paperRamp,
}

/** The same on a dark surround (L* = 10). */
export const DARK: Theme = {
  ...TYPE,
  paper: '#1c1c1c',
  ink: '#f0f0f0',
  muted: '#b4b4b4',
  faint: '#7d7d7d',
  grid: '#343434',
  wash: 'rgba(255, 255, 255, 0.09)',
  limit: '#e06340',
  series: seriesOf(['#b1d8ff', '#e06340', '#86d5b5', '#bd5dbd', '#ffb739']),
  ramp: darkRamp,
}

/** Style of the i-th series; beyond five the colors begin again, each with the next dash and marker. */
export function seriesStyle({ series }: Theme, index: number): SeriesStyle {
  const round = Math.floor(index / series.length)
  const { dash, marker } = series[(index + round) % series.length]
  return { ...series[index % series.length], dash, marker }
}

/** CSS font of the theme. */
export function fontOf(theme: Theme, sizePx: number, weight: 'normal' | 'bold' = 'normal'): string {
  return `${weight} ${sizePx}px "${theme.family}"`
}
