import { wrapText } from '../charts/wrapText.js'
import type { Budget } from '../studies/budget.js'
import { BUDGET_LABELS } from './budgetLabels.js'
import { given } from './decimals.js'
import { ESTIMATE_CAUTION } from './evaluateText.js'
import { metricNumber } from './metricNumber.js'
import { type Paint, PLAIN } from './paint.js'
import { type Column, textTable } from './textTable.js'

const COLUMNS: readonly Column[] = [
  { heading: 'luminous reflectance, %', align: 'left' },
  { heading: 'alone', align: 'right' },
  { heading: 'gained if removed', align: 'right' },
]
const TEXT_WIDTH = 96

/** Where the light comes from: the parts alone add up to the total, with the ideal stack and the rest. */
export function budgetText(budget: Budget, paint: Paint = PLAIN): string {
  const { title, theta_deg, phi_deg, total, ideal, terms, rest, meaning, notes } = budget
  const shown = (value: number): string => metricNumber('luminous_reflectance', value)
  const table = textTable(COLUMNS, [
    ...terms.map(({ name, alone, if_removed }) => [BUDGET_LABELS[name], shown(alone), shown(if_removed)]),
    ['ideal stack', shown(ideal)],
    ['rest, where several act together', shown(rest)],
    [paint.strong('total'), paint.strong(shown(total))],
  ])
  const parts = [
    `${paint.strong(title)}\nwhere the light comes from, seen from θ ${given(theta_deg)}° φ ${given(phi_deg)}°`,
    table,
    wrapText(meaning, TEXT_WIDTH).join('\n'),
    notes.flatMap((note) => wrapText(note, TEXT_WIDTH)).join('\n'),
    paint.faint(ESTIMATE_CAUTION),
  ]
  return `${parts.filter((part) => part !== '').join('\n\n')}\n`
}
