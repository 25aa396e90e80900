import { mkdirSync, writeFileSync } from 'node:fs'
import type { ChartConfiguration } from 'chart.js'
import { describe, expect, it } from 'vitest'
import { offStateColor } from '../../src/charts/offStateColor.js'
import { reflectanceSpectrum } from '../../src/charts/reflectanceSpectrum.js'
import { searchProgress } from '../../src/charts/searchProgress.js'
import { DARK, PAPER, type Theme } from '../../src/charts/theme.js'
import { viewingCone } from '../../src/charts/viewingCone.js'
import { drawChart } from '../../src/cli/drawChart.js'
import * as sample from './samples.js'

const gallery: Record<string, [(theme: Theme) => ChartConfiguration, number, number]> = {
  reflectanceSpectrum: [(theme) => reflectanceSpectrum(sample.reflectanceSpectrumData, theme), 900, 540],
  offStateColor: [(theme) => offStateColor(sample.offStateColorData, theme), 720, 760],
  searchProgress: [(theme) => searchProgress(sample.searchProgressData, theme), 900, 540],
  viewingCone: [(theme) => viewingCone(sample.viewingConeData, theme), 760, 720],
}
const folder = new URL('../../out/charts-gallery/', import.meta.url)
mkdirSync(folder, { recursive: true })

describe.each(Object.entries(gallery))('%s', (name, [build, width, height]) => {
  it('draws', async () => {
    for (const format of ['png', 'svg'] as const) {
      const bytes = await drawChart(build(PAPER), { width, height, format, scale: 1.5 })
      writeFileSync(new URL(`${name}.${format}`, folder), bytes)
      expect(bytes.length).toBeGreaterThan(1000)
    }
    writeFileSync(new URL(`${name}-dark.png`, folder), await drawChart(build(DARK), { width, height, format: 'png' }))
  })
})
