import { fileURLToPath } from 'node:url'
import type { ChartConfiguration, ChartItem } from 'chart.js'

export interface Drawing {
  /** Sheet in CSS pixels. */
  readonly width: number
  readonly height: number
  /** PNG pixels per CSS pixel; 2 prints well at 17 cm width. SVG has no pixels. */
  readonly scale?: number
  readonly format: 'png' | 'svg'
}

/** The build copies these beside the bundle and turns the addresses round (`resolveNewUrlToAsset` in rolldown.config.ts). */
const FONT_FILES = [
  new URL('../../node_modules/dejavu-fonts-ttf/ttf/DejaVuSans.ttf', import.meta.url),
  new URL('../../node_modules/dejavu-fonts-ttf/ttf/DejaVuSans-Bold.ttf', import.meta.url),
]

let tools: ReturnType<typeof loadTools> | undefined

/** Loaded at the first chart only: most commands draw none. */
async function loadTools() {
  const [canvas, chart] = await Promise.all([import('@napi-rs/canvas'), import('chart.js')])
  for (const file of FONT_FILES) {
    if (canvas.GlobalFonts.registerFromPath(fileURLToPath(file)) === null)
      throw new Error(`font not readable: ${file.href}`)
  }
  chart.Chart.register(...chart.registerables)
  return { canvas, chart }
}

/**
 * Draws a chart to the bytes of a PNG or SVG file. In the SVG, texts are outlines: it looks the same without the font.
 * @throws Error if the fonts beside the program are missing.
 */
export async function drawChart(config: ChartConfiguration, drawing: Drawing): Promise<Buffer> {
  tools ??= loadTools()
  const { canvas, chart } = await tools
  const { width, height, format } = drawing
  const scale = format === 'png' ? (drawing.scale ?? 2) : 1
  const sheet =
    format === 'png'
      ? canvas.createCanvas(width, height)
      : canvas.createCanvas(width, height, canvas.SvgExportFlag.ConvertTextToPaths)
  const drawn = new chart.Chart(sheet as unknown as ChartItem, {
    ...config,
    options: { ...config.options, responsive: false, animation: false, events: [], devicePixelRatio: scale },
  })
  const bytes = 'getContent' in sheet ? sheet.getContent() : await sheet.encode('png', { resolution: 96 * scale })
  drawn.destroy()
  return bytes
}
