import { useState } from 'preact/hooks'
import type { Theme } from '../../charts/theme.js'
import type { Itinerary, Pass } from '../../studies/itinerary.js'
import type { Values } from '../engine/messages.js'
import type { OpenDesign } from '../state/useDesign.js'
import { EllipseGlyph } from './EllipseGlyph.js'
import { PartNumbers } from './PartNumbers.js'
import { Sheet } from './Sheet.js'

interface LaminateProps {
  readonly open: OpenDesign
  readonly values: Values
  readonly itinerary: Itinerary | undefined
  /** Of what stands in the slab, and of what stands in the room above it. */
  readonly theme: Theme
  readonly roomTheme: Theme
  readonly onSet: (changes: Values, gesture?: string) => void
}

/** The laminate edge-on, the room above, the panel below; between the sheets the state of the light, in and back. */
export function Laminate({ open, values, itinerary, theme, roomTheme, onSet }: LaminateProps) {
  const { layers } = open.stack
  const [selected, select] = useState<string>()
  const passes = itinerary?.passes ?? []
  const find = (layer: string, direction: Pass['direction']) =>
    passes.find((pass) => pass.layer === layer && pass.direction === direction)
  const toggle = (id: string): void => select(selected === id ? undefined : id)
  const numbers = (id: string) =>
    selected === id && <PartNumbers id={id} parameters={open.parameters} values={values} onSet={onSet} />
  return (
    <section class="laminate" aria-labelledby="laminate-title">
      <h2 id="laminate-title">Laminate</h2>
      <p class="scale">
        Height of a sheet: log of its thickness. Between the sheets: light of 550 nm, on its way in ↓ and back ↑, as the
        viewer sees it.
      </p>
      <div class="slab">
        <Face below="" above="room" incoming={undefined} returning={find('air', 'out')} theme={roomTheme} />
        {layers.map((layer, k) => {
          const next = layers[k + 1]?.id ?? 'panel'
          return (
            <div key={layer.id}>
              <Sheet
                layer={layer}
                parameters={open.parameters}
                values={values}
                selected={selected === layer.id}
                onSelect={() => toggle(layer.id)}
                onSet={onSet}
              />
              {numbers(layer.id)}
              <Face
                above={layer.id}
                below={next}
                incoming={find(layer.id, 'in')}
                returning={find(next, 'out')}
                theme={theme}
              />
            </div>
          )
        })}
        <div class="sheet panel" aria-current={selected === 'panel'}>
          <span class="thickness">panel</span>
          <button type="button" class="sheet-name" aria-expanded={selected === 'panel'} onClick={() => toggle('panel')}>
            {open.stack.panel.kind}
          </button>
        </div>
        {numbers('panel')}
      </div>
    </section>
  )
}

interface FaceProps {
  readonly above: string
  readonly below: string
  readonly incoming: Pass | undefined
  readonly returning: Pass | undefined
  readonly theme: Theme
}

function Face({ above, below, incoming, returning, theme }: FaceProps) {
  const where = below === '' ? 'in the room' : `between ${above} and ${below}`
  return (
    <div class={below === '' ? 'face room' : 'face'}>
      {below === '' && <span>room</span>}
      <EllipseGlyph pass={incoming} goingIn={true} where={where} theme={theme} />
      {returning !== undefined && <EllipseGlyph pass={returning} goingIn={false} where={where} theme={theme} />}
    </div>
  )
}
