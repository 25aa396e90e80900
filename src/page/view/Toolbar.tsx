import type { Shown } from '../state/shown.js'
import type { Design } from '../state/useDesign.js'
import type { Search } from '../state/useSearch.js'
import { CopyLink } from './CopyLink.js'
import { ExportMenu } from './ExportMenu.js'
import { SaveButton } from './SaveButton.js'
import type { Lighting } from './surround.js'

interface ToolbarProps {
  readonly design: Design
  readonly search: Search
  readonly present: Shown | undefined
  readonly held: Shown | undefined
  readonly lighting: Lighting
  readonly onLighting: () => void
  readonly onOpen: () => void
  readonly onHold: () => void
}

export function Toolbar({ design, search, present, held, lighting, onLighting, onOpen, onHold }: ToolbarProps) {
  const { open, history } = design
  const { running } = search
  const idle = open === undefined
  return (
    <header>
      <span class="name">offblack</span>
      <nav aria-label="Tools">
        <button type="button" onClick={onOpen}>
          open
        </button>
        <SaveButton design={design} />
        <button type="button" disabled={history.past.length === 0} onClick={design.undo}>
          undo
        </button>
        <button type="button" disabled={history.future.length === 0} onClick={design.redo}>
          redo
        </button>
        <button type="button" disabled={present === undefined} aria-pressed={held !== undefined} onClick={onHold}>
          {held === undefined ? 'hold to compare' : 'let go'}
        </button>
        {held !== undefined && (
          <button type="button" onClick={() => design.set(heldAgain(held, design))}>
            back to before
          </button>
        )}
        {running === undefined ? (
          <button
            type="button"
            disabled={idle || open.stack.optimize === undefined}
            onClick={() => void search.start()}
          >
            optimize
          </button>
        ) : (
          <button type="button" class="running" onClick={search.stop}>
            stop, {Math.round(100 * running.done)} %
          </button>
        )}
        <CopyLink design={design} />
        <ExportMenu design={design} present={present} />
      </nav>
      <button type="button" aria-pressed={lighting === 'dark'} onClick={onLighting}>
        dark room
      </button>
    </header>
  )
}

/** The held values, and the file's own where the held state had them. */
function heldAgain({ values }: Shown, { open, history }: Design) {
  const own = Object.fromEntries((open?.parameters ?? []).map(({ path, value }) => [path, value]))
  return { ...Object.fromEntries(Object.keys(history.present).map((path) => [path, own[path]])), ...values }
}
