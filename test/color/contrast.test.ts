import { expect, test } from 'vitest'
import { ambientContrast } from '../../src/color/contrast.js'

// Inputs: H. Chen et al., Light Sci. Appl. 7, 17168 (2018), figure 7: an OLED of 600 cd/m2 without dark light and an LCD of
// 1200 cd/m2 and 5000:1, both with a luminous reflectance of 1.2 %. Values computed from (L_on + E R/π)/(L_off + E R/π).
const OLED = { onLuminance: 600, darkLuminance: 0, luminousReflectance: 0.012 }
const LCD = { onLuminance: 1200, darkLuminance: 1200 / 5000, luminousReflectance: 0.012 }

test.each([
  [100, 1571.8, 1930.0],
  [500, 315.16, 559.06],
  [10_000, 16.71, 32.21],
])('at %d lx', (illuminanceLx, oled, lcd) => {
  expect(ambientContrast({ ...OLED, illuminanceLx })).toBeCloseTo(oled, oled > 1000 ? 1 : 2)
  expect(ambientContrast({ ...LCD, illuminanceLx })).toBeCloseTo(lcd, lcd > 1000 ? 1 : 2)
})

test('the two cross at 62.86 lx', () => {
  const lead = (illuminanceLx: number) =>
    ambientContrast({ ...OLED, illuminanceLx }) - ambientContrast({ ...LCD, illuminanceLx })
  expect(lead(62.855)).toBeGreaterThan(0)
  expect(lead(62.865)).toBeLessThan(0)
})

test('in the dark it is the contrast of the panel', () => {
  expect(ambientContrast({ ...LCD, illuminanceLx: 0 })).toBeCloseTo(5000, 9)
  expect(ambientContrast({ ...OLED, illuminanceLx: 0 })).toBe(Infinity)
})
