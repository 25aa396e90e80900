import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { basename } from 'node:path'
import { version } from '../../../package.json'
import { escaped } from '../../report/html/markup.js'
import { reviewHtml } from '../../report/html/reviewHtml.js'
import { jsonText } from '../../report/jsonText.js'
import { limitsText } from '../../report/limitsText.js'
import type { ReportOrigin } from '../../report/reportOrigin.js'
import { type ReviewSheets, reviewSheets } from '../../report/reviewSheets.js'
import type { Sheet } from '../../report/sheet.js'
import { spectraCsv } from '../../report/spectraCsv.js'
import { type Review, review } from '../../studies/review.js'
import type { ReviewPart } from '../../studies/reviewParts.js'
import type { Context } from '../context.js'
import { drawChart } from '../drawChart.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { BROWSER_VARIABLE, findBrowser } from '../findBrowser.js'
import { loadStack } from '../loadStack.js'
import { printPdf } from '../printPdf.js'
import { runStudy } from '../runStudy.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'
import { checkFolder } from '../writeWhole.js'

interface ReportOptions {
  readonly sections: readonly ReviewPart[]
  readonly seed: number
}

/** Live charts of the page; the build puts it beside the program. */
const SCRIPT_FILE = new URL('./review-charts.js', import.meta.url)

export async function run(context: Context<ReportOptions>): Promise<ExitCode> {
  const { file, terminal } = context
  const options = { ...context.options, out: context.options.out ?? '.' }
  const { stack, text } = await loadStack(context)
  await checkFolder(options.out)
  const settings = { parts: new Set(options.sections), seed: options.seed }
  const found = await runStudy(context, 'report', (hooks, map) => review(stack, settings, hooks, map))
  const origin: ReportOrigin = {
    file: basename(file),
    sha256: createHash('sha256').update(text).digest('hex'),
    sets: options.set,
    version,
    date: new Date().toISOString().slice(0, 10),
  }
  const json = jsonText({ origin, ...found })
  const { limits } = found.designs[found.designs.length - 1].evaluation
  terminal.print(options.json ? json : `${limitsText(limits, terminal.paint)}\n`)
  const stem = stemOf(file)
  await writeResults({ ...context, options }, async () => {
    const page = await pageOf(found, origin)
    return new Map<string, string | Uint8Array>([
      [`${stem}.report.html`, page],
      ...(await pdfFiles(context, stem, page, origin)),
      [`${stem}.report.json`, json],
      ...found.designs.map(
        ({ name, evaluation }) => [`${stem}.report-spectra-${name}.csv`, spectraCsv(evaluation)] as const,
      ),
    ])
  })
  if (found.interrupted) return EXIT.interrupted
  return limits.every(({ met }) => met) ? EXIT.done : EXIT.limitMissed
}

async function pageOf(found: Review, origin: ReportOrigin): Promise<string> {
  const sheets = reviewSheets(found)
  const script = readFileSync(SCRIPT_FILE, 'utf8')
  const scriptSha256 = createHash('sha256').update(script).digest('base64')
  return reviewHtml(found, origin, { sheets, pictures: await picturesOf(sheets), script, scriptSha256 })
}

async function picturesOf(sheets: ReviewSheets): Promise<Map<string, string>> {
  const pictures = new Map<string, string>()
  const groups: readonly (readonly Sheet[])[] = Object.values(sheets)
  for (const { name, chart, width, height } of groups.flat()) {
    const svg = await drawChart(chart, { width, height, format: 'svg' })
    pictures.set(name, svg.toString('utf8'))
  }
  return pictures
}

/** The page on paper; where no browser can print it, that is said, and the page itself can be printed from any. */
async function pdfFiles({ terminal }: Context, stem: string, page: string, origin: ReportOrigin) {
  const browser = findBrowser()
  if (browser === undefined) {
    terminal.note(NO_BROWSER)
    return []
  }
  const footer = escaped(`${origin.file} · offblack ${origin.version} · ${origin.date}`)
  return [[`${stem}.report.pdf`, await printPdf(page, browser, footer)] as const]
}

const NO_BROWSER = `no PDF: it takes Chromium, Chrome or Edge to print one, and none was found
  next      install one (Debian: apt-get install chromium), or name yours in ${BROWSER_VARIABLE};
            the HTML report is complete, and any browser prints it
`
