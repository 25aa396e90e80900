import type { ChartConfiguration } from 'chart.js'
import { hiddenAxis, linearAxis } from './axis.js'
import { frameOptions, paperPainter } from './frame.js'
import { painter } from './painter.js'
import { directionText, numberText, PERCENT, quantityText } from './quantity.js'
import { lightToHex } from './screenColor.js'
import { areaSeries, lineSeries } from './series.js'
import { seriesStyle, type Theme } from './theme.js'

/** Arrays run over `wavelengthNm`; reflectances are fractions. */
export interface ReflectanceSpectrumData {
  readonly title: string
  /** Where the eye stands. */
  readonly direction: { readonly thetaRad: number; readonly phiRad: number }
  /** Ascending. */
  readonly wavelengthNm: readonly number[]
  /** One design, or two: before and after. */
  readonly designs: readonly {
    readonly name: string
    readonly reflectance: readonly number[]
    readonly luminousReflectance: number
    readonly colorWeightedReflectance: number
  }[]
  /** Of the faces in front of the polarizer: the floor of any design under them. */
  readonly frontReflectance: readonly number[]
  /** What the eye weighs the spectrum with, in any scale. */
  readonly weighting: { readonly name: string; readonly value: readonly number[] }
  /** XYZ of each wavelength (color-matching functions in any one scale) for the strip of light under the axis. */
  readonly lightXyz?: readonly (readonly [number, number, number])[]
}

const STRIP_PX = 9

/** Reflectance against wavelength, one or two designs over their floor. */
export function reflectanceSpectrum(data: ReflectanceSpectrumData, theme: Theme): ChartConfiguration {
  const { wavelengthNm, designs, lightXyz } = data
  const percent = (values: readonly number[]): number[] => values.map((value) => 100 * value)
  const highest = Math.max(...data.weighting.value)
  // The last design is the one that counts: it gets the first color and a solid line.
  const styleOf = (i: number) => seriesStyle(theme, designs.length - 1 - i)
  const notes = designs.map(
    (d) =>
      `${d.name}: luminous ${quantityText(PERCENT, d.luminousReflectance)}, color-weighted ${quantityText(PERCENT, d.colorWeightedReflectance)}`,
  )
  return {
    type: 'scatter',
    data: {
      datasets: [
        ...designs.map((d, i) => lineSeries(theme, d.name, wavelengthNm, percent(d.reflectance), styleOf(i))),
        {
          ...areaSeries(theme, 'front faces alone', wavelengthNm, percent(data.frontReflectance), 'y'),
          borderColor: theme.muted,
          borderDash: [4, 3],
          borderWidth: 1.5,
          order: 5,
        },
        areaSeries(
          theme,
          data.weighting.name,
          wavelengthNm,
          data.weighting.value.map((v) => v / highest),
          'weighting',
        ),
      ],
    },
    options: {
      ...frameOptions(theme, {
        title: `${data.title} — ${directionText(data.direction)}`,
        notes,
        hover: ({ dataset, parsed }) => `${dataset.label}: ${numberText(parsed.y ?? 0)} % at ${parsed.x} nm`,
      }),
      scales: {
        x: linearAxis(theme, {
          title: 'wavelength (nm)',
          min: wavelengthNm[0],
          max: wavelengthNm[wavelengthNm.length - 1],
          tickGapPx: lightXyz ? STRIP_PX + 6 : undefined,
        }),
        y: linearAxis(theme, { title: 'reflectance (%)', min: 0 }),
        weighting: hiddenAxis(0, 1.15),
      },
    },
    plugins: [paperPainter(theme), ...(lightXyz ? [lightStrip(wavelengthNm, lightXyz)] : [])],
  }
}

/** The colors of the wavelengths under the axis, dimmed where the eye hardly sees them. */
function lightStrip(wavelengthNm: readonly number[], lightXyz: readonly (readonly [number, number, number])[]) {
  const strengths = lightXyz.map(([x, y, z]) => x + y + z)
  const strongest = Math.max(...strengths)
  return painter('lightStrip', 'beforeDatasetsDraw', (pen, { area, at }) => {
    for (let i = 0; i + 1 < wavelengthNm.length; i++) {
      const left = at('x', wavelengthNm[i])
      const right = Math.min(area.right, at('x', wavelengthNm[i + 1]) + 0.5)
      pen.fillStyle = lightToHex(lightXyz[i], Math.min(1, 2 * (strengths[i] / strongest)) ** 0.8)
      pen.fillRect(left, area.bottom + 3, right - left, STRIP_PX)
    }
  })
}
