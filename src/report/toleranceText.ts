import { wrapText } from '../charts/wrapText.js'
import type { Stack } from '../stack/stack.js'
import type { Tolerance } from '../studies/tolerance.js'
import { fixed, given } from './decimals.js'
import { ESTIMATE_CAUTION } from './evaluateText.js'
import { limitCells } from './limitsText.js'
import { metricKeyLabel, metricKeyNumber, metricKeyUnit } from './metricKeyText.js'
import { type Paint, PLAIN } from './paint.js'
import { type Column, textTable } from './textTable.js'
import { tighteningText } from './tighteningText.js'
import { plural } from './wording.js'

const TEXT_WIDTH = 96

/** How much passes and by which limits, how the metrics spread, what moves them, what to tighten. */
export function toleranceText(stack: Stack, tolerance: Tolerance, paint: Paint = PLAIN): string {
  const parts = [
    `${paint.strong(tolerance.title)}\n${drawsText(tolerance)}`,
    yieldText(tolerance, paint),
    metricsText(tolerance),
    heldText(tolerance),
    sensitivityText(tolerance, paint),
    tighteningPart(stack, tolerance, paint),
    tolerance.interrupted ? paint.caution('interrupted: this is what was done so far') : '',
    paint.faint(ESTIMATE_CAUTION),
  ]
  return `${parts.filter((part) => part !== '').join('\n\n')}\n`
}

const SAMPLINGS: Readonly<Record<Tolerance['sampling'], string>> = {
  random: 'random',
  latin_hypercube: 'Latin hypercube',
  sobol: "Sobol'",
}

function drawsText({ draws, samples, sampling, seed }: Tolerance): string {
  const count = draws < samples ? `${draws} of ${samples} draws` : plural(draws, 'draw')
  return `${count} of the tolerances: ${SAMPLINGS[sampling]}, seed ${seed}`
}

const LIMITS: readonly Column[] = (['left', 'left', 'left', 'right', 'left'] as const).map((align) => ({
  heading: '',
  align,
}))

function yieldText({ yield: all, yield_interval, limits, sampling }: Tolerance, paint: Paint): string {
  if (all === undefined || yield_interval === undefined || limits === undefined)
    return 'no limits in the file: no yield'
  const rows = limits.map((limit) => [...limitCells(limit), percent(limit.yield), intervalText(limit.yield_interval)])
  const heading = paint.strong(`yield: ${percent(all)} meet all limits`)
  return `${heading} ${intervalText(yield_interval)}\n${textTable(LIMITS, rows)}\n${paint.faint(meaningOf(sampling))}`
}

/** What the interval promises. */
function meaningOf(sampling: Tolerance['sampling']): string {
  const promise = 'In brackets the 95 % interval for the share of all production (Clopper and Pearson)'
  const meaning =
    sampling === 'random'
      ? `${promise}: the true share is missed in at most one of twenty runs.`
      : `${promise}, as for independent draws; these are spread more evenly, so that it is rather too wide than too narrow.`
  return wrapText(meaning, TEXT_WIDTH).join('\n')
}

const METRICS: readonly Column[] = [
  { heading: 'spread of', align: 'left' },
  { heading: '', align: 'left' },
  ...['mean', 'std. dev.', '5 %', 'median', '95 %'].map((heading): Column => ({ heading, align: 'right' })),
]

function metricsText({ metrics }: Tolerance): string {
  const rows = Object.entries(metrics).map(([key, { mean, std, p05, p50, p95 }]) => [
    metricKeyLabel(key),
    metricKeyUnit(key),
    ...[mean, std, p05, p50, p95].map((value) => metricKeyNumber(key, value)),
  ])
  return rows.length === 0 ? '' : textTable(METRICS, rows)
}

function heldText({ held }: Tolerance): string {
  const lines = Object.entries(held).map(
    ([path, share]) =>
      `${path} was drawn beyond what is physical in ${percent(share)} of the draws and set to its edge there.`,
  )
  return lines.flatMap((line) => wrapText(line, TEXT_WIDTH)).join('\n')
}

const SHARES: readonly Column[] = [
  { heading: '', align: 'left' },
  ...['alone', '95 % interval', 'with interactions', '95 % interval'].map(
    (heading): Column => ({ heading, align: 'right' }),
  ),
]

function sensitivityText({ sensitivity, sensitivity_of }: Tolerance, paint: Paint): string {
  if (sensitivity === undefined || sensitivity_of === undefined) return ''
  const rows = sensitivity.map(({ parameter, share, share_low, share_high, total, total_low, total_high }) => [
    `  ${parameter}`,
    percent(share),
    `${shown(share_low)} … ${shown(share_high)}`,
    percent(total),
    `${shown(total_low)} … ${shown(total_high)}`,
  ])
  const heading = paint.strong(`what moves ${metricKeyLabel(sensitivity_of)}: shares of its variance`)
  return `${heading}\n${textTable(SHARES, rows)}`
}

function tighteningPart(stack: Stack, { tightening, design_meets_limits }: Tolerance, paint: Paint): string {
  if (design_meets_limits === false) {
    return paint.caution(
      'The design misses a limit even without errors: no tightening helps, another design might (optimize).',
    )
  }
  return tightening === undefined ? '' : tighteningText(stack, tightening, paint)
}

function percent(share: number): string {
  return `${shown(share)} %`
}

/** Percent with one decimal; 100 only where it is. */
function shown(share: number): string {
  if (share < 1 && share > 0.9995) return given(Math.floor(share * 1e4) / 100)
  return fixed(100 * share, 1)
}

function intervalText([low, high]: readonly [number, number]): string {
  return `(${shown(low)} … ${shown(high)})`
}
