import { findParameter } from '../stack/parameters.js'
import type { Stack } from '../stack/stack.js'
import type { Fit } from '../studies/fit.js'
import type { SingleFault } from '../studies/singleFaults.js'
import { fromPlain } from '../units/quantity.js'
import { fixed } from './decimals.js'
import { ESTIMATE_CAUTION } from './evaluateText.js'
import { type Paint, PLAIN } from './paint.js'
import { parameterText } from './parameterText.js'
import { type Column, textTable } from './textTable.js'
import { plural } from './wording.js'

/** What the sample turned out to be, what cannot be told apart, and the single faults in order. */
export function fitText(stack: Stack, fit: Fit, paint: Paint = PLAIN): string {
  const parts = [
    `${paint.strong(fit.title)}\nfit to ${plural(readings(fit), 'reading')} from ${plural(fit.directions.length, 'direction')}`,
    parametersText(stack, fit),
    remainderText(fit),
    unresolvedText(fit, paint),
    faultsText(stack, fit),
    paint.faint(ESTIMATE_CAUTION),
  ]
  return `${parts.filter((part) => part !== '').join('\n\n')}\n`
}

function readings({ directions }: Fit): number {
  return directions.reduce((sum, { measured }) => sum + measured.length, 0)
}

const PARAMETERS: readonly Column[] = [
  { heading: 'parameter', align: 'left' },
  { heading: '', align: 'left' },
  { heading: 'in the file', align: 'right' },
  { heading: 'in the sample', align: 'right' },
  { heading: '± 1 std. dev.', align: 'right' },
  { heading: 'off by', align: 'right' },
]

function parametersText(stack: Stack, { parameters }: Fit): string {
  const rows = Object.entries(parameters).map(([path, { value, std_error, nominal }]) => {
    const { unit, shown } = parameterText(stack, path)
    const error = errorText(stack, path, std_error)
    return [path, unit, shown(nominal), shown(value), error, shown(value - nominal)]
  })
  return textTable(PARAMETERS, rows)
}

/** Errors finer than the decimals of the table keep two digits of their own; one as wide as the range searched says nothing. */
function errorText(stack: Stack, path: string, error: number | null): string {
  if (error === null) return 'at its bound'
  const range = stack.fit?.vary[path]
  const kind = findParameter(stack, path)?.kind ?? 'number'
  if (range !== undefined && 'from' in range && fromPlain(error, kind) > range.to - range.from) return 'unknown'
  const text = parameterText(stack, path).shown(error)
  return Number(text) === 0 ? Number(error.toPrecision(2)).toString() : text
}

function remainderText({ residual_rms, noise, noise_is_stated }: Fit): string {
  const remainder = `left between model and sample: ${fixed(100 * residual_rms, 4)} % rms`
  if (!noise_is_stated) return `${remainder}; the errors above take that for the noise of a reading`
  const ratio = residual_rms / noise
  const verdict = ratio > 1.5 ? 'more than noise: the model misses something' : 'no more than noise'
  return `${remainder}, ${fixed(ratio, 1)} times the stated noise (${verdict})`
}

function unresolvedText({ unresolved }: Fit, paint: Paint): string {
  if (unresolved.length === 0) return 'every parameter is resolved by these directions'
  return [paint.strong('not resolved'), ...unresolved.map(({ sentence }) => `  ${sentence}`)].join('\n')
}

const FAULTS: readonly Column[] = [
  { heading: 'if only this went wrong', align: 'left' },
  { heading: 'it would be', align: 'left' },
  { heading: 'left, % rms', align: 'right' },
  { heading: 'BIC above best', align: 'right' },
]

const MOST_FAULTS = 6

function faultsText(stack: Stack, { single_faults, residual_rms }: Fit): string {
  if (single_faults.length === 0) return 'single faults were not tried: the study was stopped before'
  const rows = single_faults
    .slice(0, MOST_FAULTS)
    .map((fault) => [
      fault.fault,
      faultValues(stack, fault),
      fixed(100 * fault.residual_rms, 4),
      fixed(fault.delta_bic, 1),
    ])
  return `${textTable(FAULTS, rows)}\n${verdict(single_faults[0], residual_rms)}`
}

function faultValues(stack: Stack, { parameters }: SingleFault): string {
  const entries = Object.entries(parameters)
  return entries
    .map(([path, value]) => {
      const { unit, shown } = parameterText(stack, path)
      const name = entries.length > 1 ? path.slice(path.lastIndexOf('.') + 1) : ''
      return [name, shown(value), unit].filter((part) => part !== '').join(' ')
    })
    .join(', ')
}

/** Residuals this many times those of all parameters together count as nearly as good. */
const NEARLY = 1.2

function verdict(best: SingleFault | undefined, residualRms: number): string {
  if (best === undefined || best.residual_rms >= NEARLY * residualRms) {
    return 'no single fault explains the sample as well as all parameters together'
  }
  if (best.fault === 'nothing') return 'the sample is as the file says'
  return `${best.fault} alone explains the sample nearly as well as all parameters together`
}
