/** The questions asked of a stack: optimize, tolerance, compare, fit. */
import * as z from 'zod'
import type { Fault } from '../fault.js'
import { CONDITION_LIMITS } from '../fieldLimits.js'
import type { CompareQuestion, FitQuestion, Objective, OptimizeQuestion, ToleranceQuestion } from '../stack.js'
import { phi, theta } from './conditions.js'
import { illuminance, limitSchema, metric } from './metric.js'
import { numberSchema, quantitySchema, report } from './quantity.js'
import { requires } from './requires.js'
import { rangesSchema, spreadsSchema } from './vary.js'

const view = z.strictObject({
  theta,
  phi,
  weight: numberSchema(CONDITION_LIMITS.weight, 'Weight of this view in the mean.', 1).prefault(1),
})

const objective = z
  .strictObject({
    metric,
    illuminance,
    views: z
      .array(view)
      .min(1)
      .max(1000)
      .prefault([{}])
      .refine((views) => views.some(({ weight }) => weight > 0), { error: 'all views have the weight 0' })
      .meta({ description: 'Directions whose weighted mean counts.', examples: [[{ theta: '0 deg', weight: 1 }]] }),
    quantile: quantitySchema(
      CONDITION_LIMITS.quantile,
      'Robust design: the value that this share of production does at least as well as, under the tolerances.',
      '95 %',
    ).optional(),
    under: z.literal('tolerance').optional().meta({ description: 'Where the spreads of the quantile stand.' }),
  })
  .meta({ title: 'Objective', examples: [{ metric: 'color_weighted_reflectance' }] })

export const optimizeSchema = z
  .strictObject({
    vary: rangesSchema,
    minimize: objective.optional().meta({ description: 'What is to become small.' }),
    maximize: objective.optional().meta({ description: 'What is to become large.' }),
    subject_to: z.array(limitSchema).max(200).prefault([]).meta({ description: 'Limits the design must keep.' }),
  })
  .transform(({ vary, minimize, maximize, subject_to }, context): OptimizeQuestion => {
    const aim = minimize ?? maximize
    if (aim === undefined || (minimize !== undefined && maximize !== undefined)) {
      report(context, aimFault(aim === undefined ? 'neither' : 'both'), aim === undefined ? [] : ['maximize'])
      return z.NEVER
    }
    const { under: _, ...rest } = aim
    const directed: Objective = { ...rest, sense: minimize === undefined ? -1 : 1 }
    return { vary, minimize: directed, subject_to }
  })
  .meta({
    description: 'Which angles and retardances?',
    oneOf: [requires('minimize'), requires('maximize')],
  })

function aimFault(received: string): Fault {
  const next = 'state one aim; put the others under subject_to'
  return { code: 'exclusive', message: 'the search needs one aim', received, allowed: 'minimize or maximize', next }
}

/** Draws that a study in flat memory still gets through. */
const MOST_SAMPLES = 100_000_000

export const toleranceSchema = z
  .strictObject({
    samples: countSchema(1, MOST_SAMPLES, 'Laminates drawn.').prefault(2000),
    seed: countSchema(0, 2 ** 32 - 1, 'Same seed, same draws.').prefault(1),
    sampling: z
      .enum(['random', 'latin_hypercube', 'sobol'])
      .prefault('sobol')
      .meta({ description: 'How the draws fill the space.' }),
    vary: spreadsSchema,
    together: z
      .array(z.array(z.string()).min(2))
      .prefault([])
      .meta({
        description: 'Groups of paths that share one draw, such as films from one roll.',
        examples: [[['half.retardance', 'quarter.retardance']]],
      }),
  })
  .transform((tolerance): ToleranceQuestion => tolerance)
  .meta({ description: 'How much of production passes?' })

function countSchema(min: number, max: number, description: string) {
  const allowed = `a whole number from ${min} to ${max}`
  return z
    .number({ error: () => allowed })
    .transform((count, context) => {
      if (Number.isInteger(count) && count >= min && count <= max) return count
      report(context, { code: 'out_of_range', message: 'this is no possible number', received: String(count), allowed })
      return z.NEVER
    })
    .meta({ description, minimum: min, maximum: max, multipleOf: 1 })
}

/** Slots still as patterns of files: the cards are read when the layers are known. */
export const compareSchema = z
  .strictObject({
    slots: z
      .record(
        z.string(),
        z.union([z.string().transform((glob) => [glob]), z.array(z.string()).min(1)], {
          error: () => 'a file pattern or a list of them',
        }),
      )
      .meta({ description: 'Layer id to film cards.', examples: [{ quarter: ['films/quarter-*.film.yaml'] }] }),
    optimize: z.boolean().prefault(false).meta({ description: 'Optimize every combination before it is ranked.' }),
  })
  .meta({ description: 'Which film to buy?' })

export type RawCompare = Omit<CompareQuestion, 'slots'> & {
  readonly slots: Readonly<Record<string, readonly string[]>>
}

export const fitSchema = z
  .strictObject({
    vary: rangesSchema,
    noise: quantitySchema(
      CONDITION_LIMITS.noise,
      'Standard deviation of one measured reflectance.',
      '0.05 %',
    ).optional(),
  })
  .transform((fit): FitQuestion => fit)
  .meta({ description: 'Which layer went wrong?' })
