import { readStack } from '../../src/stack/readStack.js'
import { NO_FILES } from '../../src/stack/stackFiles.js'
import { type Review, review } from '../../src/studies/review.js'
import { REVIEW_PARTS } from '../../src/studies/reviewParts.js'
import { SMALL_STACK } from '../cli/smallStack.js'

/** The small stack with a direction more and tolerances, so that every part of a review but `compare` has something to tell. */
export const REVIEWED_STACK = `${SMALL_STACK.replace('directions: [', 'directions: [{theta: 45 deg, phi: 30 deg}, ')}tolerance:
  samples: 64
  seed: 1
  vary:
    quarter.slow_axis: {normal: 1 deg}
    quarter.retardance: {uniform: 3 nm}
`

/** Of a stack file's text, every part. */
export async function reviewOf(text: string): Promise<Review> {
  const reading = await readStack(text, { file: 'small.stack.yaml', files: NO_FILES, sets: [] })
  if (!reading.ok) throw new Error(reading.problems.map(({ message }) => message).join('; '))
  return review(reading.stack, { parts: new Set(REVIEW_PARTS), seed: 1 })
}
