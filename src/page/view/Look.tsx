import { useMemo } from 'preact/hooks'
import { METRIC_QUANTITIES } from '../../charts/quantity.js'
import type { Theme } from '../../charts/theme.js'
import type { NamedEvaluation } from '../../report/appearanceSheets.js'
import { metricWithUnit } from '../../report/metricNumber.js'
import type { Stack } from '../../stack/stack.js'
import type { Shown } from '../state/shown.js'
import { ChartView } from './ChartView.js'
import { Cones } from './Cones.js'
import { colorConfig, spectrumConfig } from './chartConfigs.js'
import { directionText } from './directionText.js'
import { Swatch } from './Swatch.js'

interface LookProps {
  readonly stack: Stack
  /** The present state last; before it the one held for comparison, if any. */
  readonly shown: readonly Shown[]
  /** Index of the direction looked from. */
  readonly place: number
  readonly onPlace: (place: number) => void
  readonly theme: Theme
}

/** What the screen looks like: spectrum, swatch, color, cone. */
export function Look({ stack, shown, place, onPlace, theme }: LookProps) {
  const designs = shown.map(({ name, view }): NamedEvaluation => ({ name, evaluation: view.evaluation }))
  const evaluations = designs.map(({ evaluation }) => evaluation)
  const spectrum = useMemo(() => spectrumConfig(stack, designs, place, theme), [stack, ...evaluations, place, theme])
  const color = useMemo(() => colorConfig(stack, designs, theme), [stack, ...evaluations, theme])
  const { directions } = evaluations[evaluations.length - 1]
  const luminous = metricWithUnit('luminous_reflectance', directions[place].luminous_reflectance)
  const cones = shown.flatMap(({ name, cone }) => (cone === undefined ? [] : [{ name, cone }]))
  return (
    <section class="look" aria-labelledby="look-title">
      <h2 id="look-title">Seen from</h2>
      <fieldset class="directions">
        <legend class="unseen">Direction</legend>
        {directions.map((direction, k) => (
          <label key={directionText(direction)}>
            <input type="radio" name="direction" checked={k === place} onChange={() => onPlace(k)} />
            {directionText(direction)}
          </label>
        ))}
      </fieldset>
      <Swatch shown={shown} />
      <div class="card">
        <ChartView
          name="spectrum"
          config={spectrum}
          label={`Reflectance against wavelength, ${directionText(directions[place])}; ${METRIC_QUANTITIES.luminous_reflectance.label} ${luminous}`}
          heightPx={290}
        />
      </div>
      {cones.length > 0 && <Cones cones={cones} theme={theme} />}
      <div class="card">
        <ChartView name="color" config={color} label={colorLabel(designs)} heightPx={340} />
      </div>
    </section>
  )
}

function colorLabel(designs: readonly NamedEvaluation[]): string {
  const { directions } = designs[designs.length - 1].evaluation
  const points = directions.map((d) => `${directionText(d)}: a* ${d.lab[1].toFixed(2)}, b* ${d.lab[2].toFixed(2)}`)
  return `Color of the off-state. ${points.join('; ')}`
}
