import { itineraryCsv } from '../../report/itineraryCsv.js'
import { itinerarySheets } from '../../report/itinerarySheets.js'
import { itineraryText } from '../../report/itineraryText.js'
import { jsonText } from '../../report/jsonText.js'
import { itinerary, USUAL_WAVELENGTHS_NM } from '../../studies/itinerary.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { type DirectionOptions, directionOf } from '../directionOptions.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack } from '../loadStack.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'

interface ItineraryOptions extends DirectionOptions {
  readonly wavelength?: readonly number[]
}

export async function run(context: Context<ItineraryOptions>): Promise<ExitCode> {
  const { options, terminal } = context
  const { stack } = await loadStack(context)
  const wavelengthsNm = [...new Set(options.wavelength ?? USUAL_WAVELENGTHS_NM)]
  const found = itinerary(stack, { ...directionOf(options, stack), wavelengthsNm })
  terminal.print(options.json ? jsonText(found) : itineraryText(found, terminal.paint))
  const stem = stemOf(context.file)
  await writeResults(
    context,
    async () =>
      new Map<string, string | Uint8Array>([
        [`${stem}.itinerary.json`, jsonText(found)],
        [`${stem}.itinerary.csv`, itineraryCsv(found)],
        ...(await chartFiles(stem, itinerarySheets(found))),
      ]),
  )
  return EXIT.done
}
