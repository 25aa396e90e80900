import type { Review } from '../studies/review.js'
import { appearanceSheets } from './appearanceSheets.js'
import { budgetSheet } from './budgetSheet.js'
import { compareSheets } from './compareSheets.js'
import { coneSheets } from './coneSheets.js'
import { itinerarySheets } from './itinerarySheets.js'
import { searchSheet } from './searchSheet.js'
import type { Sheet } from './sheet.js'
import { toleranceSheets } from './toleranceSheets.js'

/** The charts of a design review in groups that stand together. */
export interface ReviewSheets {
  readonly spectra: readonly Sheet[]
  readonly color: readonly Sheet[]
  readonly search: readonly Sheet[]
  readonly cone: readonly Sheet[]
  readonly budget: readonly Sheet[]
  readonly ellipses: readonly Sheet[]
  readonly spheres: readonly Sheet[]
  readonly spread: readonly Sheet[]
  readonly sensitivity: readonly Sheet[]
  readonly compare: readonly Sheet[]
}

const BEFORE_AND_AFTER = ['before', 'after']
/** Light whose ellipses are drawn layer by layer, nm; the spheres show the others too. */
const ELLIPSES_NM = 550

/** Sizes for two abreast, so that their texts are as large as those of a chart over the whole width, CSS pixels. */
const HALF = { width: 540, height: 490 }
/** Three, or four, over one another on a page. */
const LOW = { height: 410 }
const LOWER = { height: 320 }

export function reviewSheets(review: Review): ReviewSheets {
  const { title, designs, optimum, budgets, itinerary, tolerance, comparison } = review
  const [{ stack }] = designs
  const names = designs.length > 1 ? BEFORE_AND_AFTER : ['design']
  const evaluations = designs.map(({ evaluation }, k) => ({ name: names[k], evaluation }))
  const cones = designs.flatMap(({ cone }, k) =>
    cone === undefined ? [] : [{ name: designs.length > 1 ? names[k] : '', cone }],
  )
  const told = (sheets: readonly Sheet[], size = {}): Sheet[] =>
    sheets.map((sheet) => ({ ...withoutTitle(sheet, title), ...size }))
  const ways = itinerary === undefined ? [] : itinerarySheets(itinerary)
  const appearance = appearanceSheets(stack, evaluations)
  const spread = tolerance === undefined ? [] : toleranceSheets(tolerance)
  return {
    spectra: told(appearance.slice(0, -1), LOW),
    color: told(appearance.slice(-1)),
    search: told(optimum === undefined ? [] : [searchSheet(optimum)]),
    cone: told(cones.length > 0 ? coneSheets(cones) : [], HALF),
    budget: told((budgets ?? []).map(budgetSheet)),
    ellipses: told(ways.filter(({ name }) => name === `ellipses-${ELLIPSES_NM}nm`)),
    spheres: told(
      ways.filter(({ name }) => name.startsWith('sphere')),
      HALF,
    ),
    spread: told(
      spread.filter(({ name }) => name.startsWith('spread')),
      LOWER,
    ),
    sensitivity: told(spread.filter(({ name }) => name === 'sensitivity')),
    compare: told(comparison === undefined ? [] : compareSheets(stack, comparison)),
  }
}

/** The page has said the stack's title: its charts begin with what they show. */
function withoutTitle(sheet: Sheet, title: string): Sheet {
  const plugins = sheet.chart.options?.plugins
  const text = [plugins?.title?.text ?? ''].flat().join(' ')
  const rest = text.startsWith(title) ? text.slice(title.length).replace(/^(:| —) /, '') : text
  const options = {
    ...sheet.chart.options,
    plugins: { ...plugins, title: { ...plugins?.title, text: [capitalized(rest)] } },
  }
  return { ...sheet, chart: { ...sheet.chart, options } }
}

function capitalized(text: string): string {
  return text.replace(/^[a-z]/, (letter) => letter.toUpperCase())
}
