import * as z from 'zod'
import type { Fault } from '../fault.js'
import { FIELD_LIMITS } from '../fieldLimits.js'
import { retardanceFault, withScalarRetardance } from '../measuredRetardance.js'
import type { Layer } from '../stack.js'
import type { TableFiles } from '../tableFiles.js'
import { filmFields } from './filmFields.js'
import { quantitySchema, report } from './quantity.js'
import type { indexSchema } from './refractiveIndex.js'
import { requires } from './requires.js'

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

const film = z
  .string()
  .optional()
  .meta({
    description: 'Film card whose fields lie under those given here.',
    examples: ['films/quarter-a.film.yaml'],
  })

const angle = (description: string) => quantitySchema(FIELD_LIMITS.azimuth, description, '45 deg').prefault('0 deg')

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
