import { compareJob } from './compareJob.js'
import { coneRow, diffuseAverage } from './cone.js'
import { fitParameters } from './fit.js'
import { optimizeJob } from './optimize.js'
import type { Task } from './parallel.js'
import { passingDraws } from './scaledYields.js'
import { sensitivityReplicate } from './sensitivity.js'
import { fitSingleFault } from './singleFaults.js'
import { sweepBlock } from './sweep.js'
import { toleranceBlock } from './toleranceBlock.js'

/** Everything a worker can be asked for, by name. */
export const TASKS: ReadonlyMap<string, Task<never, never, unknown>> = new Map(
  [
    compareJob,
    fitParameters,
    fitSingleFault,
    coneRow,
    diffuseAverage,
    optimizeJob,
    sweepBlock,
    toleranceBlock,
    sensitivityReplicate,
    passingDraws,
  ].map((task) => [task.name, task as Task<never, never, unknown>]),
)
