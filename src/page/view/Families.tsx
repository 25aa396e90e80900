import { METRIC_QUANTITIES } from '../../charts/quantity.js'
import { metricWithUnit } from '../../report/metricNumber.js'
import { parameterText } from '../../report/parameterText.js'
import type { Stack } from '../../stack/stack.js'
import type { Values } from '../engine/messages.js'
import type { Search } from '../state/useSearch.js'

interface FamiliesProps {
  readonly stack: Stack
  readonly search: Search
  readonly onSet: (values: Values) => void
}

/** The search under way, or the distinct good designs it found, each to be looked at. */
export function Families({ stack, search, onSet }: FamiliesProps) {
  const { running, optimum, fault } = search
  return (
    <section class="card" aria-labelledby="search-title">
      <h3 id="search-title">Search</h3>
      {stack.optimize === undefined && <p class="note">The file asks no optimize question.</p>}
      {running !== undefined && (
        <>
          <progress aria-label="progress of the search" value={running.done} max={1} />
          <p class="note">{running.note}</p>
        </>
      )}
      {fault !== undefined && (
        <p class="fault" role="alert">
          {fault}
        </p>
      )}
      {running === undefined && optimum === undefined && stack.optimize !== undefined && (
        <p class="note">
          Minimizes {METRIC_QUANTITIES[stack.optimize.minimize.metric].label} over{' '}
          {Object.keys(stack.optimize.vary).length} parameters.
        </p>
      )}
      {optimum !== undefined && (
        <>
          <p aria-live="polite" class="note">
            {optimum.interrupted ? 'Stopped. ' : ''}
            {METRIC_QUANTITIES[optimum.objective.metric].label}{' '}
            {metricWithUnit(optimum.objective.metric, optimum.start.objective)} →{' '}
            {metricWithUnit(optimum.objective.metric, optimum.best.objective)}; designs within{' '}
            {(100 * optimum.family_margin).toFixed(0)} %:
          </p>
          <ol class="families">
            {optimum.families.map((family, k) => (
              <li key={k}>
                <button type="button" onClick={() => onSet(search.valuesOf(family))}>
                  {metricWithUnit(optimum.objective.metric, family.objective)}
                </button>
                <span>{familyText(stack, family.parameters)}</span>
              </li>
            ))}
          </ol>
        </>
      )}
    </section>
  )
}

function familyText(stack: Stack, parameters: Readonly<Record<string, number>>): string {
  return Object.entries(parameters)
    .map(([path, plain]) => {
      const { unit, shown } = parameterText(stack, path)
      return `${path.replace('_', ' ')} ${shown(plain)} ${unit}`
    })
    .join(', ')
}
