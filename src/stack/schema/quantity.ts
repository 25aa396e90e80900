import * as z from 'zod'
import {
  displayUnit,
  formatQuantity,
  isFault,
  parseQuantity,
  type QuantityFault,
  type QuantityKind,
} from '../../units/quantity.js'
import { UNIT_TABLES } from '../../units/unitTables.js'
import type { Fault } from '../fault.js'
import type { FieldLimits } from '../fieldLimits.js'

// No code is generated at run time: the page's content security policy forbids it.
z.config({ jitless: true })

export type Limits = Pick<FieldLimits, 'quantity' | 'min' | 'max' | 'open'>

/** Reports a fault from within a schema; `schemaProblems` gives it its place. */
export function report(
  context: { addIssue(issue: { code: 'custom'; message: string; path?: PropertyKey[]; params: object }): void },
  fault: Fault,
  path: PropertyKey[] = [],
): void {
  context.addIssue({ code: 'custom', message: fault.message, path, params: { fault } })
}

/** A number with its unit in the file; in the checked stack nm, radians, fraction. */
export function quantitySchema(limits: Limits, description: string, example?: string) {
  const { quantity } = limits
  return z
    .union([z.number(), z.string().meta({ pattern: quantityPattern(quantity) })], { error: () => spellingOf(limits) })
    .meta({
      description: quantity === 'number' ? description : `${description} A bare number is in ${bareUnit(limits)}.`,
      examples: [example ?? formatQuantity(exampleValue(limits), quantity)],
    })
    .transform((raw, context) => {
      const value = readQuantity(raw, limits)
      if (typeof value === 'number') return value
      report(context, value)
      return z.NEVER
    })
}

/** For editors; the reading itself is `parseQuantity`'s. */
function quantityPattern(quantity: QuantityKind): string {
  return String.raw`^\s*[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?\s*(${Object.keys(UNIT_TABLES[quantity].units).join('|')})?\s*$`
}

/** A number without unit. */
export function numberSchema(limits: Limits, description: string, example?: number) {
  return z
    .number({ error: () => spellingOf(limits) })
    .meta({
      description,
      ...(limits.open === 'min' ? { exclusiveMinimum: limits.min } : { minimum: limits.min }),
      maximum: limits.max,
      ...(example !== undefined && { examples: [example] }),
    })
    .transform((raw, context) => {
      const fault = rangeFault(raw, raw, limits)
      if (fault === undefined) return raw
      report(context, fault)
      return z.NEVER
    })
}

/** The value in internal units, or what is wrong with it. */
export function readQuantity(raw: unknown, limits: Limits): number | Fault {
  const value = parseQuantity(raw, limits.quantity)
  if (isFault(value)) return quantityFault(value)
  return rangeFault(raw, value, limits) ?? value
}

function quantityFault({ received, allowed, hint }: QuantityFault): Fault {
  const isUnit = hint?.includes('unit') ?? false
  return {
    code: isUnit ? 'wrong_unit' : 'wrong_type',
    message: hint ?? 'the value cannot be read',
    received,
    allowed,
    next: isUnit ? 'use one of the units allowed here' : 'write a number with a unit',
  }
}

/** Out of the limits? A share above 1 without a percent sign is the usual slip. */
export function rangeFault(raw: unknown, value: number, limits: Limits): Fault | undefined {
  const { min, max, open, quantity } = limits
  const tooSmall = open === 'min' ? value <= min : value < min
  const tooLarge = open === 'max' ? value >= max : value > max
  if (!tooSmall && !tooLarge) return undefined
  const percentForgotten = quantity === 'share' && tooLarge && value <= 100 && !String(raw).includes('%')
  return {
    code: 'out_of_range',
    message: `the value is too ${tooSmall ? 'small' : 'large'}`,
    received: String(raw),
    allowed: rangeText(limits),
    ...(percentForgotten && { suggestion: `${String(raw)} %` }),
    next: percentForgotten ? 'add the percent sign, or write a fraction' : 'check the number and its unit',
  }
}

function rangeText({ min, max, open, quantity }: Limits): string {
  const from = limitText(min, quantity)
  const to = limitText(max, quantity)
  return `${open === 'min' ? 'more than' : 'from'} ${from} ${open === 'max' ? 'to below' : 'to'} ${to}`
}

/** Long lengths in the unit people would use. */
function limitText(value: number, quantity: QuantityKind): string {
  if (quantity !== 'length' || Math.abs(value) < 1e4) return formatQuantity(value, quantity, 6)
  return Math.abs(value) < 1e6 ? `${value / 1e3} um` : `${value / 1e6} mm`
}

function spellingOf({ quantity }: Limits): string {
  const fault = parseQuantity(undefined, quantity)
  return isFault(fault) ? fault.allowed : ''
}

function bareUnit({ quantity }: Limits): string {
  return quantity === 'share' ? 'fractions of 1' : displayUnit(quantity)
}

function exampleValue({ min, max, quantity }: Limits): number {
  const usual = { length: 138, angle: Math.PI / 4, share: 0.45, number: 1, illuminance: 500, luminance: 600 }
  const value = quantity === 'temperature' ? 5000 : usual[quantity]
  return Math.min(max, Math.max(min, value))
}
