import {
  type Color,
  converter,
  differenceCiede2000,
  filterDeficiencyDeuter,
  filterDeficiencyProt,
  filterGrayscale,
  parse,
  wcagContrast,
} from 'culori'
import { describe, expect, it } from 'vitest'
import { DARK, PAPER, seriesStyle } from '../../src/charts/theme.js'

// Oracle: culori, a general color library.
const lab = converter('lab65')
const difference = differenceCiede2000()

describe.each([
  ['paper', PAPER],
  ['dark', DARK],
] as const)('theme %s', (_, theme) => {
  it('has an interface without color', () => {
    for (const gray of [theme.paper, theme.ink, theme.muted, theme.faint, theme.grid]) {
      const [, r, g, b] = /^#(..)(..)(..)$/.exec(gray) ?? []
      expect([r, g]).toEqual([g, b])
    }
  })

  it('has texts and data that stand off the sheet', () => {
    // WCAG 2.2, success criteria 1.4.3 (texts, 4.5:1) and 1.4.11 (graphics, 3:1).
    for (const text of [theme.ink, theme.muted, theme.limit])
      expect(wcagContrast(text, theme.paper)).toBeGreaterThan(4.5)
    for (const { color } of theme.series) expect(wcagContrast(color, theme.paper)).toBeGreaterThan(3)
  })

  it.each([
    ['normal', (color: Color) => color],
    ['deuteranopia', filterDeficiencyDeuter(1)],
    ['protanopia', filterDeficiencyProt(1)],
  ] as const)('has data colors that %s vision tells apart', (_name, seen) => {
    const colors = theme.series.map(({ color }) => seen(parse(color) as Color))
    for (const [i, color] of colors.entries()) {
      // CIEDE2000 of 10 is plain at a glance: common practice, no source.
      for (const other of colors.slice(i + 1)) expect(difference(color, other)).toBeGreaterThan(10)
    }
  })

  it('has series that differ without color: before and after also in gray', () => {
    for (const key of ['dash', 'marker'] as const) {
      expect(new Set(theme.series.map((style) => String(style[key]))).size).toBe(theme.series.length)
    }
    const gray = filterGrayscale(1)
    const [after, before] = theme.series.map(({ color }) => lab(gray(color))?.l ?? 0)
    expect(Math.abs(after - before)).toBeGreaterThan(15)
    const count = theme.series.length
    const styles = Array.from({ length: count * count }, (_, k) => JSON.stringify(seriesStyle(theme, k)))
    expect(new Set(styles).size).toBe(count * count)
    expect(seriesStyle(theme, count).color).toBe(theme.series[0].color)
  })

  it('has a map scale of evenly rising lightness, to every kind of vision', () => {
    const t = Array.from({ length: 21 }, (_, i) => i / 20)
    const lightness = t.map((value) => lab(theme.ramp(value))?.l ?? 0)
    const step = (lightness[20] - lightness[0]) / 20
    for (let i = 1; i <= 20; i++) {
      // Colors are rounded to 8 bits a channel: a few tenths of L*.
      expect(lightness[i] - lightness[i - 1]).toBeGreaterThan(step - 0.8)
      expect(lightness[i] - lightness[i - 1]).toBeLessThan(step + 0.8)
    }
    for (const seen of [filterDeficiencyDeuter(1), filterDeficiencyProt(1)]) {
      const rising = t.map((value) => lab(seen(parse(theme.ramp(value)) as Color))?.l ?? 0)
      for (let i = 1; i <= 20; i++) expect(rising[i]).toBeGreaterThan(rising[i - 1])
    }
  })
})
