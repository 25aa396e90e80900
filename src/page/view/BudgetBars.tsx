import { metricWithUnit } from '../../report/metricNumber.js'
import type { Budget } from '../../studies/budget.js'

/** Where the remaining reflection comes from, largest first. */
export function BudgetBars({ budget }: { readonly budget: Budget }) {
  const parts = [
    ...budget.terms.map(({ name, alone, if_removed }) => ({ name: name.replaceAll('_', ' '), alone, if_removed })),
    { name: 'ideal stack', alone: budget.ideal, if_removed: undefined },
    { name: 'acting together', alone: budget.rest, if_removed: undefined },
  ].sort((a, b) => Math.abs(b.alone) - Math.abs(a.alone))
  const largest = Math.max(...parts.map(({ alone }) => Math.abs(alone)), Number.MIN_VALUE)
  return (
    <section class="card" aria-labelledby="budget-title">
      <h3 id="budget-title">Light budget</h3>
      <p class="note">
        {metricWithUnit('luminous_reflectance', budget.total)} in all; each part alone, and what its removal would gain.
      </p>
      <table class="budget">
        <thead>
          <tr>
            <th scope="col">part</th>
            <th scope="col">alone</th>
            <th scope="col">gain</th>
          </tr>
        </thead>
        <tbody>
          {parts.map(({ name, alone, if_removed }) => (
            <tr key={name}>
              <th scope="row">
                {name}
                <span class="bar" style={{ width: `${(100 * Math.abs(alone)) / largest}%` }} />
              </th>
              <td>{percentPoints(alone)}</td>
              <td>{if_removed === undefined ? '' : percentPoints(if_removed)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  )
}

function percentPoints(value: number): string {
  return `${(100 * value).toFixed(3).replace('-', '−')} %`
}
