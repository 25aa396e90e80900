import { METRIC_QUANTITIES } from '../../charts/quantity.js'
import { askedText, verdictText } from '../../report/limitsText.js'
import { metricWithUnit } from '../../report/metricNumber.js'
import { PLAIN } from '../../report/paint.js'
import type { LimitEvaluation } from '../../studies/evaluate.js'
import { directionText } from './directionText.js'

export function Limits({ limits }: { readonly limits: readonly LimitEvaluation[] }) {
  const met = limits.filter((limit) => limit.met).length
  return (
    <section class="card" aria-labelledby="limits-title">
      <h3 id="limits-title">Limits</h3>
      <p aria-live="polite" class={met === limits.length ? 'verdict' : 'verdict missed'}>
        {limits.length === 0 ? 'none in the file' : `${met} of ${limits.length} met`}
      </p>
      <ul class="limits">
        {limits.map((limit, k) => (
          <li key={k} class={limit.met ? '' : 'missed'}>
            <span class="mark" aria-hidden="true">
              {limit.met ? '●' : '✕'}
            </span>
            <span>
              {METRIC_QUANTITIES[limit.metric].label}, {directionText(limit)}
              {limit.illuminance_lx === undefined ? '' : `, ${limit.illuminance_lx} lx`}
            </span>
            <span class="value">{metricWithUnit(limit.metric, limit.value)}</span>
            <span class="verdict-text">
              {askedText(limit)}: {verdictText(limit, PLAIN)}
            </span>
          </li>
        ))}
      </ul>
    </section>
  )
}
