import type { IndexArrays } from './dispersion.js'
import { formulaAt } from './formula.js'
import type { IndexLaw } from './indexLaw.js'
import { materialIndexAt } from './material.js'
import { spectrumAt } from './spectrumAt.js'

/** n and k over wavelength (nm). Throws where a material is not known or a formula was not prepared. */
export function indexAt(law: IndexLaw, wavelengthsNm: Float64Array): IndexArrays {
  const zeros = () => new Float64Array(wavelengthsNm.length)
  if (typeof law === 'number') return { n: zeros().fill(law), k: zeros() }
  if ('n' in law) return { n: spectrumAt(law.n, wavelengthsNm), k: spectrumAt(law.k, wavelengthsNm) }
  if ('material' in law) return materialIndexAt(law.material, wavelengthsNm)
  if ('cauchy_nm' in law) {
    const [a, b, c] = law.cauchy_nm
    return { n: wavelengthsNm.map((nm) => a + b / nm ** 2 + c / nm ** 4), k: zeros() }
  }
  const { formula } = law
  return {
    n: wavelengthsNm.map((nm) => formulaAt(formula, { wavelength_nm: nm, wavelength_um: nm / 1000 })),
    k: zeros(),
  }
}
