import * as z from 'zod'
import { CONDITION_LIMITS } from '../fieldLimits.js'
import type { Conditions } from '../stack.js'
import type { TableFiles } from '../tableFiles.js'
import { illuminantSchema } from './illuminant.js'
import { numberSchema, quantitySchema, report } from './quantity.js'

const MOST_WAVELENGTHS = 2001
const MOST_DIRECTIONS = 10_000

export const theta = quantitySchema(CONDITION_LIMITS.theta, 'From the normal to the eye.', '45 deg').prefault('0 deg')
export const phi = quantitySchema(CONDITION_LIMITS.phi, 'Azimuth of the eye, counter-clockwise.', '90 deg').prefault(
  '0 deg',
)

const wavelength = (description: string, start: string) =>
  quantitySchema(CONDITION_LIMITS.wavelength, description, start).prefault(start)

const wavelengths = z
  .strictObject({
    from: wavelength('First wavelength.', '380 nm'),
    to: wavelength('Last wavelength.', '780 nm'),
    step: quantitySchema(CONDITION_LIMITS.step, 'Distance of two wavelengths.', '5 nm').prefault('5 nm'),
  })
  .transform((range, context) => {
    const received = `from ${range.from} nm to ${range.to} nm by ${range.step} nm`
    const count = Math.floor((range.to - range.from) / range.step + 1e-9) + 1
    if (range.from >= range.to) {
      const message = 'the range of wavelengths is empty'
      report(context, {
        code: 'empty_range',
        message,
        received,
        allowed: 'from below to',
        next: 'write the smaller first',
      })
    } else if (count > MOST_WAVELENGTHS) {
      const allowed = `at most ${MOST_WAVELENGTHS} wavelengths`
      const message = `this makes ${count} wavelengths`
      report(context, { code: 'too_large', message, received, allowed, next: 'take a larger step' })
    }
    return range
  })
  .meta({ description: 'Where the spectra are computed.' })

const observer = quantitySchema(
  { quantity: 'angle', min: 0, max: Math.PI },
  'Standard observer: 2 deg or 10 deg.',
  '2 deg',
)
  .transform((radians, context): 2 | 10 => {
    const degrees = Math.round((radians * 180) / Math.PI)
    if (degrees === 2 || degrees === 10) return degrees
    const next = 'choose the observer of the governing standard'
    const message = 'there is no such standard observer'
    report(context, { code: 'unknown_name', message, received: `${degrees} deg`, allowed: '2 deg or 10 deg', next })
    return z.NEVER
  })
  .prefault('2 deg')

const weight = numberSchema(CONDITION_LIMITS.weight, 'Weight.', 1)
const colorWeights = z
  .tuple([weight, weight, weight])
  .transform((weights, context) => {
    if (weights.every((value) => value === 0)) {
      report(context, {
        code: 'out_of_range',
        message: 'all three weights are zero',
        received: '0, 0, 0',
        allowed: 'at least one above 0',
      })
    }
    return weights
  })
  .prefault([1, 1, 1])
  .meta({ description: 'Weights of X/Xn, Y/Yn, Z/Zn in the color-weighted reflectance.' })

export function conditionsSchema(files: TableFiles) {
  return z
    .strictObject({
      wavelengths: wavelengths.prefault({}),
      observer,
      illuminant: illuminantSchema(files, 'Light of the room.').prefault('D65'),
      directions: z
        .array(z.strictObject({ theta, phi }))
        .min(1)
        .max(MOST_DIRECTIONS)
        .prefault([{}])
        .meta({ description: 'Where the eye stands.', examples: [[{ theta: '0 deg', phi: '0 deg' }]] }),
      color_weights: colorWeights,
    })
    .transform((conditions): Conditions => conditions)
    .prefault({})
    .meta({ description: 'Wavelengths, observer, illuminant and directions.' })
}
