import { useState } from 'preact/hooks'
import type { Design } from '../state/useDesign.js'
import { downloadText } from './download.js'
import { useWriter } from './useWriter.js'

/** Into the served folder where the file came from there, else as a download. */
export function SaveButton({ design }: { readonly design: Design }) {
  const [told, tell] = useState('')
  const write = useWriter()
  const { open, history, saved } = design
  const changed = history.present !== saved && JSON.stringify(history.present) !== JSON.stringify(saved)
  const save = async (): Promise<void> => {
    if (open === undefined) return
    const { place, opened } = open
    try {
      const text = await write(history.present)
      if (place.save === undefined) downloadText(fileName(opened.file), text)
      design.markSaved(await place.save?.(opened.file, text, opened.version))
      tell(place.save === undefined ? 'downloaded' : `saved ${opened.file}`)
    } catch (error) {
      tell(error instanceof Error ? error.message : String(error))
    }
  }
  return (
    <>
      <button type="button" disabled={open === undefined} onClick={() => void save()}>
        save{changed ? ' *' : ''}
      </button>
      <span role="status" class="told">
        {told}
      </span>
    </>
  )
}

function fileName(path: string): string {
  return path.slice(path.lastIndexOf('/') + 1)
}
