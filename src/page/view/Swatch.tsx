import { useState } from 'preact/hooks'
import { numberText } from '../../charts/quantity.js'
import { given } from '../../report/decimals.js'
import type { OffStateSwatch } from '../../studies/offStateSwatches.js'
import type { Shown } from '../state/shown.js'

const WHITES = { lit_screen: 'the lit screen’s white', white_diffuser: 'white paper' } as const

/** The off-state beside ideal black, at a stated ambient level and relative to a stated white. */
export function Swatch({ shown }: { readonly shown: readonly Shown[] }) {
  const { swatches } = shown[shown.length - 1].view
  const [chosen, choose] = useState('')
  const place = Math.max(0, keysOf(swatches).indexOf(chosen === '' ? brightestLit(swatches) : chosen))
  const { relative_to, white_luminance, srgb, clipped } = swatches[place]
  return (
    <section class="card swatch" aria-labelledby="swatch-title">
      <h3 id="swatch-title">Off-state beside ideal black</h3>
      <label>
        in{' '}
        <select value={keyOf(swatches[place])} onChange={(event) => choose(event.currentTarget.value)}>
          {swatches.map((swatch) => (
            <option key={keyOf(swatch)} value={keyOf(swatch)}>
              {given(swatch.illuminance_lx)} lx, against {WHITES[swatch.relative_to]}
            </option>
          ))}
        </select>
      </label>
      <div class="patches">
        {shown.map(({ name, view }) => (
          <figure key={name}>
            <div class="patch" style={{ background: view.swatches[place].srgb }} />
            <figcaption>
              {name}, {numberText(view.swatches[place].off_luminance)} cd/m²
            </figcaption>
          </figure>
        ))}
        <figure>
          <div class="patch ideal" />
          <figcaption>ideal black</figcaption>
        </figure>
      </div>
      <p class="note">
        As bright against black as it is against {WHITES[relative_to]}, {numberText(white_luminance)} cd/m², which this
        monitor’s white stands for; sRGB {srgb}
        {clipped ? ', cut to what sRGB can show' : ''}.
      </p>
    </section>
  )
}

function keyOf({ illuminance_lx, relative_to }: OffStateSwatch): string {
  return `${illuminance_lx}/${relative_to}`
}

function keysOf(swatches: readonly OffStateSwatch[]): string[] {
  return swatches.map(keyOf)
}

/** Shown first: the harshest light of the file, against the screen itself where its luminance is known. */
function brightestLit(swatches: readonly OffStateSwatch[]): string {
  const lit = swatches.filter(({ relative_to }) => relative_to === 'lit_screen')
  const [brightest] = [...(lit.length > 0 ? lit : swatches)].sort((a, b) => b.illuminance_lx - a.illuminance_lx)
  return keyOf(brightest)
}
