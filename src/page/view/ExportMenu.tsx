import { useState } from 'preact/hooks'
import { jsonText } from '../../report/jsonText.js'
import { spectraCsv } from '../../report/spectraCsv.js'
import type { Shown } from '../state/shown.js'
import type { Design } from '../state/useDesign.js'
import { downloadText } from './download.js'
import { downloadPngs, downloadSvgs } from './downloadCharts.js'
import { useWriter } from './useWriter.js'

interface ExportMenuProps {
  readonly design: Design
  readonly present: Shown | undefined
}

export function ExportMenu({ design, present }: ExportMenuProps) {
  const write = useWriter()
  const [fault, setFault] = useState('')
  const { open, history } = design
  if (open === undefined || present === undefined) return null
  const { evaluation } = present.view
  const stem = open.opened.file.replace(/^.*\//, '').replace(/(\.stack)?\.ya?ml$/i, '')
  const items: readonly (readonly [string, () => void | Promise<void>])[] = [
    ['charts, PNG', () => downloadPngs(stem)],
    ['charts, SVG', () => downloadSvgs(stem)],
    ['spectra, CSV', () => downloadText(`${stem}.spectra.csv`, spectraCsv(evaluation), 'text/csv')],
    ['figures, JSON', () => downloadText(`${stem}.evaluate.json`, jsonText(evaluation), 'application/json')],
    ['stack file', async () => downloadText(`${stem}.stack.yaml`, await write(history.present))],
  ]
  const run = async (work: () => void | Promise<void>): Promise<void> => {
    setFault('')
    try {
      await work()
    } catch (error) {
      setFault(error instanceof Error ? error.message : String(error))
    }
  }
  return (
    <details class="menu">
      <summary>export</summary>
      <div class="menu-items">
        {items.map(([name, work]) => (
          <button key={name} type="button" onClick={() => void run(work)}>
            {name}
          </button>
        ))}
        <p class="note">
          For the design review: save, then <code>offblack report {open.opened.file}</code>
        </p>
        {fault !== '' && (
          <p class="fault" role="alert">
            {fault}
          </p>
        )}
      </div>
    </details>
  )
}
