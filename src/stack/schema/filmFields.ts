/** What a film itself has, by kind: the fields of a layer that a film card may hold. */
import * as z from 'zod'
import { FIELD_LIMITS } from '../fieldLimits.js'
import type { TableFiles } from '../tableFiles.js'
import { type Limits, numberSchema, quantitySchema } from './quantity.js'
import { DEFAULT_INDEX, type indexSchema } from './refractiveIndex.js'
import { fileTable, inlineTable, spectrumSchema } from './spectrum.js'

type Index = ReturnType<typeof indexSchema>

const inAnyFilm = {
  thickness: quantitySchema(FIELD_LIMITS.thickness, 'Physical thickness.', '25 um'),
  coherent: z.boolean().optional().meta({
    description: 'Joined by amplitudes (true) or by intensities (false). Unless given: thickness below 5 um.',
  }),
}

export function filmFields(files: TableFiles, index: Index) {
  return {
    isotropic: { ...inAnyFilm, index: index('Refractive index.') },
    retarder: { ...inAnyFilm, ...retarderFields(files, index) },
    polarizer: { ...inAnyFilm, ...polarizerFields(files, index) },
    crystal: { ...inAnyFilm, ...crystalFields(index) },
  }
}

function retarderFields(files: TableFiles, index: Index) {
  return {
    index: index('Mean of the three principal indices.').prefault(DEFAULT_INDEX.retarder),
    retardance: spectrumSchema(
      FIELD_LIMITS.retardance,
      files,
      '(nx - ny) d at 550 nm with x the slow axis; a table gives its own dispersion.',
      ['138 nm', '137 nm', '136 nm'],
    ),
    nz: numberSchema(FIELD_LIMITS.nz, '(nx - nz)/(nx - ny). Unless nz or rth is given: 1.', 1).optional(),
    rth: quantitySchema(FIELD_LIMITS.rth, '((nx + ny)/2 - nz) d at 550 nm, in place of nz.', '69 nm').optional(),
    dispersion: dispersionSchema(files).optional(),
  }
}

const RATIOS = z
  .strictObject({
    re450: numberSchema(FIELD_LIMITS.re450, 'Re(450 nm)/Re(550 nm).', 0.85),
    re650: numberSchema(FIELD_LIMITS.re650, 'Re(650 nm)/Re(550 nm).', 1.05),
  })
  .meta({ title: 'Trade ratios', examples: [{ re450: 0.85, re650: 1.05 }] })

/** Any scale will do for a table, a retardance in nm too: it is divided by its value at 550 nm. */
const TABLE_LIMITS = { quantity: 'length', min: -1e6, max: 1e6 } as const

function dispersionSchema(files: TableFiles) {
  return z
    .union([RATIOS, inlineTable(TABLE_LIMITS, ['1.06', '1', '0.98']), fileTable(TABLE_LIMITS, files)], {
      error: () => '{re450, re650}, {wavelength_nm: […], value: […]} or {file: x.csv}',
    })
    .meta({ description: 'How retardance goes with wavelength; absent: flat.' })
}

function polarizerFields(files: TableFiles, index: Index) {
  const share = (limits: Limits, description: string, example: string) =>
    spectrumSchema(limits, files, description, [example]).optional()
  return {
    index: index('Refractive index of the host; its absorption comes from the transmittances.').prefault(
      DEFAULT_INDEX.polarizer,
    ),
    single_transmittance: share(inAir, 'In air, unpolarized light, faces included.', '43.2 %'),
    polarization_efficiency: share(inAir, '(K1 - K2)/(K1 + K2), in air.', '99.98 %'),
    k1: share(inAir, 'Along the transmission axis, in air, faces included.', '86 %'),
    k2: share(inAir, 'Along the absorption axis, in air, faces included.', '0.02 %'),
    transmission_axis_transmittance: share(internal, 'Internal, one pass, along the transmission axis.', '93 %'),
    absorption_axis_transmittance: share(internal, 'Internal, one pass, along the absorption axis.', '0.02 %'),
  }
}

const inAir = FIELD_LIMITS.single_transmittance
const internal = FIELD_LIMITS.transmission_axis_transmittance

function crystalFields(index: Index) {
  return {
    indices: z
      .tuple([index('Along the first axis.'), index('Along the second axis.'), index('Along the third axis.')])
      .meta({ description: 'The three principal indices.', examples: [[1.65, 1.52, 1.58]] }),
    tilt: quantitySchema(FIELD_LIMITS.tilt, 'First axis out of the film plane, towards the viewer.', '30 deg').prefault(
      '0 deg',
    ),
  }
}
