/** I_x(a, b), the regularized incomplete beta function (NIST Digital Library of Mathematical Functions, 8.17), a, b > 0. */
export function incompleteBeta(x: number, a: number, b: number): number {
  if (x <= 0) return 0
  if (x >= 1) return 1
  return x <= a / (a + b) ? lowerPart(x, 1 - x, a, b) : 1 - lowerPart(1 - x, x, b, a)
}

/** x with I_x(a, b) = p: Newton's steps, halving the bracket wherever they leave it. */
export function inverseIncompleteBeta(p: number, a: number, b: number): number {
  if (p <= 0) return 0
  if (p >= 1) return 1
  let low = 0
  let high = 1
  let x = a / (a + b)
  for (let step = 0; step < 200; step++) {
    const miss = incompleteBeta(x, a, b) - p
    if (miss < 0) low = x
    else high = x
    const newton = x - miss / (kernel(x, 1 - x, a, b) / (x * (1 - x)))
    const next = newton > low && newton < high ? newton : (low + high) / 2
    if (Math.abs(next - x) <= 1e-15 * next) return next
    x = next
  }
  return x
}

/** kernel/a times the continued fraction of DLMF 8.17.22 (by Lentz's method), which converges fast for x ≤ a/(a + b). */
function lowerPart(x: number, y: number, a: number, b: number): number {
  const keepAway = (value: number) => (Math.abs(value) < 1e-300 ? 1e-300 : value)
  let c = 1
  let d = 1 / keepAway(1 - ((a + b) * x) / (a + 1))
  let fraction = d
  for (let m = 1; m < 100_000; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m))
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1))
    let change = 1
    for (const coefficient of [even, odd]) {
      d = 1 / keepAway(1 + coefficient * d)
      c = keepAway(1 + coefficient / c)
      change = c * d
      fraction *= change
    }
    if (Math.abs(change - 1) < 1e-16) break
  }
  return (kernel(x, y, a, b) / a) * fraction
}

/**
 * x^a y^b / B(a, b), y = 1 - x. Written with Stirling's remainders so that nothing cancels for large a and b, after C.
 * Loader, "Fast and accurate computation of binomial probabilities" (2000): with n = a + b, u = x n/a - 1 and v = y n/b - 1,
 * for which a u + b v = 0.
 */
function kernel(x: number, y: number, a: number, b: number): number {
  const n = a + b
  const difference = x * b - y * a
  const exponent =
    a * logMinusLinear(difference / a) +
    b * logMinusLinear(-difference / b) +
    stirlingRemainder(n) -
    stirlingRemainder(a) -
    stirlingRemainder(b)
  return Math.sqrt((a * b) / (2 * Math.PI * n)) * Math.exp(exponent)
}

/** ln(1 + u) - u, also for small u: ln(1 + u) = 2 artanh(s), s = u/(2 + u). */
function logMinusLinear(u: number): number {
  if (Math.abs(u) > 0.2) return Math.log1p(u) - u
  const s = u / (2 + u)
  let power = s
  let sum = 0
  for (let odd = 3; ; odd += 2) {
    power *= s * s
    const next = sum + power / odd
    if (next === sum) return 2 * sum - s * u
    sum = next
  }
}

/** ln Γ(z) - ((z - ½) ln z - z + ½ ln 2π): DLMF 5.11.1, after raising z above 12 by the recurrence. */
function stirlingRemainder(z: number): number {
  let raised = 0
  let w = z
  while (w < 12) {
    raised += (w + 0.5) * Math.log1p(1 / w) - 1
    w++
  }
  const r = 1 / (w * w)
  return raised + (1 / 12 - r * (1 / 360 - r * (1 / 1260 - r * (1 / 1680 - r * (1 / 1188 - (r * 691) / 360360))))) / w
}
