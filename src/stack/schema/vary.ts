import * as z from 'zod'
import type { Fault, PathKey } from '../fault.js'
import { limitsOfPath } from '../fieldLimits.js'
import type { Range, Spread } from '../stack.js'
import { type Limits, readQuantity, report } from './quantity.js'

/** Units are read when the path is known: it tells what is measured. */
const raw = z.union([z.number(), z.string()], { error: () => 'a number with its unit, such as 45 deg or 138 nm' })

const described = (description: string) => raw.meta({ description })

const MOST_VALUES = 1000

const range = z
  .union(
    [
      z
        .strictObject({ from: described('Lower bound.'), to: described('Upper bound.') })
        .meta({ title: 'Bounds', examples: [{ from: '0 deg', to: '180 deg' }] }),
      z
        .strictObject({ values: z.array(raw).min(1).max(MOST_VALUES).meta({ description: 'The values.' }) })
        .meta({ title: 'Values on offer', examples: [{ values: ['15 deg', '45 deg', '75 deg'] }] }),
      z
        .array(raw)
        .min(1)
        .max(MOST_VALUES)
        .meta({ title: 'Values on offer', examples: [['15 deg', '75 deg']] }),
    ],
    { error: () => '{from: 0 deg, to: 180 deg}, {values: [15 deg, 75 deg]} or a list of values' },
  )
  .meta({ description: 'Bounds of the parameter, or the values on offer.' })

type RawRange = z.output<typeof range>

export const rangesSchema = pathRecord(range, readRange).meta({
  description: 'Parameter path to its bounds.',
  examples: [{ 'quarter.slow_axis': { from: '0 deg', to: '180 deg' } }],
})

const spread = z
  .union(
    [
      z
        .strictObject({
          normal: described('Standard deviation.'),
          limit: described('Cut off beyond ± this.').optional(),
        })
        .meta({
          title: 'Normal',
          description: 'Standard deviation, cut off at ± limit.',
          examples: [{ normal: '2 nm' }],
        }),
      z
        .strictObject({ uniform: described('Half-width.') })
        .meta({ title: 'Uniform', description: 'Half-width.', examples: [{ uniform: '0.5 deg' }] }),
      z
        .strictObject({ triangular: described('Half-width.') })
        .meta({ title: 'Triangular', description: 'Half-width.' }),
      z
        .strictObject({
          offset: z
            .array(raw)
            .min(2)
            .max(MOST_VALUES)
            .meta({ description: 'Offsets from the file’s value, ascending.' }),
          density: z.array(z.number().min(0)).min(2).meta({ description: 'How frequent each is, relative.' }),
        })
        .meta({ title: 'Measured', description: 'Offsets from the file’s value and how frequent they are.' }),
    ],
    {
      error: () =>
        '{normal: 2 nm}, {normal: 2 nm, limit: 6 nm}, {uniform: 0.5 deg}, {triangular: 1 nm} or {offset, density}',
    },
  )
  .meta({ description: 'How production scatters about the file’s value.' })

type RawSpread = z.output<typeof spread>

export const spreadsSchema = pathRecord(spread, readSpread).meta({
  description: 'Parameter path to its spread.',
  examples: [{ 'quarter.slow_axis': { normal: '0.5 deg' } }],
})

/** Reads one value of a record, telling faults by their place within it. */
type Reader<Raw, Value> = (raw: Raw, limits: Limits, tell: (fault: Fault, at: PathKey[]) => void) => Value

const NOTHING_VARIES: Fault = {
  code: 'out_of_range',
  message: 'nothing is varied',
  received: 'no path',
  allowed: 'at least one parameter path',
  next: 'name one, such as quarter.slow_axis, or leave the section out',
}

/** A record by parameter path. Paths that name no field are left out here; the sense check tells them. */
function pathRecord<Schema extends z.ZodType, Value>(schema: Schema, read: Reader<z.output<Schema>, Value>) {
  return z.record(z.string(), schema).transform((record, context): Readonly<Record<string, Value>> => {
    if (Object.keys(record).length === 0) report(context, NOTHING_VARIES)
    const entries = Object.entries(record).flatMap(([path, value]): [string, Value][] => {
      const limits = limitsOfPath(path)
      if (limits === undefined) return []
      return [[path, read(value as z.output<Schema>, limits, (fault, at) => report(context, fault, [path, ...at]))]]
    })
    return Object.fromEntries(entries)
  })
}

function readRange(range: RawRange, limits: Limits, tell: (fault: Fault, at: PathKey[]) => void): Range {
  const read = reader(limits, tell)
  if (Array.isArray(range)) return { values: range.map((value, i) => read(value, [i])) }
  if ('values' in range) return { values: range.values.map((value, i) => read(value, ['values', i])) }
  const bounds = { from: read(range.from, ['from']), to: read(range.to, ['to']) }
  if (bounds.from >= bounds.to) {
    const received = `from ${range.from} to ${range.to}`
    tell(
      {
        code: 'empty_range',
        message: 'the range is empty',
        received,
        allowed: 'from below to',
        next: 'write the smaller first',
      },
      [],
    )
  }
  return bounds
}

function readSpread(spread: RawSpread, limits: Limits, tell: (fault: Fault, at: PathKey[]) => void): Spread {
  const { quantity, max, min } = limits
  const width = reader({ quantity, min: 0, max: max - min }, tell)
  if ('normal' in spread) {
    const limit = spread.limit === undefined ? {} : { limit: width(spread.limit, ['limit']) }
    return { normal: width(spread.normal, ['normal']), ...limit }
  }
  if ('uniform' in spread) return { uniform: width(spread.uniform, ['uniform']) }
  if ('triangular' in spread) return { triangular: width(spread.triangular, ['triangular']) }
  const signed = reader({ quantity, min: min - max, max: max - min }, tell)
  const offset = spread.offset.map((value, i) => signed(value, ['offset', i]))
  const fault = densityFault(offset, spread.density)
  if (fault !== undefined) tell(fault, ['offset'])
  return { offset, density: spread.density }
}

function densityFault(offset: readonly number[], density: readonly number[]): Fault | undefined {
  const received = `${offset.length} offsets, ${density.length} densities`
  if (offset.length !== density.length)
    return { code: 'wrong_length', message: 'offset and density differ in length', received }
  if (offset.some((value, i) => i > 0 && value <= offset[i - 1])) {
    return { code: 'not_ascending', message: 'the offsets must ascend', next: 'sort the table' }
  }
  if (density.every((value) => value === 0)) {
    return { code: 'out_of_range', message: 'all densities are zero', allowed: 'at least one above 0' }
  }
  return undefined
}

/** Reads a quantity; NaN where it told a fault. */
function reader(limits: Limits, tell: (fault: Fault, at: PathKey[]) => void) {
  return (value: unknown, at: PathKey[]): number => {
    const read = readQuantity(value, limits)
    if (typeof read === 'number') return read
    tell(read, at)
    return Number.NaN
  }
}
