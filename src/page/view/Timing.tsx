interface TimingProps {
  readonly viewMs: number
  readonly coneMs: number | undefined
}

/** What the engine took for the last turn. */
export function Timing({ viewMs, coneMs }: TimingProps) {
  return (
    <footer data-view-ms={viewMs} data-cone-ms={coneMs}>
      computed on this machine: figures and spectra in {viewMs.toFixed(1)} ms
      {coneMs === undefined ? '' : `, cone in ${coneMs.toFixed(0)} ms`}
    </footer>
  )
}
