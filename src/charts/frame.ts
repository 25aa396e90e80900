import type { ChartDataset, ChartOptions, ChartTypeRegistry, Plugin, TooltipItem } from 'chart.js'
import { painter } from './painter.js'
import type { Theme } from './theme.js'
import { wrapText } from './wrapText.js'

/** What fits on the narrowest sheet in use, 720 px. */
const TITLE_LETTERS = 62
const NOTE_LETTERS = 90

export interface FrameText {
  readonly title: string
  /** Figures and remarks under the title, one a line. */
  readonly notes?: readonly string[]
  /** What the legend shows of a series; default its line. */
  readonly legend?: 'lines' | 'markers'
  /** Values under the pointer, on the page. */
  readonly hover?: (item: TooltipItem<keyof ChartTypeRegistry>) => string
}

/** What is the same in every chart: title, notes, legend, margins, calm (no animation). */
export function frameOptions(theme: Theme, text: FrameText, rightMargin = 0): ChartOptions {
  const { family, textSize, smallSize } = theme
  return {
    animation: false,
    locale: 'en-US',
    maintainAspectRatio: false,
    layout: { padding: { left: 14, right: 20 + rightMargin, top: 12, bottom: 12 } },
    plugins: {
      title: {
        display: true,
        text: wrapText(text.title, TITLE_LETTERS),
        align: 'start',
        color: theme.ink,
        font: { family, size: theme.titleSize, weight: 'bold' },
        padding: { top: 0, bottom: 6 },
      },
      subtitle: {
        display: (text.notes ?? []).length > 0,
        text: (text.notes ?? []).flatMap((note) => wrapText(note, NOTE_LETTERS)),
        align: 'start',
        color: theme.muted,
        font: { family, size: smallSize, lineHeight: 1.35 },
        padding: { top: 0, bottom: 6 },
      },
      legend: {
        align: 'start',
        labels: {
          color: theme.ink,
          font: { family, size: textSize },
          usePointStyle: true,
          ...(text.legend === 'markers' ? {} : { pointStyleWidth: 44 }),
          boxHeight: 9,
          padding: 12,
          generateLabels: (chart) =>
            chart.data.datasets.flatMap((dataset, datasetIndex) =>
              dataset.label ? [legendItem(theme, dataset, datasetIndex, !chart.isDatasetVisible(datasetIndex))] : [],
            ),
        },
      },
      tooltip: {
        backgroundColor: theme.ink,
        titleColor: theme.paper,
        bodyColor: theme.paper,
        titleFont: { family, size: smallSize },
        bodyFont: { family, size: smallSize },
        displayColors: false,
        ...(text.hover ? { callbacks: { title: () => '', label: text.hover } } : {}),
      },
    },
  }
}

/** A line shows its dash, an area its fill, points their marker. */
function legendItem(theme: Theme, dataset: ChartDataset, datasetIndex: number, hidden: boolean) {
  const look = dataset as {
    showLine?: boolean
    fill?: unknown
    borderColor?: string
    backgroundColor?: string | string[]
    borderDash?: number[]
    borderWidth?: number
    pointStyle?: string
  }
  const filled = look.fill !== undefined || dataset.type === 'bar'
  return {
    text: dataset.label ?? '',
    datasetIndex,
    hidden,
    fontColor: theme.ink,
    // Points may differ among themselves (hollow behind the sphere): the legend shows the solid one.
    fillStyle: Array.isArray(look.backgroundColor) ? look.borderColor : look.backgroundColor,
    strokeStyle: look.borderColor,
    lineWidth: filled ? 1 : (look.borderWidth ?? 1),
    lineDash: look.showLine ? (look.borderDash ?? []) : [],
    pointStyle: (filled ? 'rect' : look.showLine ? 'line' : (look.pointStyle ?? 'circle')) as
      | 'rect'
      | 'line'
      | 'circle',
  }
}

/** Fills the sheet: transparent canvases print badly. */
export function paperPainter(theme: Theme): Plugin {
  return painter('paper', 'beforeDraw', (pen, plane) => {
    pen.fillStyle = theme.paper
    pen.fillRect(0, 0, plane.width, plane.height)
  })
}
