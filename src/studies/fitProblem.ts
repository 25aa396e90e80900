/** A measured sample beside the stack that should explain it, as a least-squares problem. */
import { createSpectrumExperiment } from '../appearance/spectrumExperiment.js'
import type { ResidualProblem } from '../search/residualProblem.js'
import type { MeasuredSpectrum } from '../stack/readMeasured.js'
import type { FitQuestion, Stack } from '../stack/stack.js'
import { designVariables } from './designProblem.js'

/** Measured spectra; fractions, rad. */
export interface Measured {
  readonly directions: readonly MeasuredSpectrum[]
}

/** Measured less model over the noise, where that is stated. */
export function fitProblem(stack: Stack, measured: Measured, question: FitQuestion): ResidualProblem {
  const paths = Object.keys(question.vary)
  const experiment = createSpectrumExperiment(stack, paths, measured.directions)
  const target = measured.directions.flatMap(({ reflectance }) => [...reflectance])
  const scale = 1 / (question.noise ?? 1)
  return {
    variables: designVariables(stack, question),
    count: experiment.count,
    noiseIsKnown: question.noise !== undefined,
    residuals: (x, out) => {
      experiment.reflectance(x, out)
      for (let i = 0; i < out.length; i++) out[i] = (out[i] - target[i]) * scale
    },
    jacobian: (x, out) => {
      experiment.jacobian(x, out)
      for (let i = 0; i < out.length; i++) out[i] *= scale
    },
  }
}
