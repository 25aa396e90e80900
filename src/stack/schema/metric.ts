import * as z from 'zod'
import type { Fault } from '../fault.js'
import { CONDITION_LIMITS } from '../fieldLimits.js'
import { METRIC_LIMITS } from '../metricLimits.js'
import { type Limit, METRIC_NAMES } from '../stack.js'
import { phi, theta } from './conditions.js'
import { quantitySchema, readQuantity, report } from './quantity.js'
import { requires } from './requires.js'

export const metric = z
  .enum(METRIC_NAMES)
  .meta({ description: 'What is judged.', examples: ['luminous_reflectance', 'chroma'] })

export const illuminance = quantitySchema(
  CONDITION_LIMITS.illuminance,
  'Ambient light of the contrast; unless given, the first of ambient.',
  '500 lx',
).optional()

const bound = z
  .union([z.number(), z.string()], { error: () => 'a number; shares such as 5 % or 0.05' })
  .optional()
  .meta({ examples: ['5 %', 6] })

/** A metric that must stay below `max` or above `min`. */
export const limitSchema = z
  .strictObject({
    metric,
    theta,
    phi,
    illuminance,
    max: bound.meta({ description: 'Largest allowed value.', examples: ['5 %'] }),
    min: bound.meta({ description: 'Smallest allowed value.', examples: ['42 %'] }),
  })
  .transform(({ max, min, ...request }, context): Limit => {
    const limit: Limit = { ...request, ...read('max', max), ...read('min', min) }
    if (max === undefined && min === undefined) report(context, noBound())
    else if (limit.max !== undefined && limit.min !== undefined && limit.min > limit.max) {
      report(context, contradiction(`min ${String(min)}, max ${String(max)}`), ['min'])
    }
    return limit

    function read(name: 'max' | 'min', raw: unknown): { max?: number; min?: number } {
      if (raw === undefined) return {}
      const value = readQuantity(raw, METRIC_LIMITS[request.metric])
      if (typeof value === 'number') return { [name]: value }
      report(context, value, [name])
      return {}
    }
  })
  .meta({
    title: 'Limit',
    anyOf: [requires('max'), requires('min')],
    examples: [{ metric: 'luminous_reflectance', max: '5 %' }],
  })

function noBound(): Fault {
  return { code: 'missing_key', message: 'the limit has no bound', allowed: 'max, min or both', next: 'add max or min' }
}

function contradiction(received: string): Fault {
  return { code: 'empty_range', message: 'no value can meet this limit', received, allowed: 'min at most max' }
}
