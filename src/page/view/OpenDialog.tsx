import { useEffect, useRef } from 'preact/hooks'
import type { Places } from '../state/usePlaces.js'

/** What can be opened: the served folder's stack files, the invented ones, and the user's own. */
export function OpenDialog({ places }: { readonly places: Places }) {
  const dialog = useRef<HTMLDialogElement>(null)
  const folder = useRef<HTMLInputElement>(null)
  useEffect(() => {
    dialog.current?.showModal()
    folder.current?.setAttribute('webkitdirectory', '')
  }, [])
  const pick = (input: HTMLInputElement): void => void places.pick([...(input.files ?? [])])
  return (
    <dialog ref={dialog} aria-labelledby="open-title" onClose={places.cancel}>
      <h2 id="open-title">Open a stack file</h2>
      <div class="picks">
        <label class="button">
          file from this computer
          <input type="file" multiple accept=".yaml,.yml,.csv" onChange={(event) => pick(event.currentTarget)} />
        </label>
        <label class="button">
          folder with its films
          <input ref={folder} type="file" onChange={(event) => pick(event.currentTarget)} />
        </label>
      </div>
      {places.listed.map(({ place, files }) => (
        <section key={place.kind}>
          <h3>{place.name}</h3>
          <ul class="files">
            {files.map((file) => (
              <li key={file}>
                <button type="button" onClick={() => void places.open(place, file)}>
                  {file}
                </button>
              </li>
            ))}
          </ul>
        </section>
      ))}
      <form method="dialog">
        <button type="submit">close</button>
      </form>
    </dialog>
  )
}
