import type { ChartConfiguration } from 'chart.js'
import { linearAxis } from './axis.js'
import { frameOptions, paperPainter } from './frame.js'
import { painter } from './painter.js'
import { panelAxes } from './panels.js'
import { strokeSegment } from './pen.js'
import { givenText, numberText, PERCENT } from './quantity.js'
import { lineSeries, pointSeries } from './series.js'
import { seriesStyle, type Theme } from './theme.js'

export interface ResidualsData {
  readonly title: string
  readonly notes?: readonly string[]
  /** One entry a direction; arrays over its own wavelengths, reflectances as fractions. */
  readonly directions: readonly {
    readonly label: string
    readonly wavelengthNm: readonly number[]
    readonly measured: readonly number[]
    readonly model: readonly number[]
  }[]
  /** Standard deviation of one measured reflectance. */
  readonly noise?: number
}

/** Measured points on the fitted model, and below what is left between them. */
export function residuals(data: ResidualsData, theme: Theme): ChartConfiguration {
  const { directions, noise } = data
  const percent = (values: readonly number[]): number[] => values.map((value) => 100 * value)
  const wavelengths = directions.flatMap((d) => d.wavelengthNm)
  return {
    type: 'scatter',
    data: {
      datasets: directions.flatMap(({ label, wavelengthNm, measured, model }, i) => {
        const style = seriesStyle(theme, i)
        const left = percent(measured.map((value, j) => value - model[j]))
        return [
          lineSeries(theme, label, wavelengthNm, percent(model), style),
          pointSeries(theme, '', wavelengthNm, percent(measured), style, { radius: 3, hollow: true }),
          { ...lineSeries(theme, '', wavelengthNm, left, style, 'residual'), borderWidth: 1.5 },
        ]
      }),
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: [
          'points: measured; lines: model',
          ...(noise ? [`dashed: ± one standard deviation of the noise, ${givenText(PERCENT, noise)}`] : []),
          ...(data.notes ?? []),
        ],
        hover: ({ parsed }) => `${numberText(parsed.y ?? 0)} % at ${parsed.x} nm`,
      }),
      scales: {
        ...panelAxes(theme, [
          { id: 'y', quantity: { label: 'reflectance', ...PERCENT }, weight: 2.2 },
          { id: 'residual', quantity: { label: 'measured − model', ...PERCENT } },
        ]),
        x: linearAxis(theme, {
          title: 'wavelength (nm)',
          min: Math.min(...wavelengths),
          max: Math.max(...wavelengths),
        }),
      },
    },
    plugins: [
      paperPainter(theme),
      painter('noise', 'beforeDatasetsDraw', (pen, { area, at }) => {
        const line = (value: number, dash: number[]): void =>
          strokeSegment(pen, [area.left, at('residual', value)], [area.right, at('residual', value)], {
            color: theme.muted,
            dash,
          })
        line(0, [])
        for (const sign of noise ? [-1, 1] : []) line(100 * sign * (noise ?? 0), [4, 3])
      }),
    ],
  }
}
