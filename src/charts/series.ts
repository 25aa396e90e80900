import type { SeriesStyle, Theme } from './theme.js'

type Numbers = readonly number[]

/** The part of a Chart.js data set the charts use; any of it may be overridden in place. */
export interface Series {
  type: 'scatter'
  /** Absent from the legend if empty. */
  label: string
  data: { x: number; y: number }[]
  yAxisID: string
  borderColor: string
  backgroundColor: string
  borderWidth: number
  showLine?: boolean
  stepped?: 'before' | 'after'
  fill?: 'origin'
  borderDash?: number[]
  pointStyle?: SeriesStyle['marker']
  pointRadius: number
  pointHoverRadius?: number
  pointHitRadius?: number
  /** Drawn from the highest to the lowest. */
  order?: number
}

function pairs(x: Numbers, y: Numbers): { x: number; y: number }[] {
  return x.map((value, i) => ({ x: value, y: y[i] }))
}

/** A curve through the samples; `yAxis` names its scale. */
export function lineSeries(
  theme: Theme,
  label: string,
  x: Numbers,
  y: Numbers,
  style: SeriesStyle,
  yAxis = 'y',
): Series {
  return {
    type: 'scatter',
    label,
    data: pairs(x, y),
    showLine: true,
    yAxisID: yAxis,
    borderColor: style.color,
    backgroundColor: style.color,
    borderWidth: theme.lineWidth,
    borderDash: [...style.dash],
    pointRadius: 0,
    pointHitRadius: 6,
  }
}

/** Points, solid or hollow. */
export function pointSeries(
  theme: Theme,
  label: string,
  x: Numbers,
  y: Numbers,
  style: SeriesStyle,
  look: { readonly hollow?: boolean; readonly radius?: number; readonly yAxis?: string } = {},
): Series {
  return {
    type: 'scatter',
    label,
    data: pairs(x, y),
    yAxisID: look.yAxis ?? 'y',
    borderColor: style.color,
    backgroundColor: look.hollow ? theme.paper : style.color,
    borderWidth: look.hollow ? 1.75 : 1,
    pointStyle: style.marker,
    pointRadius: look.radius ?? theme.markerRadius,
    pointHoverRadius: (look.radius ?? theme.markerRadius) + 2,
  }
}

/** An area from the foot of its scale, behind the curves. */
export function areaSeries(theme: Theme, label: string, x: Numbers, y: Numbers, yAxis: string): Series {
  return {
    type: 'scatter',
    label,
    data: pairs(x, y),
    showLine: true,
    fill: 'origin',
    yAxisID: yAxis,
    borderColor: theme.faint,
    backgroundColor: theme.wash,
    borderWidth: 1,
    pointRadius: 0,
    pointHitRadius: 0,
    order: 10,
  }
}

/** Points without a marker, so that the page has something under the pointer where a chart is painted. */
export function hoverPoints(theme: Theme, points: readonly { readonly x: number; readonly y: number }[]): Series {
  return {
    type: 'scatter',
    label: '',
    data: points.map(({ x, y }) => ({ x, y })),
    yAxisID: 'y',
    borderColor: theme.paper,
    backgroundColor: theme.ink,
    borderWidth: 1,
    pointRadius: 0,
    pointHitRadius: 8,
    pointHoverRadius: 4,
  }
}
