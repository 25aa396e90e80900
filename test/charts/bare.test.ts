import { describe, expect, it } from 'vitest'
import { budgetBars } from '../../src/charts/budgetBars.js'
import { eyewearRoll } from '../../src/charts/eyewearRoll.js'
import { histogram } from '../../src/charts/histogram.js'
import { offStateColor } from '../../src/charts/offStateColor.js'
import { paretoFront } from '../../src/charts/paretoFront.js'
import { poincare } from '../../src/charts/poincare.js'
import { METRIC_QUANTITIES } from '../../src/charts/quantity.js'
import { reflectanceSpectrum } from '../../src/charts/reflectanceSpectrum.js'
import { residuals } from '../../src/charts/residuals.js'
import { searchProgress } from '../../src/charts/searchProgress.js'
import { sensitivityBars } from '../../src/charts/sensitivityBars.js'
import { sweepLines } from '../../src/charts/sweepLines.js'
import { sweepMap } from '../../src/charts/sweepMap.js'
import { PAPER } from '../../src/charts/theme.js'
import { viewingCone } from '../../src/charts/viewingCone.js'
import { drawChart } from '../../src/cli/drawChart.js'
import * as design from './designSamples.js'
import * as study from './studySamples.js'
import { overlapping, writtenTexts } from './writtenTexts.js'

const { luminous_reflectance: reflectance } = METRIC_QUANTITIES
const longTitle = `${'A stack whose owner told its whole story in the title '.repeat(2)}and beyond`
const nothing = { value: 0, low: 0, high: 0 }

/** The least a study may hand over: nothing optional, one of each, values that do not vary. */
const bare = {
  reflectanceSpectrum: reflectanceSpectrum(
    {
      ...design.reflectanceSpectrumData,
      designs: design.reflectanceSpectrumData.designs.slice(1),
      lightXyz: undefined,
    },
    PAPER,
  ),
  offStateColor: offStateColor({ title: longTitle, points: [{ label: 'θ 0°', after: [0, 0] }] }, PAPER),
  searchProgress: searchProgress(
    { title: longTitle, objective: reflectance, evaluations: [1], best: [0.04], start: 0.04, families: [] },
    PAPER,
  ),
  viewingCone: viewingCone(
    {
      title: longTitle,
      quantity: reflectance,
      field: {
        thetaRad: [0, 0.5],
        phiRad: [0, 3],
        values: [
          [0.05, 0.05],
          [0.05, 0.05],
        ],
      },
      range: { min: 0.06, max: 0.1 },
      worst: 'lowest',
    },
    PAPER,
  ),
  sweepMap: sweepMap(
    { ...study.sweepMapData, values: study.sweepMapData.values.map((row) => row.map(() => 0)), current: undefined },
    PAPER,
  ),
  sweepLines: sweepLines(
    { ...study.sweepLinesData, metrics: study.sweepLinesData.metrics.slice(0, 1), current: undefined },
    PAPER,
  ),
  histogram: histogram(
    { ...study.histogramData, limit: undefined, percentiles: { p05: 0.046, p50: 0.046, p95: 0.046 } },
    PAPER,
  ),
  residuals: residuals({ title: longTitle, directions: study.residualsData.directions.slice(0, 1) }, PAPER),
  paretoFront: paretoFront(
    {
      ...study.paretoFrontData,
      candidates: [{ label: 'the only film', x: 5, y: 0.05, onFront: true, limitsMet: true }],
    },
    PAPER,
  ),
  budgetBars: budgetBars(
    { title: longTitle, metric: reflectance, total: 0, terms: [{ name: 'rest', alone: 0, ifRemoved: 0 }] },
    PAPER,
  ),
  sensitivityBars: sensitivityBars(
    { title: longTitle, parameters: [{ name: 'rest', firstOrder: nothing, total: nothing }] },
    PAPER,
  ),
  poincare: poincare({ title: longTitle, ways: [{ name: 'in', states: [{ label: 'a', stokes: [0, 0, 0] }] }] }, PAPER),
  eyewearRoll: eyewearRoll(
    {
      title: longTitle,
      rollRad: [0, 1],
      brightness: METRIC_QUANTITIES.emission_transmittance,
      screens: [{ name: 'OLED', through: [0, 0], colorShift: [0, 0] }],
    },
    PAPER,
  ),
}

describe('charts of the barest data', () => {
  it.each(Object.entries(bare))('%s is drawn with its title and without overlap', async (_, config) => {
    const [width, height] = [720, 600]
    const texts = await writtenTexts(() => drawChart(config, { width, height, scale: 1, format: 'png' }), 1)
    const words = texts.map(({ text }) => text)
    for (const line of config.options?.plugins?.title?.text ?? ['no title']) expect(words).toContain(line)
    expect(overlapping(texts)).toEqual([])
    for (const { text, left, right } of texts) {
      expect(text).not.toMatch(/NaN|Infinity|undefined/)
      expect(left, text).toBeGreaterThanOrEqual(0)
      expect(right, text).toBeLessThanOrEqual(width)
    }
  })
})
