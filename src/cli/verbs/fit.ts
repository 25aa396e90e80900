import { csvText } from '../../report/csvText.js'
import { fitSheet } from '../../report/fitSheet.js'
import { fitText } from '../../report/fitText.js'
import { jsonText } from '../../report/jsonText.js'
import { plural } from '../../report/wording.js'
import { type MeasuredSpectrum, readMeasured } from '../../stack/readMeasured.js'
import type { Stack } from '../../stack/stack.js'
import { type Fit, fit } from '../../studies/fit.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack, requireQuestion } from '../loadStack.js'
import { readText } from '../readText.js'
import { runStudy } from '../runStudy.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'
import { checkFolder } from '../writeWhole.js'

interface FitOptions {
  readonly measured: string
  readonly seed: number
}

export async function run(context: Context<FitOptions>): Promise<ExitCode> {
  const { file, options, terminal } = context
  const { stack } = await loadStack(context)
  requireQuestion(stack, 'fit', file)
  const directions = readMeasured(readText(options.measured), options.measured)
  const outside = readingsOutside(stack, directions)
  if (outside > 0) terminal.note(`${outsideText(stack, outside)}\n`)
  if (options.out !== undefined) await checkFolder(options.out)
  const found = await runStudy(context, 'fit', (hooks, map) =>
    fit(stack, { directions }, { seed: options.seed }, hooks, map),
  )
  const json = jsonText(found)
  terminal.print(options.json ? json : fitText(stack, found, terminal.paint))
  const stem = stemOf(file)
  await writeResults(context, async () => {
    const charts = await chartFiles(stem, [fitSheet(found)])
    return new Map<string, string | Uint8Array>([
      [`${stem}.fit.json`, json],
      [`${stem}.residuals.csv`, residualsCsv(found)],
      ...charts,
    ])
  })
  return found.interrupted ? EXIT.interrupted : EXIT.done
}

/** How many readings lie beyond the wavelengths for which the file describes its films. */
function readingsOutside({ conditions }: Stack, directions: readonly MeasuredSpectrum[]): number {
  const { from, to } = conditions.wavelengths
  return directions.flatMap(({ wavelengthNm }) => wavelengthNm).filter((nm) => nm < from || nm > to).length
}

function outsideText({ conditions: { wavelengths } }: Stack, count: number): string {
  const band = `${wavelengths.from} to ${wavelengths.to} nm`
  return `note: ${plural(count, 'reading')} outside the file's ${band}; tables of the file hold their last value there`
}

function residualsCsv({ directions }: Fit): string {
  const rows = directions.flatMap(({ theta_deg, phi_deg, wavelength_nm, measured, model }) =>
    wavelength_nm.map((nm, i) => [nm, theta_deg, phi_deg, measured[i], model[i], measured[i] - model[i]]),
  )
  return csvText(['wavelength_nm', 'theta_deg', 'phi_deg', 'measured', 'model', 'residual'], rows)
}
