import { describe } from 'vitest'
import { solvePoint } from '../oracle/solvePoint.js'
import { kernelPoint } from './kernelPoint.js'
import { publishedCircularPolarizers } from './publishedCircularPolarizers.js'
import { publishedRetarders } from './publishedRetarders.js'
import { publishedSurfaces } from './publishedSurfaces.js'

/** Every published value holds for the slow solver and for the fast one. */
describe.each([
  ['oracle', solvePoint],
  ['kernel', kernelPoint],
] as const)('%s', (_name, solve) => {
  describe('surfaces', () => publishedSurfaces(solve))
  describe('circular polarizers', () => publishedCircularPolarizers(solve))
  describe('retarders', () => publishedRetarders(solve))
})
