/** The part used of `fmin` 0.0.2, which comes without types. */
declare module 'fmin' {
  export function nelderMead(
    f: (x: number[]) => number,
    x0: number[],
    parameters?: { maxIterations?: number; nonZeroDelta?: number; minErrorDelta?: number },
  ): { fx: number; x: number[] }
}
