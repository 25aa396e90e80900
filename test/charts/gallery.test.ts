import { mkdirSync, writeFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { DARK, PAPER } from '../../src/charts/theme.js'
import { drawChart } from '../../src/cli/drawChart.js'
import { GALLERY } from './gallery.js'

const folder = new URL('../../out/charts-gallery/', import.meta.url)
mkdirSync(folder, { recursive: true })

describe.each(GALLERY)('$name', ({ name, build, width, height }) => {
  it('draws', async () => {
    for (const format of ['png', 'svg'] as const) {
      const bytes = await drawChart(build(PAPER), { width, height, format, scale: 1.5 })
      writeFileSync(new URL(`${name}.${format}`, folder), bytes)
      expect(bytes.length).toBeGreaterThan(1000)
    }
    writeFileSync(new URL(`${name}-dark.png`, folder), await drawChart(build(DARK), { width, height, format: 'png' }))
  })
})
