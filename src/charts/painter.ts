import type { Chart, Plugin } from 'chart.js'
import type { Pen } from './pen.js'

/** Where a painter may draw, in pixels. */
export interface Plane {
  /** The whole sheet. */
  readonly width: number
  readonly height: number
  /** The plot inside the axes. */
  readonly area: {
    readonly left: number
    readonly right: number
    readonly top: number
    readonly bottom: number
    readonly width: number
    readonly height: number
  }
  /** Pixel of a value on the scale of that id. */
  readonly at: (scaleId: string, value: number) => number
  /** Centers of the ends of a data set's bars, or of its points. */
  readonly ends: (datasetIndex: number) => readonly { readonly x: number; readonly y: number }[]
}

/** Stages: the sheet before anything, under the data (over the grid), over the data. */
export type Stage = 'beforeDraw' | 'beforeDatasetsDraw' | 'afterDatasetsDraw'

/** A drawing of our own in a chart. The pen is given back as it was. */
export function painter(id: string, stage: Stage, paint: (pen: Pen, plane: Plane) => void): Plugin {
  return {
    id,
    [stage]: (chart: Chart) => {
      const pen: Pen = chart.ctx
      pen.save()
      paint(pen, {
        width: chart.width,
        height: chart.height,
        area: chart.chartArea,
        at: (scaleId, value) => chart.scales[scaleId].getPixelForValue(value),
        ends: (datasetIndex) => chart.getDatasetMeta(datasetIndex).data,
      })
      pen.restore()
    },
  }
}

/**
 * Makes the plot a square in the middle of the room it has, so that both axes have the same scale (planes, polar maps,
 * spheres). `marginPx` leaves room around it for marks.
 */
export function squareArea(marginPx = 0): Plugin {
  return {
    id: 'squareArea',
    afterLayout(chart: Chart) {
      const { area, x, y } = { area: chart.chartArea, x: chart.scales.x, y: chart.scales.y }
      const side = Math.min(area.width, area.height) - 2 * marginPx
      area.left += (area.width - side) / 2
      area.top += (area.height - side) / 2
      area.right = area.left + side
      area.bottom = area.top + side
      area.width = side
      area.height = side
      Object.assign(x, {
        left: area.left,
        right: area.right,
        width: side,
        top: area.bottom,
        bottom: area.bottom + x.height,
      })
      Object.assign(y, {
        top: area.top,
        bottom: area.bottom,
        height: side,
        right: area.left,
        left: area.left - y.width,
      })
      x.configure()
      y.configure()
    },
  }
}
