import { useMemo, useState } from 'preact/hooks'
import { METRIC_QUANTITIES } from '../../charts/quantity.js'
import type { Theme } from '../../charts/theme.js'
import type { PlainCone } from '../engine/messages.js'
import { ChartView } from './ChartView.js'
import { CONE_METRICS, type ConeMetric, coneConfig, coneRange } from './chartConfigs.js'

interface ConesProps {
  /** One design, or held and present; beside each other on one scale. */
  readonly cones: readonly { readonly name: string; readonly cone: PlainCone }[]
  readonly theme: Theme
}

export function Cones({ cones, theme }: ConesProps) {
  const [metric, choose] = useState<ConeMetric>('luminous_reflectance')
  const configs = useMemo(() => {
    const range = coneRange(
      cones.map(({ cone }) => cone),
      metric,
    )
    return cones.map(({ name, cone }) => coneConfig(cone, metric, { title: titleOf(cones.length, name), range }, theme))
  }, [...cones.map(({ cone }) => cone), metric, theme])
  return (
    <section class="card" aria-label="Viewing cone">
      <label>
        cone of{' '}
        <select value={metric} onChange={(event) => choose(event.currentTarget.value as ConeMetric)}>
          {CONE_METRICS.map((name) => (
            <option key={name} value={name}>
              {METRIC_QUANTITIES[name].label}
            </option>
          ))}
        </select>
      </label>
      <div class="beside">
        {configs.map((config, k) => (
          <ChartView
            key={cones[k].name}
            name={k === configs.length - 1 ? 'cone' : 'cone-before'}
            config={config}
            label={`Viewing cone to ${cones[k].cone.theta_deg.at(-1)}°, ${METRIC_QUANTITIES[metric].label}, ${cones[k].name}`}
            heightPx={310}
          />
        ))}
      </div>
    </section>
  )
}

function titleOf(count: number, name: string): string {
  return count > 1 ? `Viewing cone, ${name}` : 'Viewing cone'
}
