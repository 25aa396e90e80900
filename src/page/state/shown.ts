import type { PlainCone, Values, View } from '../engine/messages.js'

/** One state of the design with what the engine said of it. */
export interface Shown {
  /** As it is called beside another. */
  readonly name: string
  readonly values: Values
  readonly view: View
  readonly cone?: PlainCone
}
