import { METRIC_QUANTITIES } from '../charts/quantity.js'
import type { MetricName, Stack } from '../stack/stack.js'
import type { Comparison } from '../studies/compare.js'
import type { Candidate } from '../studies/describeCandidate.js'
import { type FrontAxis, isWord } from '../studies/frontAxis.js'
import { fixed } from './decimals.js'
import { ESTIMATE_CAUTION } from './evaluateText.js'
import { metricKeyLabel, metricKeyNumber, metricKeyUnit } from './metricKeyText.js'
import { metricNumber } from './metricNumber.js'
import { type Paint, PLAIN } from './paint.js'
import { parameterText } from './parameterText.js'
import { type Column, textTable } from './textTable.js'

const MOST_ROWS = 20

/** The best candidates in order, those on the front marked. */
export function compareText(stack: Stack, comparison: Comparison, paint: Paint = PLAIN): string {
  const { candidates } = comparison
  const parts = [
    `${paint.strong(comparison.title)}\n${headText(stack, comparison)}`,
    rankingText(stack, comparison),
    bestText(comparison),
    frontText(comparison),
    ruledOutText(stack, comparison),
    comparison.interrupted ? `interrupted: what was found for ${candidates.length} candidates is in hand` : '',
    paint.faint(ESTIMATE_CAUTION),
  ]
  return `${parts.filter((part) => part !== '').join('\n\n')}\n`
}

/** What candidates are ranked by. */
export function rankedBy(stack: Stack): MetricName {
  return stack.optimize?.minimize.metric ?? 'color_weighted_reflectance'
}

function headText(stack: Stack, { candidates, slots, optimized }: Comparison): string {
  const { label } = METRIC_QUANTITIES[rankedBy(stack)]
  const angles = optimized ? 'angles searched for each' : 'angles as in the file'
  return `${candidates.length} candidates for ${slots.join(', ')}, ranked by ${label}; ${angles}`
}

interface CandidateColumn {
  readonly column: Column
  readonly cell: (candidate: Candidate, rank: number) => string
}

function rankingText(stack: Stack, comparison: Comparison): string {
  const columns = columnsOf(stack, comparison)
  const rows = comparison.candidates
    .slice(0, MOST_ROWS)
    .map((candidate, k) => columns.map(({ cell }) => cell(candidate, k)))
  return textTable(
    columns.map(({ column }) => column),
    rows,
  )
}

function columnsOf(stack: Stack, { slots, candidates, front, front_axes }: Comparison): CandidateColumn[] {
  const metric = rankedBy(stack)
  const numbers = (heading: string, cell: CandidateColumn['cell']): CandidateColumn => ({
    column: { heading, align: 'right' },
    cell,
  })
  const words = (heading: string, cell: CandidateColumn['cell']): CandidateColumn => ({
    column: { heading, align: 'left' },
    cell,
  })
  const keys = front_axes.filter((axis) => !isWord(axis))
  return [
    numbers('', (_, k) => `${front.includes(k) ? '* ' : ''}${k + 1}`),
    ...slots.map((slot) => words(slot, ({ files }) => cardStem(files[slot]))),
    numbers(`objective ${METRIC_QUANTITIES[metric].unit}`.trim(), ({ objective, violation }) =>
      violation > 0 ? 'unmet' : metricNumber(metric, objective),
    ),
    ...Object.keys(candidates[0]?.parameters ?? {}).map((path) => {
      const { unit, shown } = parameterText(stack, path)
      return numbers(`${path} ${unit}`.trim(), ({ parameters }) => shown(parameters[path]))
    }),
    ...keys.map((key) =>
      numbers(`${key} ${metricKeyUnit(key)}`.trim(), ({ metrics }) => metricKeyNumber(key, metrics[key])),
    ),
    numbers('price/m²', ({ price_per_m2: price }) => (price === undefined ? '–' : fixed(price, 2))),
    numbers('films µm', ({ thickness_nm }) => fixed(thickness_nm / 1000, 1)),
    words('limits', ({ limits_met }) => (limits_met ? 'met' : 'missed')),
  ]
}

/** Name of a card's file, without folder and ending. */
function cardStem(file: string): string {
  return file.slice(file.lastIndexOf('/') + 1).replace(/(\.film)?\.ya?ml$/, '')
}

function bestText({ candidates: [best], slots }: Comparison): string {
  if (best === undefined) return ''
  return `best:\n${slots.map((slot) => `  ${slot}: ${best.films[slot]}`).join('\n')}`
}

function frontText({ front_axes, front }: Comparison): string {
  return `* on the front of ${front_axes.map(axisLabel).join('; ')}: ${front.length} candidates that no other betters in all of these`
}

function axisLabel(axis: FrontAxis): string {
  if (axis === 'objective') return 'objective'
  if (axis === 'price_per_m2') return 'price'
  if (axis === 'thickness_nm') return 'thickness'
  return metricKeyLabel(axis)
}

function ruledOutText(stack: Stack, { ruled_out, margins }: Comparison): string {
  if (margins === undefined) return ''
  const { free, held } = margins
  const bounds = [
    ...(free === undefined ? [] : [boundText(stack, free)]),
    ...(held === undefined ? [] : [`${boundText(stack, held)} where a constraint held it`]),
  ]
  return (
    `${ruled_out} candidates were ruled out by a quick search: they would not be among the best even if it fell short by\n` +
    `${bounds.join(', or by ')}: three times the most it did where candidates were searched both ways;\n` +
    'their numbers are those of the quick search'
  )
}

/** A bound to two digits: it may be finer than the decimals of the table. */
function boundText(stack: Stack, bound: number): string {
  const { factor, unit } = METRIC_QUANTITIES[rankedBy(stack)]
  return `${Number((factor * bound).toPrecision(2))} ${unit}`.trim()
}
