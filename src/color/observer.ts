import { interpolateLinear } from '../numeric/interpolate.js'
import { observer2deg } from './tables/observer2deg.js'
import { observer10deg } from './tables/observer10deg.js'

/**
 * Color-matching functions of the 2° or 10° observer at the wavelengths, linear between the rows of the table
 * (360 to 830 nm) and 0 beyond them, where the eye sees nothing.
 */
export function observerAt(
  observer: 2 | 10,
  wavelengthsNm: Float64Array,
): { x: Float64Array; y: Float64Array; z: Float64Array } {
  const { fromNm, stepNm, x, y, z } = observer === 2 ? observer2deg : observer10deg
  const table = Float64Array.from({ length: y.length }, (_, k) => fromNm + k * stepNm)
  const isSeen = (nm: number) => nm >= table[0] && nm <= table[table.length - 1]
  const at = (values: readonly number[]) =>
    wavelengthsNm.map((nm) => (isSeen(nm) ? interpolateLinear(table, values, nm) : 0))
  return { x: at(x), y: at(y), z: at(z) }
}
