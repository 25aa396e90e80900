import { formatHex } from 'culori'
import { expect, test } from 'vitest'
import { readStack } from '../../src/stack/readStack.js'
import { NO_FILES } from '../../src/stack/stackFiles.js'
import { offStateSwatches } from '../../src/studies/offStateSwatches.js'

/** A mirror in air that reflects the same share of every wavelength: its appearance needs no optics to be known. */
async function grayMirror(reflectance: number, lines: string, illuminant = 'A') {
  const text = `format: 1
title: Invented gray mirror
conditions: {wavelengths: {from: 380 nm, to: 780 nm, step: 5 nm}, observer: 2 deg, illuminant: ${illuminant}, directions: [{theta: 0 deg, phi: 0 deg}]}
layers: [{id: air, kind: isotropic, index: 1, thickness: 10 um}]
panel: {kind: mirror, index: 1, reflectance: ${reflectance}, depolarized: 0}
${lines}
`
  const reading = await readStack(text, { file: 'gray.stack.yaml', files: NO_FILES, sets: [] })
  if (!reading.ok) throw new Error(reading.problems.map(({ message }) => message).join('; '))
  return offStateSwatches(reading.stack)
}

test('a gray of 4.5 % of the white is that gray of sRGB, under any lamp', async () => {
  for (const illuminant of ['A', 'D65', 'FL11']) {
    const [swatch] = await grayMirror(0.045, 'ambient: [1000]', illuminant)
    // culori encodes linear sRGB on its own.
    expect(swatch.srgb).toBe(formatHex({ mode: 'lrgb', r: 0.045, g: 0.045, b: 0.045 }))
    expect(swatch.relative_luminance).toBeCloseTo(0.045, 10)
    expect(swatch.clipped).toBe(false)
  }
})

test('luminances are those of a diffuser and of the lit screen under the stated light', async () => {
  const lit = 'emission: {luminance: 600, dark_luminance: 0.3, spectrum: D65, polarization: none}\nambient: [500]'
  const [diffuser, screen] = await grayMirror(0.045, lit)
  // A perfect diffuser under E has the luminance E/π (Lambert's law); 4.5 % of it come back, and the screen's own add to it.
  expect(diffuser.white_luminance).toBeCloseTo(159.155, 3)
  expect(diffuser.off_luminance).toBeCloseTo(0.045 * 159.155 + 0.3, 3)
  expect(screen.relative_to).toBe('lit_screen')
  expect(screen.white_luminance).toBeCloseTo(600 + 0.045 * 159.155, 3)
  expect(screen.relative_luminance).toBeCloseTo(7.462 / 607.162, 5)
})

test('a file without ambient light is shown in an office', async () => {
  expect((await grayMirror(0.045, '')).map(({ illuminance_lx }) => illuminance_lx)).toEqual([500])
})
