import type { Review } from '../../studies/review.js'
import type { ReportOrigin } from '../reportOrigin.js'
import type { ReviewSheets } from '../reviewSheets.js'
import type { Sheet } from '../sheet.js'
import { chartFigure, DATA_ID } from './chartFigure.js'
import { laminateSvg } from './laminateSvg.js'
import { type Content, html, Markup } from './markup.js'
import { pageData } from './pageData.js'
import { basisSection } from './sections/basis.js'
import { budgetSection } from './sections/budget.js'
import { candidatesSection } from './sections/candidates.js'
import { coneSection } from './sections/cone.js'
import { figuresSection } from './sections/figures.js'
import { itinerarySection } from './sections/itinerary.js'
import { questionSection } from './sections/question.js'
import { searchSection } from './sections/search.js'
import { swatchesSection } from './sections/swatches.js'
import { toleranceSection } from './sections/tolerance.js'
import { STYLE } from './style.js'
import { verdict } from './verdict.js'

export interface PageParts {
  readonly sheets: ReviewSheets
  /** Vector picture of each sheet, by its name. */
  readonly pictures: ReadonlyMap<string, string>
  /** The script that puts live charts over the pictures, and its SHA-256 in base64: no other may run in the page. */
  readonly script: string
  readonly scriptSha256: string
}

/** A design review as one page that needs nothing but itself. */
export function reviewHtml(review: Review, origin: ReportOrigin, parts: PageParts): string {
  const sections = sectionsOf(review, parts)
  const page = html`<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="default-src 'none'; img-src data:; style-src 'unsafe-inline'; script-src 'sha256-${parts.scriptSha256}'">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="generator" content="offblack ${origin.version}">
<title>${review.title}: design review</title>
<style>${new Markup(STYLE)}</style>
</head>
<body>
<header><p>Design review, ${origin.date}</p>
<h1>${review.title}</h1>
${verdict(review)}
</header>
<main>
${sections.map(sectionHtml)}
</main>
<footer>${originText(origin)}</footer>
<script type="application/json" id="${DATA_ID}">${pageData(review)}</script>
<script>${new Markup(parts.script)}</script>
</body>
</html>
`
  return page.text
}

function sectionHtml({ title, blocks: [first, ...others] }: Section, k: number): Markup {
  return html`<section><div class="keep"><h2><span>${k + 1}</span> ${title}</h2>
${first}</div>
${others}</section>
`
}

interface Section {
  readonly title: string
  /** The first stays with the title when the page is printed. */
  readonly blocks: readonly Content[]
}

/** Those with something to tell, in the order of a review. */
function sectionsOf(review: Review, { sheets, pictures }: PageParts): Section[] {
  const { designs, tolerance, comparison } = review
  const [first, last] = [designs[0], designs[designs.length - 1]]
  const row = (group: readonly Sheet[], look = '') =>
    html`<div class="charts ${look}">${group.map((sheet) => chartFigure(sheet, pictures.get(sheet.name) ?? ''))}</div>\n`
  const each = (group: readonly Sheet[], look = '') => group.map((sheet) => row([sheet], look))
  const pairs = (group: readonly Sheet[]) => pairsOf(group).map((pair) => row(pair, 'pairs'))
  const about = designs.length > 1 && html`<p>Of the design after the search.</p>`
  const sections: Section[] = [
    { title: 'What is asked', blocks: [questionSection(review)] },
    { title: 'The laminate', blocks: [laminateSvg(last.laminate, first === last ? undefined : first.laminate)] },
    { title: 'Figures and limits', blocks: figuresSection(review) },
    { title: 'Before and after the search', blocks: [...each(sheets.search), ...searchSection(review)] },
    { title: 'Reflectance spectrum', blocks: each(sheets.spectra) },
    { title: 'The off-state, seen', blocks: [swatchesSection(review), ...each(sheets.color, 'single')] },
    { title: 'Viewing cone', blocks: [...pairs(sheets.cone), ...coneSection(review)] },
    { title: 'Light budget', blocks: [...withFirst(about, each(sheets.budget)), ...budgetSection(review)] },
    {
      title: 'Itinerary of the light',
      blocks: [
        ...withFirst([about, FIRST_WAY], each(sheets.ellipses)),
        ...pairs(sheets.spheres),
        ...itinerarySection(review),
      ],
    },
    {
      title: 'Production',
      blocks: tolerance
        ? [
            ...withFirst(about, each(sheets.spread)),
            ...each(sheets.sensitivity),
            ...toleranceSection(last.stack, tolerance),
          ]
        : [],
    },
    {
      title: 'Films compared',
      blocks: comparison ? [...each(sheets.compare), ...candidatesSection(first.stack, comparison)] : [],
    },
    { title: 'What this rests on', blocks: basisSection(review) },
  ]
  return sections.filter(({ blocks }) => blocks.length > 0)
}

/** A text that stays with the first block; alone it is none. */
function withFirst(text: Content, blocks: readonly Content[]): Content[] {
  return blocks.map((block, k) => (k === 0 ? [text, block] : block))
}

function pairsOf<Item>(items: readonly Item[]): Item[][] {
  return items.flatMap((_, k) => (k % 2 === 0 ? [items.slice(k, k + 2)] : []))
}

const FIRST_WAY = html`<p>The first way of unpolarized light from the room to the panel and back; reflections that join it later are left out.</p>`

function originText({ file, sha256, sets, version, date }: ReportOrigin): Markup {
  return html`<p>From <b>${file}</b>, SHA-256 <code>${sha256}</code>${sets.length > 0 && `, with ${sets.map((set) => `--set ${set}`).join(' ')}`}. offblack ${version}, ${date}. Every figure stands with all its digits in the JSON beside this report.</p>`
}
