/** Parameter paths such as `half.slow_axis` or `panel.reflectance`: listed, read and set on a checked stack. */
import type { QuantityKind } from '../units/quantity.js'
import { emissionFields, type Field, layerFields, type Owner, panelFields } from './fields.js'
import type { Emission, Layer, Panel, Stack } from './stack.js'

export interface ParameterInfo {
  readonly path: string
  readonly kind: QuantityKind
  /** nm, rad, fractions. */
  readonly value: number
  readonly period?: number
  /** What is physically possible. */
  readonly range: readonly [number, number]
  /** Where a hand on a knob would look. */
  readonly usual: readonly [number, number]
}

/** Every numeric parameter of the stack, layers from the top down, then panel and emission. */
export function parameterPaths(stack: Stack): ParameterInfo[] {
  const owners: [string, Owner, readonly Field[]][] = [
    ...stack.layers.map((layer): [string, Owner, readonly Field[]] => [layer.id, asOwner(layer), layerFields(layer)]),
    ['panel', asOwner(stack.panel), panelFields(stack.panel)],
    ['emission', asOwner(stack.emission), emissionFields(stack.emission)],
  ]
  return owners.flatMap(([id, owner, fields]) =>
    fields.map(({ path, kind, period, range, usual, get }) => {
      const value = get(owner)
      return { path: `${id}.${path}`, kind, range, usual: usual(value), value, ...(period !== undefined && { period }) }
    }),
  )
}

export function findParameter(stack: Stack, path: string): ParameterInfo | undefined {
  return parameterPaths(stack).find((parameter) => parameter.path === path)
}

/** Present value; throws where the path is not a parameter of the stack. */
export function getParameter(stack: Stack, path: string): number {
  const { owner, field } = resolve(stack, path)
  return field.get(owner)
}

/** Copy of the stack with the values set (nm, rad, fractions); what does not change is shared. */
export function setParameters(stack: Stack, values: Readonly<Record<string, number>>): Stack {
  const paths = Object.keys(values)
  return compileParameters(stack, paths)(paths.map((path) => values[path]))
}

/**
 * The stack as a function of the values of some paths, for being called often. A layer whose values are those of the call
 * before is the very same object again.
 */
export function compileParameters(stack: Stack, paths: readonly string[]): (values: ArrayLike<number>) => Stack {
  const groups = groupByOwner(stack, paths)
  let before: Stack = stack
  return (values) => {
    let layers: Layer[] | undefined
    let panel: Panel = before.panel
    let emission: Emission = before.emission
    for (const group of groups) {
      if (!group.update(values)) continue
      if (group.place === 'panel') panel = group.owner as unknown as Panel
      else if (group.place === 'emission') emission = group.owner as unknown as Emission
      else {
        layers ??= before.layers.slice()
        layers[group.place] = group.owner as unknown as Layer
      }
    }
    before = { ...before, panel, emission, layers: layers ?? before.layers }
    return before
  }
}

/** One parameter as a setter on stacks of the same structure as `stack`; everything else is shared with the stack given. */
export function compileSetter(stack: Stack, path: string): (base: Stack, value: number) => Stack {
  const { field, place } = resolve(stack, path)
  if (place === 'panel') {
    return (base, value) => ({ ...base, panel: field.set(asOwner(base.panel), value) as unknown as Panel })
  }
  if (place === 'emission') {
    return (base, value) => ({ ...base, emission: field.set(asOwner(base.emission), value) as unknown as Emission })
  }
  return (base, value) => {
    const layers = base.layers.slice()
    layers[place] = field.set(asOwner(layers[place]), value) as unknown as Layer
    return { ...base, layers }
  }
}

type Place = number | 'panel' | 'emission'

/** The parameters that sit in one layer (or the panel), with the values and the object of the last call. */
class OwnerGroup {
  owner: Owner
  private readonly members: { readonly index: number; readonly field: Field }[] = []
  private readonly last: number[] = []

  constructor(
    readonly place: Place,
    private readonly original: Owner,
  ) {
    this.owner = original
  }

  add(index: number, field: Field): void {
    this.members.push({ index, field })
    this.last.push(Number.NaN)
  }

  /** Makes the owner for these values; false where it is the one of the call before. */
  update(values: ArrayLike<number>): boolean {
    let changed = false
    for (let k = 0; k < this.members.length; k++) {
      const value = values[this.members[k].index]
      if (value === this.last[k]) continue
      this.last[k] = value
      changed = true
    }
    if (!changed) return false
    this.owner = this.members.reduce((owner, { field }, k) => field.set(owner, this.last[k]), this.original)
    return true
  }
}

function groupByOwner(stack: Stack, paths: readonly string[]): OwnerGroup[] {
  const groups = new Map<Place, OwnerGroup>()
  paths.forEach((path, index) => {
    const { owner, field, place } = resolve(stack, path)
    let group = groups.get(place)
    if (group === undefined) {
      group = new OwnerGroup(place, owner)
      groups.set(place, group)
    }
    group.add(index, field)
  })
  return [...groups.values()]
}

function resolve(stack: Stack, path: string): { owner: Owner; field: Field; place: Place } {
  const dot = path.indexOf('.')
  const id = path.slice(0, dot)
  const rest = path.slice(dot + 1)
  const found = ownerOf(stack, id)
  const field = found?.fields.find((candidate) => candidate.path === rest)
  if (found === undefined || field === undefined) throw new Error(`not a parameter of this stack: ${path}`)
  return { owner: found.owner, place: found.place, field }
}

function ownerOf(stack: Stack, id: string): { owner: Owner; place: Place; fields: readonly Field[] } | undefined {
  if (id === 'panel') return { owner: asOwner(stack.panel), place: 'panel', fields: panelFields(stack.panel) }
  if (id === 'emission') {
    return { owner: asOwner(stack.emission), place: 'emission', fields: emissionFields(stack.emission) }
  }
  const place = stack.layers.findIndex((layer) => layer.id === id)
  if (place < 0) return undefined
  return { owner: asOwner(stack.layers[place]), place, fields: layerFields(stack.layers[place]) }
}

function asOwner(part: Layer | Panel | Emission): Owner {
  return part as unknown as Owner
}
