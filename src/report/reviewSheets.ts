import type { Review } from '../studies/review.js'
import { appearanceSheets } from './appearanceSheets.js'
import { budgetSheet } from './budgetSheet.js'
import { compareSheet } from './compareSheet.js'
import { coneSheets } from './coneSheets.js'
import { itinerarySheets } from './itinerarySheets.js'
import { searchSheet } from './searchSheet.js'
import type { Sheet } from './sheet.js'
import { toleranceSheets } from './toleranceSheets.js'

/** The charts of a design review by the section they stand in. */
export interface ReviewSheets {
  readonly appearance: readonly Sheet[]
  readonly search: readonly Sheet[]
  readonly cone: readonly Sheet[]
  readonly budget: readonly Sheet[]
  readonly itinerary: readonly Sheet[]
  readonly tolerance: readonly Sheet[]
  readonly compare: readonly Sheet[]
}

const BEFORE_AND_AFTER = ['before', 'after']

export function reviewSheets({ designs, optimum, budgets, itinerary, tolerance, comparison }: Review): ReviewSheets {
  const [{ stack }] = designs
  const names = designs.length > 1 ? BEFORE_AND_AFTER : ['design']
  const evaluations = designs.map(({ evaluation }, k) => ({ name: names[k], evaluation }))
  const cones = designs.flatMap(({ cone }, k) =>
    cone === undefined ? [] : [{ name: designs.length > 1 ? names[k] : '', cone }],
  )
  return {
    appearance: appearanceSheets(stack, evaluations),
    search: optimum === undefined ? [] : [searchSheet(optimum)],
    cone: cones.length > 0 ? coneSheets(cones) : [],
    budget: (budgets ?? []).map(budgetSheet),
    itinerary: itinerary === undefined ? [] : itinerarySheets(itinerary),
    tolerance: tolerance === undefined ? [] : toleranceSheets(tolerance),
    compare: comparison === undefined ? [] : [compareSheet(stack, comparison)],
  }
}
