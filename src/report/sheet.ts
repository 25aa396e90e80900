import type { ChartConfiguration } from 'chart.js'

/** A chart to be drawn on paper. */
export interface Sheet {
  /** Of its files, without ending. */
  readonly name: string
  readonly chart: ChartConfiguration
  /** CSS pixels. */
  readonly width: number
  readonly height: number
}
