import { inverseNormal } from '../../src/numeric/normal.js'
import { createRandom } from '../../src/numeric/random.js'
import type { Stack } from '../../src/stack/stack.js'
import { oracleSpectrum } from '../oracle/oracleSpectrum.js'
import { plainStack } from './plainStack.js'

/** A variable-angle spectrophotometer: near the normal, then at a slant in several azimuths. θ, φ in degrees. */
const DIRECTIONS_DEG = [
  [8, 0],
  [30, 0],
  [30, 90],
  [45, 45],
  [45, 135],
  [60, 90],
] as const
const WAVELENGTHS_NM = Array.from({ length: 31 }, (_, i) => 400 + 10 * i)

const SAMPLE_NOISE = 0.0005
const SEED = 20

const HEAD = `# Invented demo data, no real product: no sample was measured. The reflectance of prototype A of the dive computer with
# faults that are for \`offblack fit\` to find, computed by the tests' own slow solver, plus normal noise of 0.05 %
# (test/stacks/measuredSample.ts).
wavelength_nm,theta_deg,phi_deg,reflectance
`

/** The text of a measured-like CSV of the stack: what the oracle says, plus seeded noise. */
export function measuredSample(stack: Stack): string {
  const random = createRandom(SEED)
  const plain = plainStack(stack, WAVELENGTHS_NM)
  const rows = DIRECTIONS_DEG.flatMap(([theta, phi]) => {
    const spectrum = oracleSpectrum(plain, WAVELENGTHS_NM, (theta * Math.PI) / 180, (phi * Math.PI) / 180)
    return spectrum.map(({ reflectance }, i) => {
      const noisy = reflectance + SAMPLE_NOISE * inverseNormal(random.uniform())
      return `${WAVELENGTHS_NM[i]},${theta},${phi},${noisy.toFixed(5)}\n`
    })
  })
  return HEAD + rows.join('')
}
