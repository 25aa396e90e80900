import { type Axis, linearAxis, panelGap } from './axis.js'
import { axisTitle, type Quantity } from './quantity.js'
import type { Theme } from './theme.js'
import { wrapText } from './wrapText.js'

export interface Panel {
  /** Scale id its series name. */
  readonly id: string
  readonly quantity: Quantity
  readonly weight?: number
  readonly min?: number
  readonly suggestedMin?: number
  readonly suggestedMax?: number
}

/** Letters of an axis title that fit beside a panel among `count`. */
const LETTERS_OF_WHOLE_HEIGHT = 44
/** Of the height, between two panels: their end numbers stand face to face. */
const GAP_SHARE = 0.065

/** Several plots over one x axis, the first on top: two scales in one plot would invite a false comparison. */
export function panelAxes(theme: Theme, panels: readonly Panel[]): Record<string, Axis> {
  const letters = LETTERS_OF_WHOLE_HEIGHT / panels.length
  const wholeWeight = panels.reduce((sum, { weight = 1 }) => sum + weight, 0)
  const axes: Record<string, Axis> = {}
  // Chart.js stacks from the bottom.
  ;[...panels].reverse().forEach((panel, i) => {
    const { id, quantity, weight = 1, ...range } = panel
    if (i > 0) axes[`gap${i}`] = panelGap(GAP_SHARE * wholeWeight)
    axes[id] = linearAxis(theme, { title: wrapText(axisTitle(quantity), letters), panelWeight: weight, ...range })
  })
  return axes
}
