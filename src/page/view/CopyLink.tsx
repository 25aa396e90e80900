import { useState } from 'preact/hooks'
import { writeLink } from '../state/link.js'
import type { Design } from '../state/useDesign.js'

/** Puts the state into the address and the address onto the clipboard. */
export function CopyLink({ design }: { readonly design: Design }) {
  const [told, tell] = useState('')
  const { open, history } = design
  const copy = async (): Promise<void> => {
    if (open === undefined) return
    const hash = await writeLink(open.place.kind, open.opened, history.present, open.parameters)
    window.history.replaceState(null, '', hash)
    const copied = await navigator.clipboard.writeText(location.href).then(
      () => true,
      () => false,
    )
    tell(copied ? 'copied' : 'the link is in the address bar')
  }
  return (
    <>
      <button type="button" disabled={open === undefined} onClick={() => void copy()}>
        copy link
      </button>
      <span role="status" class="told">
        {told}
      </span>
    </>
  )
}
