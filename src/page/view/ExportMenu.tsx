import { spectraCsv } from '../../report/spectraCsv.js'
import type { Shown } from '../state/shown.js'
import type { Design } from '../state/useDesign.js'
import { downloadBlob, downloadText } from './download.js'
import { useWriter } from './useWriter.js'

interface ExportMenuProps {
  readonly design: Design
  readonly present: Shown | undefined
}

export function ExportMenu({ design, present }: ExportMenuProps) {
  const write = useWriter()
  const { open, history } = design
  if (open === undefined || present === undefined) return null
  const stem = open.opened.file.replace(/^.*\//, '').replace(/(\.stack)?\.ya?ml$/i, '')
  return (
    <details class="menu">
      <summary>export</summary>
      <div class="menu-items">
        <button type="button" onClick={() => void exportPngs(stem)}>
          charts, PNG
        </button>
        <button
          type="button"
          onClick={() => downloadText(`${stem}.spectra.csv`, spectraCsv(present.view.evaluation), 'text/csv')}
        >
          spectra, CSV
        </button>
        <button
          type="button"
          onClick={() => void write(history.present).then((text) => downloadText(`${stem}.stack.yaml`, text))}
        >
          stack file
        </button>
      </div>
    </details>
  )
}

async function exportPngs(stem: string): Promise<void> {
  for (const canvas of document.querySelectorAll<HTMLCanvasElement>('canvas[data-chart]')) {
    const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/png'))
    if (blob !== null) downloadBlob(`${stem}.${canvas.dataset.chart}.png`, blob)
  }
}
