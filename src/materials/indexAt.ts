import { formulaAt } from './formula.js'
import type { IndexLaw } from './indexLaw.js'
import { materialIndexAt } from './material.js'
import { spectrumAt } from './spectrumAt.js'

/** n and k over wavelength. A material's name must be known and a formula prepared. */
export function indexAt(law: IndexLaw, wavelengthsNm: Float64Array): { n: Float64Array; k: Float64Array } {
  const none = () => new Float64Array(wavelengthsNm.length)
  if (typeof law === 'number') return { n: none().fill(law), k: none() }
  if ('n' in law) return { n: spectrumAt(law.n, wavelengthsNm), k: spectrumAt(law.k, wavelengthsNm) }
  if ('cauchy_nm' in law) {
    const [a, b, c] = law.cauchy_nm
    return { n: wavelengthsNm.map((nm) => a + b / nm ** 2 + c / nm ** 4), k: none() }
  }
  if ('material' in law) return materialIndexAt(law.material, wavelengthsNm)
  return {
    n: wavelengthsNm.map((nm) => formulaAt(law.formula, { wavelength_nm: nm, wavelength_um: nm / 1000 })),
    k: none(),
  }
}
