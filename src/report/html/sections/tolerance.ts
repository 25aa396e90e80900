import type { Stack } from '../../../stack/stack.js'
import type { TightenedSpread, Tightening } from '../../../studies/tighten.js'
import type { Tolerance } from '../../../studies/tolerance.js'
import { fixed, given } from '../../decimals.js'
import { limitCells } from '../../limitsText.js'
import { metricKeyLabel, metricKeyNumber, metricKeyUnit } from '../../metricKeyText.js'
import { parameterText } from '../../parameterText.js'
import { type Content, html, type Markup } from '../markup.js'
import { figure, numbers, table, words } from '../table.js'

/** How much of production passes, how the metrics spread, what moves them and what to tighten. */
export function toleranceSection(stack: Stack, tolerance: Tolerance): Content[] {
  return [
    yieldTable(tolerance),
    spreadTable(tolerance),
    sensitivityTable(tolerance),
    tolerance.tightening && tighteningTable(stack, tolerance.tightening),
    html`<p class="note">${tolerance.draws} draws of the tolerances (${tolerance.sampling.replaceAll('_', ' ')}, seed ${tolerance.seed}); intervals of 95 %, for a yield after Clopper and Pearson.</p>`,
    ...Object.entries(tolerance.held).map(
      ([path, held]) =>
        html`<p class="note">${path} was drawn beyond what is physical in ${share(held)} % of the draws and set to its edge there.</p>`,
    ),
  ]
}

function yieldTable({ yield: all, yield_interval, limits }: Tolerance): Content {
  if (all === undefined || yield_interval === undefined || limits === undefined) return undefined
  const rows = limits.map((limit) => [...limitCells(limit), share(limit.yield), interval(limit.yield_interval)])
  return table(
    'Yield (%)',
    [words('limit'), words('seen from'), words('asked'), numbers('meets it'), numbers('95 % interval')],
    [...rows, ['all limits together', '', '', share(all), interval(yield_interval)]],
  )
}

function spreadTable({ metrics }: Tolerance): Markup {
  const rows = Object.entries(metrics).map(([key, { mean, std, p05, p50, p95 }]) => [
    `${metricKeyLabel(key)}${metricKeyUnit(key) === '' ? '' : ` (${metricKeyUnit(key)})`}`,
    ...[mean, std, p05, p50, p95].map((value) => figure(value, metricKeyNumber(key, value))),
  ])
  const columns = ['mean', 'std. dev.', '5 %', 'median', '95 %'].map(numbers)
  return table('How the metrics spread', [words(''), ...columns], rows)
}

function sensitivityTable({ sensitivity, sensitivity_of }: Tolerance): Content {
  if (sensitivity === undefined || sensitivity_of === undefined) return undefined
  const rows = sensitivity.map((entry) => [
    entry.parameter,
    share(entry.share),
    interval([entry.share_low, entry.share_high]),
    share(entry.total),
    interval([entry.total_low, entry.total_high]),
  ])
  return table(
    `What moves ${metricKeyLabel(sensitivity_of)}: shares of its variance (%)`,
    [words(''), numbers('alone'), numbers('95 % interval'), numbers('with interactions'), numbers('95 % interval')],
    rows,
  )
}

function tighteningTable(stack: Stack, { wanted_yield, draws, spreads }: Tightening): Markup {
  return table(
    `What to tighten for a yield of ${given(100 * wanted_yield)} % (each spread alone, from the first ${draws} draws)`,
    [
      words(''),
      words(''),
      numbers('now'),
      numbers('needed'),
      numbers('yield without (%)'),
      numbers('yield if doubled (%)'),
    ],
    spreads.flatMap((spread) => tighteningRows(stack, spread)),
  )
}

function tighteningRows(stack: Stack, spread: TightenedSpread): Content[][] {
  const yields = [share(spread.yield_without), share(spread.yield_doubled)]
  const verdict = VERDICTS[spread.verdict]
  if (spread.parameter === 'all') {
    const { scale } = spread
    return [['all alike', '', '', scale === undefined ? verdict : ['× ', figure(scale, fixed(scale, 2))], ...yields]]
  }
  return spread.paths.map(({ path, measure, now, needed }, k) => {
    const { unit, shown } = parameterText(stack, path)
    return [
      k === 0 ? path : `+ ${path}`,
      `${measure} (${unit})`,
      figure(now, shown(now)),
      needed === undefined ? verdict : figure(needed, shown(needed)),
      ...(k === 0 ? yields : ['', '']),
    ]
  })
}

const VERDICTS: Readonly<Record<TightenedSpread['verdict'], string>> = {
  met: 'as it is',
  alone: '',
  cannot_alone: 'cannot do it alone',
}

function share(value: number): Content {
  return figure(value, fixed(100 * value, 1))
}

function interval([low, high]: readonly [number, number]): Content {
  return [share(low), ' … ', share(high)]
}
