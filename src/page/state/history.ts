import type { Values } from '../engine/messages.js'

export interface History {
  readonly past: readonly Values[]
  readonly present: Values
  readonly future: readonly Values[]
  /** Of the last step: while it goes on, it is one step. */
  readonly gesture?: string
}

export type Step =
  | { readonly kind: 'set'; readonly values: Values; readonly gesture?: string }
  | { readonly kind: 'undo' }
  | { readonly kind: 'redo' }
  | { readonly kind: 'restart'; readonly values: Values }

export const UNTOUCHED: History = { past: [], present: {}, future: [] }
const MOST_STEPS = 500

export function stepHistory(history: History, step: Step): History {
  const { past, present, future } = history
  switch (step.kind) {
    case 'restart':
      return { ...UNTOUCHED, present: step.values }
    case 'undo':
      return past.length === 0
        ? history
        : { past: past.slice(0, -1), present: past[past.length - 1], future: [present, ...future] }
    case 'redo':
      return future.length === 0 ? history : { past: [...past, present], present: future[0], future: future.slice(1) }
    case 'set': {
      const goesOn = step.gesture !== undefined && step.gesture === history.gesture
      return {
        past: goesOn ? past : [...past, present].slice(-MOST_STEPS),
        present: step.values,
        future: [],
        gesture: step.gesture,
      }
    }
  }
}
