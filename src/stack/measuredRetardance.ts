/**
 * A retardance measured over wavelength, Re(λ), is kept as its value at 550 nm and the table as dispersion, which is the
 * same film: Re(λ) = Re(550) · table(λ)/table(550). So the retardance of every film is one number that can be varied.
 */
import type { Fault } from './fault.js'
import { retardanceAt550, rthAt550 } from './retardanceAt550.js'
import type { RetarderLayer } from './stack.js'

/** What is wrong with the retardance of a film and its thickness. */
export function retardanceFault({ retardance, dispersion, thickness, rth, nz }: RetarderLayer): Fault | undefined {
  if (typeof retardance !== 'number' && dispersion !== undefined) {
    return {
      code: 'exclusive',
      message: 'a table of the retardance gives its own dispersion',
      received: 'a table, and dispersion',
      next: 'remove dispersion, or give the retardance as a number',
    }
  }
  const re = retardanceAt550({ retardance })
  if (typeof retardance !== 'number' && re === 0) return zeroAt550('give the number 0, with rth for a C-plate')
  if (dispersion !== undefined && 'value' in dispersion && retardanceAt550({ retardance: dispersion }) === 0) {
    return zeroAt550('a dispersion is relative to 550 nm: give a table that is not zero there')
  }
  const out = rthAt550({ retardance: re, rth, nz }) + re / 2
  return birefringenceFault(Math.max(Math.abs(re), Math.abs(out)), thickness)
}

function zeroAt550(next: string): Fault {
  return { code: 'out_of_range', message: 'the table is zero at 550 nm', received: '0', next }
}

/** No transparent film has a birefringence of 1: the thickness or its unit is wrong. */
function birefringenceFault(largestNm: number, thicknessNm: number): Fault | undefined {
  if (largestNm < thicknessNm || largestNm === 0) return undefined
  const need = thicknessNm === 0 ? 'a film of no thickness' : `${Number((largestNm / thicknessNm).toPrecision(3))}`
  return {
    code: 'out_of_range',
    message: 'the retardance is too large for the thickness',
    received: `${Number(largestNm.toPrecision(4))} nm in ${thicknessNm} nm, a birefringence of ${need}`,
    allowed: 'a birefringence below 1',
    next: 'check the units of retardance and thickness',
  }
}

export function withScalarRetardance(layer: RetarderLayer): RetarderLayer {
  const { retardance } = layer
  if (typeof retardance === 'number') return layer
  return { ...layer, retardance: retardanceAt550(layer), dispersion: retardance }
}
