import { METRIC_QUANTITIES } from '../../charts/quantity.js'
import { given } from '../../report/decimals.js'
import { metricNumber } from '../../report/metricNumber.js'
import type { MetricName } from '../../stack/stack.js'
import type { DirectionEvaluation } from '../../studies/evaluate.js'
import type { Shown } from '../state/shown.js'
import { directionText } from './directionText.js'

interface FiguresProps {
  readonly shown: readonly Shown[]
  readonly place: number
}

const ROWS: readonly { readonly metric: MetricName; readonly of: (d: DirectionEvaluation) => number | undefined }[] = [
  { metric: 'luminous_reflectance', of: (d) => d.luminous_reflectance },
  { metric: 'front_reflectance', of: (d) => d.front_reflectance },
  { metric: 'inner_reflectance', of: (d) => d.inner_reflectance },
  { metric: 'color_weighted_reflectance', of: (d) => d.color_weighted_reflectance },
  { metric: 'lightness', of: (d) => d.lab[0] },
  { metric: 'chroma', of: (d) => d.chroma },
  { metric: 'emission_transmittance', of: (d) => d.emission_transmittance },
]

/** The figures from one direction, one column a state. */
export function Figures({ shown, place }: FiguresProps) {
  const directions = shown.map(({ view }) => view.evaluation.directions[place])
  const rows = ROWS.filter(({ of }) => of(directions[0]) !== undefined)
  const levels = directions[0].ambient_contrast ?? []
  return (
    <section class="card" aria-labelledby="figures-title">
      <h3 id="figures-title">Figures, {directionText(directions[0])}</h3>
      <table>
        <thead class={shown.length > 1 ? '' : 'unseen'}>
          <tr>
            <th scope="col">figure</th>
            {shown.map(({ name }) => (
              <th key={name} scope="col">
                {name}
              </th>
            ))}
            <th scope="col">unit</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ metric, of }) => (
            <tr key={metric} data-metric={metric}>
              <th scope="row">{METRIC_QUANTITIES[metric].label}</th>
              {directions.map((direction, k) => (
                <td key={shown[k].name}>{metricNumber(metric, of(direction) ?? Number.NaN)}</td>
              ))}
              <td class="unit">{METRIC_QUANTITIES[metric].unit}</td>
            </tr>
          ))}
          {levels.map(({ illuminance_lx }, level) => (
            <tr key={illuminance_lx}>
              <th scope="row">contrast at {given(illuminance_lx)} lx</th>
              {directions.map((direction, k) => (
                <td key={shown[k].name}>
                  {metricNumber('ambient_contrast', direction.ambient_contrast?.[level].ratio ?? Number.NaN)}
                </td>
              ))}
              <td class="unit">: 1</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  )
}
