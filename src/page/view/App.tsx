import { useEffect, useMemo, useState } from 'preact/hooks'
import type { Direction } from '../../stack/stack.js'
import type { Engine } from '../engine/engine.js'
import type { Shown } from '../state/shown.js'
import { useAppearance } from '../state/useAppearance.js'
import { useDesign } from '../state/useDesign.js'
import { useLighting } from '../state/useLighting.js'
import { usePlaces } from '../state/usePlaces.js'
import { useSearch } from '../state/useSearch.js'
import { Bench } from './Bench.js'
import { OpenDialog } from './OpenDialog.js'
import { Problems } from './Problems.js'
import { chartTheme } from './surround.js'
import { Timing } from './Timing.js'
import { Toolbar } from './Toolbar.js'
import { useKeys } from './useKeys.js'

const HEAD_ON: Direction = { theta: 0, phi: 0 }

export function App({ engine }: { readonly engine: Engine }) {
  const design = useDesign(engine)
  const places = usePlaces(design)
  const [lighting, switchLighting] = useLighting()
  const [place, lookFrom] = useState(0)
  const [held, hold] = useState<Shown>()
  const theme = useMemo(() => chartTheme(lighting), [lighting])
  const { open, history } = design
  const directions = open?.stack.conditions.directions ?? [HEAD_ON]
  const direction = directions[Math.min(place, directions.length - 1)]
  const appearance = useAppearance(engine, open, history.present, direction)
  const search = useSearch(engine, design)
  useKeys(design)
  useEffect(() => {
    hold(undefined)
    lookFrom(0)
  }, [open?.stack])

  const { view, cone } = appearance
  const present: Shown | undefined = view && {
    name: held === undefined ? 'now' : 'after',
    values: history.present,
    view,
    cone,
  }
  return (
    <>
      <Toolbar
        design={design}
        search={search}
        present={present}
        held={held}
        lighting={lighting}
        onLighting={switchLighting}
        onOpen={places.ask}
        onHold={() => hold(held === undefined && present !== undefined ? { ...present, name: 'before' } : undefined)}
      />
      {places.asking && <OpenDialog places={places} />}
      <main>
        <h1 class="title">{open?.stack.title ?? 'No stack file is open'}</h1>
        {[places.fault, appearance.fault].map((fault) => fault && <Problems key={fault} text={fault} />)}
        {design.problems !== '' && <Problems text={design.problems} />}
        {open !== undefined && open.warnings !== '' && <Problems text={open.warnings} mild />}
        {open !== undefined && present !== undefined && (
          <Bench
            open={open}
            design={design}
            shown={held === undefined ? [present] : [held, present]}
            budget={appearance.budget}
            search={search}
            place={Math.min(place, directions.length - 1)}
            onPlace={lookFrom}
            theme={theme}
          />
        )}
        {view !== undefined && <Timing viewMs={view.computeMs} coneMs={cone?.computeMs} />}
      </main>
    </>
  )
}
