import type { Budget } from '../studies/budget.js'
import { csvText } from './csvText.js'

/** One line a term, fractions; ideal, rest and total have no `if_removed`. */
export function budgetCsv({ terms, ideal, rest, total }: Budget): string {
  return csvText(
    ['term', 'alone', 'if_removed'],
    [
      ...terms.map(({ name, alone, if_removed }) => [name, alone, if_removed]),
      ['ideal', ideal, undefined],
      ['rest', rest, undefined],
      ['total', total, undefined],
    ],
  )
}
