/** What the page and its engine (a worker) say to each other: plain data. */
import type { ParameterInfo } from '../../stack/parameters.js'
import type { StackBundle } from '../../stack/recordedFiles.js'
import type { Direction, Stack } from '../../stack/stack.js'
import type { Budget } from '../../studies/budget.js'
import type { Cone } from '../../studies/cone.js'
import type { Evaluation } from '../../studies/evaluate.js'
import type { Itinerary } from '../../studies/itinerary.js'
import type { OffStateSwatch } from '../../studies/offStateSwatches.js'
import type { Optimum } from '../../studies/optimize.js'

/** Parameters that differ from the file, by path; nm, rad, fractions. */
export type Values = Readonly<Record<string, number>>

export type Opening =
  | {
      readonly ok: true
      readonly stack: Stack
      readonly parameters: readonly ParameterInfo[]
      readonly warnings: string
    }
  | { readonly ok: false; readonly problems: string }

/** What follows the hand at once. */
export interface View {
  readonly evaluation: Evaluation
  readonly itinerary: Itinerary
  readonly swatches: readonly OffStateSwatch[]
  /** Of the engine's own work, ms. */
  readonly computeMs: number
}

/** The part of a cone that is drawn. */
export type PlainCone = Pick<Cone, 'theta_deg' | 'phi_deg' | 'luminous_reflectance' | 'lab'>

/** With the time it took, ms. */
export interface TimedCone extends PlainCone {
  readonly computeMs: number
}

export interface Requests {
  open: { readonly ask: StackBundle; readonly answer: Opening }
  view: { readonly ask: { readonly values: Values; readonly direction: Direction }; readonly answer: View }
  cone: { readonly ask: { readonly values: Values }; readonly answer: TimedCone }
  budget: { readonly ask: { readonly values: Values; readonly direction: Direction }; readonly answer: Budget }
  optimize: { readonly ask: { readonly values: Values }; readonly answer: Optimum }
  /** Ends the search under way; what it has found is its answer. */
  stop: { readonly ask: null; readonly answer: null }
  /** The stack file's text with the values in it. */
  write: { readonly ask: { readonly values: Values }; readonly answer: string }
}

export type Kind = keyof Requests

export interface ToEngine<K extends Kind = Kind> {
  readonly call: number
  readonly kind: K
  readonly ask: Requests[K]['ask']
}

export type FromEngine =
  | { readonly call: number; readonly kind: 'answer'; readonly answer: unknown }
  | { readonly call: number; readonly kind: 'failed'; readonly message: string }
  | { readonly call: number; readonly kind: 'progress'; readonly done: number; readonly note: string }
