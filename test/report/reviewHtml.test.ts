import { beforeAll, describe, expect, test } from 'vitest'
import { drawChart } from '../../src/cli/drawChart.js'
import { reviewHtml } from '../../src/report/html/reviewHtml.js'
import { reviewSheets } from '../../src/report/reviewSheets.js'
import type { Sheet } from '../../src/report/sheet.js'
import type { Review } from '../../src/studies/review.js'
import { writtenTexts } from '../charts/writtenTexts.js'
import { REVIEWED_STACK, reviewOf } from './reviewedStack.js'

const ORIGIN = {
  file: 'small.stack.yaml',
  sha256: 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855',
  sets: [],
  version: '0.0.0',
  date: '2026-01-31',
}

function pageOf(review: Review): string {
  const sheets = reviewSheets(review)
  return reviewHtml(review, ORIGIN, { sheets, pictures: new Map(), script: '', scriptSha256: 'none' })
}

let whole: Review
let page: string
beforeAll(async () => {
  whole = await reviewOf(REVIEWED_STACK)
  page = pageOf(whole)
})

/** Every number anywhere in a datum. */
function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value]
  if (typeof value !== 'object' || value === null) return []
  return Object.values(value).flatMap(numbersIn)
}

const DATA = /<data value="([^"]+)">([^<]+)<\/data>/g

describe('numbers', () => {
  test('every figure of the page is in the JSON with all its digits', () => {
    const known = new Set(numbersIn(JSON.parse(JSON.stringify(whole))))
    const figures = [...page.matchAll(DATA)].map(([, value]) => Number(value))
    expect(figures.length).toBeGreaterThan(100)
    expect(figures.filter((value) => !known.has(value))).toEqual([])
  })

  test('what is shown is that figure, as it is, in percent, or as whole', () => {
    for (const [, value, shown] of page.matchAll(DATA)) {
      const number = Number.parseFloat(shown.replace('−', '-'))
      const decimals = /\.(\d+)/.exec(shown)?.[1].length ?? 0
      const off = [1, 100].map((factor) => Math.abs(factor * Number(value) - number))
      expect(Math.min(...off), `${shown} for ${value}`).toBeLessThanOrEqual(0.5000001 * 10 ** -decimals)
    }
  })

  test('a column of numbers holds no number that is not such a figure', () => {
    const cells = [...page.matchAll(/<td class="number">(.*?)<\/td>/g)].map(([, cell]) => cell)
    expect(cells.length).toBeGreaterThan(100)
    const bare = cells.map((cell) => cell.replace(DATA, '').replace(/<[^>]*>/g, ''))
    expect(bare.filter((text) => /\d/.test(text))).toEqual([])
  })
})

describe('sections', () => {
  test('all parts are there in the order of a review', () => {
    const titles = [...page.matchAll(/<h2><span>(\d+)<\/span> ([^<]+)<\/h2>/g)].map(([, , title]) => title)
    expect(titles).toEqual([
      'What is asked',
      'The laminate',
      'Figures and limits',
      'Before and after the search',
      'Reflectance spectrum',
      'The off-state, seen',
      'Viewing cone',
      'Light budget',
      'Itinerary of the light',
      'Production',
      'What this rests on',
    ])
  })

  test('the origin, the cautions and the limits of the model are said', () => {
    for (const words of [ORIGIN.sha256, ORIGIN.date, 'offblack 0.0.0', 'confirm it on samples', 'pixel pitch'])
      expect(page).toContain(words)
  })

  test('compared cones share one scale', async () => {
    const [before, after] = reviewSheets(whole).cone.filter(({ name }) => name.includes('luminous'))
    expect([before.name, after.name]).toEqual(['cone-luminous-reflectance-before', 'cone-luminous-reflectance-after'])
    expect(await scaleNumbers(before)).toEqual(await scaleNumbers(after))
  })
})

/** What is written beside the color bar, at the right of the sheet. */
async function scaleNumbers({ chart, width, height }: Sheet): Promise<string[]> {
  const texts = await writtenTexts(() => drawChart(chart, { width, height, scale: 1, format: 'png' }), 1)
  const numbers = texts.filter(({ text, left }) => left > 0.75 * width && /^[\d.]+$/.test(text))
  expect(numbers.length).toBeGreaterThan(3)
  return numbers.map(({ text }) => text)
}

describe('foreign text', () => {
  const HOSTILE = '</script><script>alert(1)</script> "&\u202e <img src=x onerror=alert(2)>'

  test('cannot become markup anywhere', async () => {
    const text = REVIEWED_STACK.replace('title: Invented small stack', `title: ${JSON.stringify(HOSTILE)}`)
    const hostile = pageOf(await reviewOf(text.slice(0, text.indexOf('optimize:'))))
    expect(hostile).not.toContain('<script>alert')
    expect(hostile).not.toContain('<img src=x')
    expect(hostile).not.toContain('\u202e <')
    expect(hostile).toContain('&lt;/script&gt;&lt;script&gt;alert(1)')
    // The page's own two: its data and its script.
    expect(hostile.match(/<script/g)).toHaveLength(2)
    expect(hostile.match(/<\/script>/g)).toHaveLength(2)
  })

  test('the page names no address to fetch from, and its policy allows none', () => {
    expect(page).toContain(`default-src 'none'`)
    expect(page).not.toMatch(/(src|href|action)="(?!data:|#)/)
  })
})
