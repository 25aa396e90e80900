/** A complex number as a plain object: the oracle is written to be read, not to be fast. */
export interface Complex {
  readonly re: number
  readonly im: number
}

export const ZERO: Complex = { re: 0, im: 0 }
export const ONE: Complex = { re: 1, im: 0 }
export const I: Complex = { re: 0, im: 1 }

export const real = (value: number): Complex => ({ re: value, im: 0 })
export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im })
export const sub = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im })
export const neg = (a: Complex): Complex => ({ re: -a.re, im: -a.im })
export const conj = (a: Complex): Complex => ({ re: a.re, im: -a.im })
export const scale = (factor: number, a: Complex): Complex => ({ re: factor * a.re, im: factor * a.im })
export const abs = (a: Complex): number => Math.hypot(a.re, a.im)

export const mul = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
})

export function div(a: Complex, b: Complex): Complex {
  const size = b.re * b.re + b.im * b.im
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size }
}

export function exp(a: Complex): Complex {
  const size = Math.exp(a.re)
  return { re: size * Math.cos(a.im), im: size * Math.sin(a.im) }
}

/** The principal root: its real part is not negative. */
export function sqrt(a: Complex): Complex {
  const size = abs(a)
  if (size === 0) return ZERO
  const larger = Math.sqrt((size + Math.abs(a.re)) / 2)
  const smaller = a.im / (2 * larger)
  if (a.re >= 0) return { re: larger, im: smaller }
  return { re: Math.abs(smaller), im: a.im < 0 ? -larger : larger }
}

export const sum = (terms: readonly Complex[]): Complex => terms.reduce(add, ZERO)
