/** One choice of film cards in the slots of a stack. */
import type { FilmCard, Layer, OptimizeQuestion, Range, Stack } from '../stack/stack.js'

/** Index of the card chosen for each slot, in the order of the stack's compare.slots. */
export type Choice = readonly number[]

export interface Slots {
  readonly ids: readonly string[]
  readonly cards: readonly (readonly FilmCard[])[]
}

export function slotsOf(stack: Stack): Slots {
  const slots = stack.compare?.slots ?? {}
  return { ids: Object.keys(slots), cards: Object.values(slots) }
}

/** Every combination, the last slot running fastest. */
export function allChoices({ cards }: Slots): Choice[] {
  return cards.reduce<Choice[]>(
    (choices, slot) => choices.flatMap((choice) => slot.map((_, k) => [...choice, k])),
    [[]],
  )
}

export function cardsOf({ cards }: Slots, choice: Choice): FilmCard[] {
  return choice.map((k, slot) => cards[slot][k])
}

/** The stack with the cards' films in the slots; each keeps the slot's id and angle. */
export function stackOf(stack: Stack, slots: Slots, choice: Choice): Stack {
  const chosen = new Map(slots.ids.map((id, slot) => [id, slots.cards[slot][choice[slot]]]))
  return {
    ...stack,
    layers: stack.layers.map((layer) => {
      const card = chosen.get(layer.id)
      return card === undefined ? layer : filled(layer, card.layer)
    }),
  }
}

function filled(slot: Layer, film: Layer): Layer {
  const placed = { ...film, id: slot.id }
  if (placed.kind === 'retarder' && slot.kind === 'retarder') return { ...placed, slow_axis: slot.slow_axis }
  if (placed.kind === 'polarizer' && slot.kind === 'polarizer')
    return { ...placed, absorption_axis: slot.absorption_axis }
  if (placed.kind === 'crystal' && slot.kind === 'crystal') return { ...placed, azimuth: slot.azimuth }
  return placed
}

const AXES = ['slow_axis', 'absorption_axis', 'azimuth']

/**
 * What may vary once a film is chosen: everything the file's question varies, but of a slot's film only its angle; the rest
 * is the film's own. Undefined where nothing is left to vary.
 */
export function questionWithin(question: OptimizeQuestion, slots: Slots): OptimizeQuestion | undefined {
  const vary: Record<string, Range> = {}
  for (const [path, range] of Object.entries(question.vary)) {
    const [id, ...field] = path.split('.')
    if (!slots.ids.includes(id) || AXES.includes(field.join('.'))) vary[path] = range
  }
  return Object.keys(vary).length > 0 ? { ...question, vary } : undefined
}
