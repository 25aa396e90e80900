import * as z from 'zod'
import type { Fault } from '../fault.js'
import { FIELD_LIMITS } from '../fieldLimits.js'
import { retardanceFault, withScalarRetardance } from '../measuredRetardance.js'
import type { Layer } from '../stack.js'
import type { TableFiles } from '../tableFiles.js'
import { numberSchema, quantitySchema, report } from './quantity.js'
import { DEFAULT_INDEX, type indexSchema } from './refractiveIndex.js'
import { requires } from './requires.js'
import { fileTable, inlineTable, spectrumSchema } from './spectrum.js'

/** Layers thinner than this are coherent unless the file says otherwise, nm. */
const THICK_FROM_NM = 5000

/** First words of paths that are no layer. */
const RESERVED_IDS: readonly string[] = [
  'panel',
  'emission',
  'conditions',
  'ambient',
  'limits',
  'layers',
  'optimize',
  'tolerance',
  'compare',
  'fit',
  'format',
  'title',
  'notes',
  'theta',
  'phi',
  'wavelength',
  'constructor',
]

const idSchema = z
  .string()
  .transform((id, context) => {
    const fault = idFault(id)
    if (fault !== undefined) report(context, fault)
    return id
  })
  .meta({
    description: 'Name of the layer in paths such as half.slow_axis: lower case, digits and underscores.',
    examples: ['quarter'],
    pattern: '^[a-z][a-z0-9_]*$',
    maxLength: 40,
    not: { enum: [...RESERVED_IDS] },
  })

function idFault(id: string): Fault | undefined {
  if (RESERVED_IDS.includes(id)) {
    const message = 'this name is taken: paths use it for something else'
    return { code: 'reserved_id', message, received: id, suggestion: `${id}_layer`, next: 'choose another id' }
  }
  if (/^[a-z][a-z0-9_]{0,39}$/.test(id)) return undefined
  const suggestion = id
    .replace(/([a-z])([A-Z])/g, '$1_$2')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '_')
    .replace(/^[^a-z]+|_+$/g, '')
    .slice(0, 40)
  return {
    code: 'bad_id',
    message: 'the id cannot be used in a path',
    received: id,
    allowed: 'lower-case letters, digits and underscores, a letter first, at most 40 characters',
    ...(suggestion !== '' && !RESERVED_IDS.includes(suggestion) && { suggestion }),
  }
}

const thickness = quantitySchema(FIELD_LIMITS.thickness, 'Physical thickness.', '25 um')
const coherent = z
  .boolean()
  .optional()
  .meta({ description: 'Joined by amplitudes (true) or by intensities (false). Unless given: thickness below 5 um.' })
const film = z
  .string()
  .optional()
  .meta({
    description: 'Film card whose fields lie under those given here.',
    examples: ['films/quarter-a.film.yaml'],
  })

const angle = (description: string) => quantitySchema(FIELD_LIMITS.azimuth, description, '45 deg').prefault('0 deg')

/** What a film itself has, by kind: the fields a film card may hold. */
export function filmFields(files: TableFiles, index: ReturnType<typeof indexSchema>) {
  const transmittance = (name: 'single_transmittance' | 'transmission_axis_transmittance', text: string, say: string) =>
    spectrumSchema(FIELD_LIMITS[name], files, text, [say]).optional()
  const crossed = (name: 'k2' | 'absorption_axis_transmittance', text: string) =>
    spectrumSchema(FIELD_LIMITS[name], files, text, ['0.02 %']).optional()
  return {
    isotropic: { thickness, coherent, index: index('Refractive index.') },
    retarder: {
      thickness,
      coherent,
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
    },
    polarizer: {
      thickness,
      coherent,
      index: index('Refractive index of the host; its absorption comes from the transmittances.').prefault(
        DEFAULT_INDEX.polarizer,
      ),
      single_transmittance: transmittance(
        'single_transmittance',
        'In air, unpolarized light, faces included.',
        '43.2 %',
      ),
      polarization_efficiency: transmittance('single_transmittance', '(K1 - K2)/(K1 + K2), in air.', '99.98 %'),
      k1: transmittance('single_transmittance', 'Along the transmission axis, in air, faces included.', '86 %'),
      k2: crossed('k2', 'Along the absorption axis, in air, faces included.'),
      transmission_axis_transmittance: transmittance(
        'transmission_axis_transmittance',
        'Internal, one pass, along the transmission axis.',
        '93 %',
      ),
      absorption_axis_transmittance: crossed(
        'absorption_axis_transmittance',
        'Internal, one pass, along the absorption axis.',
      ),
    },
    crystal: {
      thickness,
      coherent,
      indices: z
        .tuple([index('Along the first axis.'), index('Along the second axis.'), index('Along the third axis.')])
        .meta({ description: 'The three principal indices.', examples: [[1.65, 1.52, 1.58]] }),
      tilt: quantitySchema(
        FIELD_LIMITS.tilt,
        'First axis out of the film plane, towards the viewer.',
        '30 deg',
      ).prefault('0 deg'),
    },
  }
}

const RATIOS = z
  .strictObject({
    re450: numberSchema(FIELD_LIMITS.re450, 'Re(450 nm)/Re(550 nm).', 0.85),
    re650: numberSchema(FIELD_LIMITS.re650, 'Re(650 nm)/Re(550 nm).', 1.05),
  })
  .meta({ title: 'Trade ratios', examples: [{ re450: 0.85, re650: 1.05 }] })

/** Any scale will do for a table: it is divided by its value at 550 nm. */
const TABLE_LIMITS = { quantity: 'number', min: -1e6, max: 1e6 } as const

function dispersionSchema(files: TableFiles) {
  return z
    .union([RATIOS, inlineTable(TABLE_LIMITS, ['1.06', '1', '0.98']), fileTable(TABLE_LIMITS, files)], {
      error: () => '{re450, re650}, {wavelength_nm: […], value: […]} or {file: x.csv}',
    })
    .meta({ description: 'How retardance goes with wavelength; absent: flat.' })
}

/** The four kinds of layer. */
export function layerSchema(files: TableFiles, index: ReturnType<typeof indexSchema>) {
  const fields = filmFields(files, index)
  const head = { id: idSchema, film }
  const kinds = [
    z.strictObject({ ...head, kind: z.literal('isotropic'), ...fields.isotropic }).meta({ title: 'Isotropic layer' }),
    z
      .strictObject({
        ...head,
        kind: z.literal('retarder'),
        slow_axis: angle('Azimuth of the slow axis, counter-clockwise as the viewer sees it.'),
        ...fields.retarder,
      })
      .meta({ title: 'Retardation film', not: requires('nz', 'rth') }),
    z
      .strictObject({
        ...head,
        kind: z.literal('polarizer'),
        absorption_axis: angle('Azimuth of the absorption axis, counter-clockwise as the viewer sees it.'),
        ...fields.polarizer,
      })
      .meta({ title: 'Polarizer' }),
    z
      .strictObject({
        ...head,
        kind: z.literal('crystal'),
        azimuth: angle('Azimuth of the first axis, counter-clockwise as the viewer sees it.'),
        ...fields.crystal,
      })
      .meta({ title: 'Crystal' }),
  ] as const
  return z
    .discriminatedUnion('kind', kinds, { error: () => LAYER_KINDS.join(', ') })
    .transform((layer, context): Layer => finish(layer, context))
}

const LAYER_KINDS = ['isotropic', 'retarder', 'polarizer', 'crystal'] as const

type WithoutCoherent<L> = L extends Layer ? Omit<L, 'coherent'> & { readonly coherent?: boolean } : never

/** Defaults that depend on other fields. */
function finish(layer: WithoutCoherent<Layer>, context: Parameters<typeof report>[0]): Layer {
  const whole = { ...layer, coherent: layer.coherent ?? layer.thickness < THICK_FROM_NM }
  if (whole.kind !== 'retarder') return whole
  const fault = retardanceFault(whole)
  if (fault !== undefined) {
    report(context, fault, ['retardance'])
    return whole
  }
  const film = withScalarRetardance(whole)
  return film.nz === undefined && film.rth === undefined ? { ...film, nz: 1 } : film
}
