import type { Review } from '../../../studies/review.js'
import { fixed, given } from '../../decimals.js'
import type { Content } from '../markup.js'
import { figure, metricFigure, numbers, table, words } from '../table.js'
import { DESIGN_NAMES } from './figures.js'

/** What the viewing cone comes down to. */
export function coneSection({ designs }: Review): Content[] {
  const seen = designs.flatMap(({ name, cone }) => (cone === undefined ? [] : [{ name, cone }]))
  if (seen.length === 0) return []
  const summaries = seen.map(({ cone }) => cone.summary)
  const { limit } = summaries[0]
  const share = (value: number | undefined) => (value === undefined ? '–' : figure(value, fixed(100 * value, 1)))
  const angle = (value: number | undefined) => (value === undefined ? 'none' : figure(value, `${given(value)}°`))
  const rows = [
    [
      'worst luminous reflectance (%)',
      ...summaries.map(({ worst }) => metricFigure('luminous_reflectance', worst.luminous_reflectance)),
    ],
    ['– seen from', ...summaries.map(({ worst }) => [`θ `, angle(worst.theta_deg), ` φ `, angle(worst.phi_deg)])],
    [
      'under uniform diffuse light (%)',
      ...summaries.map((summary) => metricFigure('luminous_reflectance', summary.diffuse_reflectance)),
    ],
    ...(limit === undefined
      ? []
      : [
          [
            `share of the cone within ${given(100 * limit)} % (%)`,
            ...summaries.map((summary) => share(summary.share_within_limit)),
          ],
          [
            `within ${given(100 * limit)} % all around up to θ`,
            ...summaries.map((summary) => angle(summary.theta_within_limit_deg)),
          ],
        ]),
  ]
  const { theta_deg } = seen[0].cone
  return [
    table(
      `Viewing cone up to θ ${given(theta_deg[theta_deg.length - 1])}°`,
      [words(''), ...seen.map(({ name }) => numbers(seen.length > 1 ? DESIGN_NAMES[name] : 'value'))],
      rows,
    ),
  ]
}
