import { expect, test } from 'vitest'
import { axisDial } from '../../src/report/html/axisDial.js'
import { html } from '../../src/report/html/markup.js'
import { sheetHeightPx, thicknessText } from '../../src/report/html/sheetHeight.js'
import type { LayerFacts } from '../../src/studies/laminateFacts.js'

function retarder(axis_deg: number): LayerFacts {
  return { id: 'film', kind: 'retarder', thickness_nm: 25e3, coherent: false, index: 1.5, axis_deg }
}

/** Azimuth of each line of a dial as seen, y up, in [0, 180). */
function drawnAxes(layer: LayerFacts, before?: LayerFacts): { look: string; azimuth: number }[] {
  const markup = html`${axisDial(layer, before, 50, 50, 20)}`.text
  return [...markup.matchAll(/<line class="(\w+)" x1="(.*?)" y1="(.*?)" x2="(.*?)" y2="(.*?)"/g)].map(
    ([, look, x1, y1, x2, y2]) => {
      const azimuth = (Math.atan2(-(Number(y2) - Number(y1)), Number(x2) - Number(x1)) * 180) / Math.PI
      return { look, azimuth: (azimuth + 360) % 180 }
    },
  )
}

// Counter-clockwise from three o'clock as the viewer sees the screen: the frame every azimuth of the program has.
test.each([0, 22.5, 90, 161.6])('a dial shows %d° counter-clockwise from three o’clock', (azimuth) => {
  const [hand] = drawnAxes(retarder(azimuth))
  expect(hand.look).toBe('hand')
  expect(hand.azimuth).toBeCloseTo(azimuth, 1)
})

test('a moved axis is shown with where it was, an unmoved one alone', () => {
  const axes = drawnAxes(retarder(100), retarder(20))
  expect(axes.map(({ look }) => look)).toEqual(['past', 'hand'])
  expect(axes[0].azimuth).toBeCloseTo(20, 1)
  expect(drawnAxes(retarder(20), retarder(20))).toHaveLength(1)
})

test('thicker sheets are drawn higher, equal ratios by equal steps, and each can hold its name', () => {
  const heights = [1e3, 1e4, 1e5].map(sheetHeightPx)
  expect(heights[2] - heights[1]).toBeCloseTo(heights[1] - heights[0], 10)
  expect(heights[1]).toBeGreaterThan(heights[0])
  expect(sheetHeightPx(3)).toBeGreaterThanOrEqual(24)
})

test('thicknesses are in the unit a person would use', () => {
  expect([85, 1e3, 25e3, 7e5].map(thicknessText)).toEqual(['85 nm', '1 µm', '25 µm', '0.7 mm'])
})
