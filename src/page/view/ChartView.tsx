import { Chart, type ChartConfiguration, registerables } from 'chart.js'
import { useEffect, useRef } from 'preact/hooks'

Chart.register(...registerables)

const configs = new WeakMap<HTMLCanvasElement, ChartConfiguration>()

/** What a canvas of the page shows at the moment. */
export function configOf(canvas: HTMLCanvasElement): ChartConfiguration | undefined {
  return configs.get(canvas)
}

interface ChartViewProps {
  readonly name: string
  readonly config: ChartConfiguration
  /** Said in place of the picture. */
  readonly label: string
  readonly heightPx: number
}

/** A chart that takes over a new configuration without being made anew. */
export function ChartView({ name, config, label, heightPx }: ChartViewProps) {
  const canvas = useRef<HTMLCanvasElement>(null)
  const chart = useRef<Chart | undefined>(undefined)
  useEffect(() => {
    if (chart.current !== undefined) update(chart.current, config)
    else if (canvas.current !== null) chart.current = new Chart(canvas.current, responsive(config))
    if (canvas.current !== null) configs.set(canvas.current, config)
  }, [config])
  useEffect(() => () => chart.current?.destroy(), [])
  return (
    <div class="chart" style={{ height: `${heightPx}px` }}>
      <canvas ref={canvas} role="img" aria-label={label} data-chart={name} />
    </div>
  )
}

function update(chart: Chart, config: ChartConfiguration): void {
  const start = performance.now()
  const { data, options, plugins } = responsive(config)
  chart.data = data
  chart.options = options ?? {}
  // The painters close over the data they paint: they are exchanged with it.
  const own = chart.config.plugins as NonNullable<ChartConfiguration['plugins']>
  own.splice(0, own.length, ...(plugins ?? []))
  chart.update('none')
  performance.measure('draw', { start, end: performance.now() })
}

function responsive(config: ChartConfiguration): ChartConfiguration {
  const { plugins, ...options } = config.options ?? {}
  return { ...config, options: { ...options, plugins, responsive: true }, plugins: [...(config.plugins ?? [])] }
}
