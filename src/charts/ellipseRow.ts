import type { ChartConfiguration } from 'chart.js'
import { hiddenAxis } from './axis.js'
import { type Polarization, paintEllipse } from './ellipseGlyph.js'
import { frameOptions, paperPainter } from './frame.js'
import { type Plane, painter } from './painter.js'
import { type Pen, strokeSegment } from './pen.js'
import { PERCENT, quantityText } from './quantity.js'
import { fontOf, type Theme } from './theme.js'

export interface PassedState extends Polarization {
  /** Power, as a fraction of what came from the room. */
  readonly share: number
}

export interface EllipseRowData {
  readonly title: string
  readonly notes?: readonly string[]
  /** From the viewer's side to the panel. `goingIn` is the state behind the layer, `comingBack` the state in front of it. */
  readonly layers: readonly { readonly name: string; readonly goingIn: PassedState; readonly comingBack: PassedState }[]
}

const ROWS = { goingIn: 0.72, comingBack: 0.26 } as const

/**
 * The light's ellipse behind each layer on its way in, and in front of each on its way back. Give the sheet at least 80 px
 * a layer.
 */
export function ellipseRow(data: EllipseRowData, theme: Theme): ChartConfiguration {
  const { layers } = data
  return {
    type: 'scatter',
    data: {
      datasets: (['goingIn', 'comingBack'] as const).map((way) => ({
        type: 'scatter' as const,
        label: '',
        data: layers.map((_, i) => ({ x: i + 0.5, y: ROWS[way] })),
        pointRadius: 0,
        pointHitRadius: 20,
      })),
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: [
          'as the viewer sees it; solid: right-handed (named from the source), dashed: left-handed; gray: unpolarized part',
          ...(data.notes ?? []),
        ],
        hover: ({ datasetIndex, dataIndex }) =>
          stateText(layers[dataIndex][datasetIndex === 0 ? 'goingIn' : 'comingBack']),
      }),
      scales: { x: hiddenAxis(-0.55, layers.length), y: hiddenAxis(0, 1) },
    },
    plugins: [
      paperPainter(theme),
      painter('ellipses', 'afterDatasetsDraw', (pen, plane) => paintRows(pen, plane, layers, theme)),
    ],
  }
}

function stateText({ share, azimuthRad, ellipticityRad, degree }: PassedState): string {
  const degrees = (rad: number): string => `${((rad * 180) / Math.PI).toFixed(1).replace('-', '−')}°`
  return `${quantityText(PERCENT, share)}, azimuth ${degrees(azimuthRad)}, ellipticity ${degrees(ellipticityRad)}, polarized ${quantityText(PERCENT, degree)}`
}

function paintRows(pen: Pen, { area, at }: Plane, layers: EllipseRowData['layers'], theme: Theme): void {
  const column = at('x', 1) - at('x', 0)
  const radius = Math.min(0.36 * column, 0.15 * area.height)
  pen.textBaseline = 'middle'
  pen.font = fontOf(theme, theme.smallSize)
  pen.textAlign = 'left'
  pen.fillStyle = theme.muted
  pen.fillText('going in →', area.left, at('y', ROWS.goingIn))
  pen.fillText('← back', area.left, at('y', ROWS.comingBack))
  pen.textAlign = 'center'
  layers.forEach((layer, i) => {
    const x = at('x', i + 0.5)
    if (i > 0) strokeSegment(pen, [at('x', i), at('y', 0.93)], [at('x', i), area.bottom], { color: theme.grid })
    pen.fillStyle = theme.ink
    nameLines(pen, layer.name, 0.94 * column).forEach((line, row) => {
      pen.fillText(line, x, at('y', 0.97) + row * theme.smallSize * 1.2)
    })
    for (const way of ['goingIn', 'comingBack'] as const) {
      const y = at('y', ROWS[way])
      paintEllipse(pen, [x, y], radius, layer[way], way === 'goingIn', theme)
      pen.fillStyle = theme.ink
      pen.fillText(quantityText(PERCENT, layer[way].share), x, y + radius + 13)
    }
  })
}

/** The name broken at underscores, spaces and hyphens where it is wider than its column, two lines at most. */
function nameLines(pen: Pen, name: string, width: number): string[] {
  if (pen.measureText(name).width <= width) return [name]
  const parts = name.split(/(?<=[_\s-])/)
  const half = Math.ceil(parts.length / 2)
  return [parts.slice(0, half).join(''), parts.slice(half).join('')]
    .map((line) => shortened(pen, line, width))
    .filter(Boolean)
}

function shortened(pen: Pen, line: string, width: number): string {
  if (pen.measureText(line).width <= width) return line
  let kept = line
  while (kept.length > 1 && pen.measureText(`${kept}…`).width > width) kept = kept.slice(0, -1)
  return `${kept}…`
}
