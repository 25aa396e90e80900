import * as z from 'zod'
import { FIELD_LIMITS } from '../fieldLimits.js'
import type { Emission } from '../stack.js'
import type { TableFiles } from '../tableFiles.js'
import { illuminantSchema } from './illuminant.js'
import { quantitySchema } from './quantity.js'

const polarization = z
  .union(
    [
      z.literal('none'),
      z
        .strictObject({
          axis: quantitySchema(FIELD_LIMITS.axis, 'Azimuth of the long axis of the ellipse.', '0 deg'),
          ellipticity: quantitySchema(
            FIELD_LIMITS.ellipticity,
            '0 is linear, 45 deg right-handed circular.',
            '0 deg',
          ).prefault('0 deg'),
          degree: quantitySchema(FIELD_LIMITS.degree, 'Degree of polarization.', '100 %').prefault('100 %'),
        })
        .meta({ title: 'Given state', examples: [{ axis: '0 deg' }] }),
    ],
    { error: () => 'none, or {axis, ellipticity, degree}' },
  )
  .prefault('none')
  .meta({ description: 'State of the light that leaves the panel: none for OLED, a given one for LCD.' })

export function emissionSchema(files: TableFiles) {
  return z
    .strictObject({
      luminance: quantitySchema(
        FIELD_LIMITS.luminance,
        'White at the eye, on axis; 0: not stated.',
        '600 cd/m2',
      ).prefault(0),
      dark_luminance: quantitySchema(
        FIELD_LIMITS.dark_luminance,
        'Black at the eye, in the dark.',
        '0.0005 cd/m2',
      ).prefault(0),
      spectrum: illuminantSchema(files, 'Spectrum of the screen’s white.').prefault('D65'),
      polarization,
    })
    .transform((emission): Emission => emission)
    .prefault({})
    .meta({ description: 'Light of the screen itself.' })
}
