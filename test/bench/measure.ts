/** A figure beside a yardstick timed in the same rounds, so that what else the machine does divides out. */
export interface Measurement {
  /** Median over the rounds, seconds per call on a quiet machine: the yardstick tells how quiet it was. */
  readonly secondsPerCall: number
  /** Half the spread between the quartiles, as a share of the median. */
  readonly spread: number
}

const ROUNDS = 11
const ROUND_SECONDS = 0.1
/** Of one product of the chain, where nothing else runs. */
const QUIET_PRODUCT_SECONDS = 10e-9
const PRODUCTS = 1000

/** Calls `work(k)` in rounds, each between two of the yardstick. */
export function measure(work: (k: number) => void): Measurement {
  let k = 0
  const timed = (call: () => void): number => {
    const start = process.hrtime.bigint()
    let calls = 0
    let seconds = 0
    while (seconds < ROUND_SECONDS) {
      call()
      calls++
      seconds = Number(process.hrtime.bigint() - start) / 1e9
    }
    return seconds / calls
  }
  const next = () => work(k++)
  timed(next)
  timed(chain)
  const times = Array.from({ length: ROUNDS }, () => {
    const before = timed(chain)
    const seconds = timed(next)
    return (seconds * QUIET_PRODUCT_SECONDS * PRODUCTS * 2) / (before + timed(chain))
  }).sort((a, b) => a - b)
  const median = times[Math.floor(ROUNDS / 2)]
  return { secondsPerCall: median, spread: (times[8] - times[2]) / (2 * median) }
}

const STATE = Float64Array.of(1, 0.2, 0.1, -0.3, 0.2, 0.1, 0.9, 0.1)

/** A thousand products of complex 2×2 matrices in local variables, by a unitary one so that nothing grows. */
function chain(): void {
  let [a, b, c, d, e, f, g, h] = STATE
  const [p, q, r, s] = [0.6, 0.48, -0.64, 0]
  for (let k = 0; k < PRODUCTS; k++) {
    const na = a * p - b * q - (c * r - d * s)
    const nb = a * q + b * p - (c * s + d * r)
    const nc = a * r + b * s + (c * p + d * q)
    const nd = b * r - a * s + (d * p - c * q)
    const ne = e * p - f * q - (g * r - h * s)
    const nf = e * q + f * p - (g * s + h * r)
    const ng = e * r + f * s + (g * p + h * q)
    const nh = f * r - e * s + (h * p - g * q)
    a = na
    b = nb
    c = nc
    d = nd
    e = ne
    f = nf
    g = ng
    h = nh
  }
  STATE[7] = a + b + c + d + e + f + g + h > 1e9 ? 0 : STATE[7]
}

/** Bytes taken from the heap per call, over few enough calls that nothing is collected in between. */
export function bytesPerCall(work: (k: number) => void, calls: number): number {
  for (let k = 0; k < 2000; k++) work(k)
  globalThis.gc?.()
  const used = () => process.memoryUsage().heapUsed + process.memoryUsage().arrayBuffers
  const before = used()
  for (let k = 0; k < calls; k++) work(2000 + k)
  return Math.max(0, used() - before) / calls
}
