import { coneCsv } from '../../report/coneCsv.js'
import { coneSheets } from '../../report/coneSheets.js'
import { coneText } from '../../report/coneText.js'
import { jsonText } from '../../report/jsonText.js'
import { cone } from '../../studies/cone.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack } from '../loadStack.js'
import { runStudy } from '../runStudy.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'
import { checkFolder } from '../writeWhole.js'

interface ConeOptions {
  readonly thetaMax: number
  readonly thetaStep: number
  readonly phiStep: number
  readonly limit?: number
}

export async function run(context: Context<ConeOptions>): Promise<ExitCode> {
  const { options, terminal } = context
  const { stack } = await loadStack(context)
  if (options.out !== undefined) await checkFolder(options.out)
  const found = await runStudy(context, 'cone', (hooks, map) => cone(stack, options, hooks, map))
  terminal.print(options.json ? jsonText(found) : coneText(found, terminal.paint))
  const stem = stemOf(context.file)
  await writeResults(
    context,
    async () =>
      new Map<string, string | Uint8Array>([
        [`${stem}.cone.json`, jsonText(found)],
        [`${stem}.cone.csv`, coneCsv(found)],
        // A single ring is no map.
        ...(await chartFiles(stem, found.theta_deg.length > 1 ? coneSheets([{ name: '', cone: found }]) : [])),
      ]),
  )
  return found.interrupted ? EXIT.interrupted : EXIT.done
}
