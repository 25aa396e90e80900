/**
 * offblack as a library. Everything here is plain data and pure functions: files are passed in as text (`StackFiles`), progress
 * and stop as `Hooks`, and lengths, angles and shares are nm, radians and fractions unless a name says otherwise.
 */
export { findParameter, type ParameterInfo, parameterPaths, setParameters } from './stack/parameters.js'
export { InputError, type Problem } from './stack/problem.js'
export { type Reading, type ReadOptions, readStack } from './stack/readStack.js'
export type * from './stack/stack.js'
export type { StackFiles } from './stack/stackFiles.js'
export { type Cone, type ConeQuestion, cone } from './studies/cone.js'
export { type DirectionEvaluation, type Evaluation, evaluate, type LimitEvaluation } from './studies/evaluate.js'
export type { Hooks } from './studies/hooks.js'
export { type Design, type OptimizeSettings, type Optimum, optimize } from './studies/optimize.js'
export type { ParallelMap, Task } from './studies/parallel.js'
export { type Sweep, type SweepAxis, type SweepLink, type SweepQuestion, sweep } from './studies/sweep.js'
