import { join } from 'node:path'
import { expect, it } from 'vitest'
import { demoStack, STACKS_FOLDER } from './demoStacks.js'
import { measuredSample } from './measuredSample.js'

/** The quarter-wave film laminated 1.3° off, and a half-wave film from the thin end of the roll. */
const FAULTS = ['quarter.slow_axis=91.3deg', 'half.retardance=267nm']

/** `npx vitest run --config vitest.unit.config.ts -u test/stacks/measuredSample.test.ts` writes the file anew. */
it('the measured sample of the dive computer is the one described here', async () => {
  const sample = measuredSample(await demoStack('dive-computer.stack.yaml', FAULTS))
  await expect(sample).toMatchFileSnapshot(join(STACKS_FOLDER, 'measured/dive-computer-prototype-a.csv'))
})
