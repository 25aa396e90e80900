import type { Stack } from '../stack/stack.js'
import type { TightenedSpread, Tightening } from '../studies/tighten.js'
import { fixed, given } from './decimals.js'
import type { Paint } from './paint.js'
import { parameterText } from './parameterText.js'
import { type Column, textTable } from './textTable.js'

const COLUMNS: readonly Column[] = [
  { heading: '', align: 'left' },
  { heading: '', align: 'left' },
  { heading: 'now', align: 'right' },
  { heading: 'needed', align: 'right' },
  { heading: 'yield without', align: 'right' },
  { heading: 'if doubled', align: 'right' },
  { heading: '', align: 'left' },
]

/** How far each spread must shrink alone for the wanted yield, and which may be looser. */
export function tighteningText(stack: Stack, tightening: Tightening, paint: Paint): string {
  const { wanted_yield, draws, yield: now, spreads } = tightening
  const heading = paint.strong(`what to tighten for a yield of ${given(100 * wanted_yield)} %`)
  const question = now >= wanted_yield ? 'it is reached' : 'each spread alone, the others as they are'
  const rows = spreads.flatMap((spread) => spreadRows(stack, spread))
  const note = paint.faint(
    `From the first ${draws} draws; a share of them is uncertain by about ${uncertainty(tightening)} %.`,
  )
  return `${heading}: ${question}\n${textTable(COLUMNS, rows)}\n${note}`
}

/** A line for each path; what the paths of a group share stands in its first. */
function spreadRows(stack: Stack, spread: TightenedSpread): string[][] {
  const shared = [percent(spread.yield_without), percent(spread.yield_doubled), verdictText(spread)]
  if (spread.parameter === 'all') {
    const needed = spread.scale === undefined ? '' : `× ${fixed(spread.scale, 2)}`
    return [['  all alike', '', '', needed, ...shared]]
  }
  return spread.paths.map(({ path, measure, now, needed }, k) => {
    const { unit, shown } = parameterText(stack, path)
    const name = `${k === 0 ? '  ' : '  + '}${path}`
    const cells = [name, `${MEASURES[measure]} ${unit}`, shown(now), needed === undefined ? '' : shown(needed)]
    return k === 0 ? [...cells, ...shared] : cells
  })
}

const MEASURES = { 'standard deviation': 'std. dev.', 'half-width': '±' } as const

function verdictText({ verdict, can_be_doubled }: TightenedSpread): string {
  const tighten = { met: '', alone: '', cannot_alone: 'cannot do it alone' }[verdict]
  const loosen = can_be_doubled ? 'may be twice as loose' : ''
  return [tighten, loosen].filter((part) => part !== '').join(', ')
}

function percent(share: number): string {
  return `${fixed(100 * share, 1)} %`
}

/** One standard deviation of a share of so many independent draws, at the wanted yield. */
function uncertainty({ wanted_yield, draws }: Tightening): string {
  return fixed(100 * Math.sqrt((wanted_yield * (1 - wanted_yield)) / draws), 1)
}
