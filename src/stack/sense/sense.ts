import type { Draft } from '../draft.js'

/** What the sense checks look at: a file as far as the schema could read it, and the plain data behind it. */
export interface Sense {
  readonly draft: Draft
  readonly raw: unknown
}
