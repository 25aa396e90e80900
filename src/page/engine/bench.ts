/** One open stack file and what is asked of it. Keeps what does not change from one turn of a film to the next. */
import { Scene } from '../../appearance/scene.js'
import type { WorkerPool } from '../../pool/workerPool.js'
import { problemText } from '../../report/problemText.js'
import { compileParameters, parameterPaths } from '../../stack/parameters.js'
import { readStack } from '../../stack/readStack.js'
import { recordedFiles, type StackBundle } from '../../stack/recordedFiles.js'
import type { Direction, Stack } from '../../stack/stack.js'
import { applyToText } from '../../stack/writeStack.js'
import { type Budget, budget } from '../../studies/budget.js'
import { coneRow } from '../../studies/cone.js'
import { degrees, evaluate } from '../../studies/evaluate.js'
import type { Hooks } from '../../studies/hooks.js'
import { itinerary } from '../../studies/itinerary.js'
import { offStateSwatches } from '../../studies/offStateSwatches.js'
import { type Optimum, optimize } from '../../studies/optimize.js'
import { coneGrid } from './coneGrid.js'
import type { Opening, PlainCone, Values, View } from './messages.js'

/** Wavelength of the itinerary between the sheets, nm. */
const ITINERARY_NM = 550
/** The same seed as the command's default, so that the page and the command find the same designs. */
const SEED = 1

export class Bench {
  private constructor(
    readonly opening: Opening,
    private readonly file: { readonly text: string; readonly stack: Stack; readonly scene: Scene } | undefined,
    private readonly pool: WorkerPool,
  ) {}

  private paths: readonly string[] = []
  private withValues: ((values: ArrayLike<number>) => Stack) | undefined

  static async open(bundle: StackBundle, pool: WorkerPool): Promise<Bench> {
    const reading = await readStack(bundle.text, { file: bundle.file, files: recordedFiles(bundle) })
    if (!reading.ok)
      return new Bench({ ok: false, problems: problemText(reading.problems, reading.texts) }, undefined, pool)
    const { stack, warnings, texts } = reading
    const told = warnings.length > 0 ? problemText(warnings, texts) : ''
    const opening = { ok: true, stack, parameters: parameterPaths(stack), warnings: told } as const
    return new Bench(opening, { text: bundle.text, stack, scene: new Scene(stack) }, pool)
  }

  view(values: Values, direction: Direction): Omit<View, 'computeMs'> {
    const stack = this.stackAt(values)
    return {
      evaluation: evaluate(stack, this.opened.scene),
      swatches: offStateSwatches(stack, direction, this.opened.scene),
      itinerary: itinerary(stack, { wavelengthsNm: [ITINERARY_NM], ...direction }),
    }
  }

  async cone(values: Values): Promise<PlainCone> {
    // The cone shows no contrast, which costs a second look from the axis.
    const stack = { ...this.stackAt(values), ambient: [] }
    const { thetas, phis } = coneGrid()
    // By reciprocity the reflectance repeats after half a turn.
    const half = phis.slice(0, phis.length / 2)
    const rows = (await this.pool.map(coneRow, { stack, phis: half }, thetas)).filter((row) => row !== undefined)
    return {
      theta_deg: thetas.map(degrees),
      phi_deg: phis.map(degrees),
      luminous_reflectance: rows.map(({ luminous }) => [...luminous, ...luminous]),
      lab: rows.map(({ lab }) => [...lab, ...lab]),
    }
  }

  budget(values: Values, direction: Direction): Budget {
    return budget(this.stackAt(values), direction)
  }

  optimize(values: Values, hooks: Hooks): Promise<Optimum> {
    return optimize(this.stackAt(values), { seed: SEED }, hooks, this.pool.map)
  }

  write(values: Values): string {
    const { text, stack } = this.opened
    return applyToText(text, stack, values)
  }

  private get opened() {
    if (this.file === undefined) throw new Error('no stack file is open')
    return this.file
  }

  private stackAt(values: Values): Stack {
    const paths = Object.keys(values)
    if (this.withValues === undefined || paths.join() !== this.paths.join()) {
      this.paths = paths
      this.withValues = compileParameters(this.opened.stack, paths)
    }
    return this.withValues(paths.map((path) => values[path]))
  }
}
