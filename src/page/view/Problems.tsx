interface ProblemsProps {
  /** As the command line prints it. */
  readonly text: string
  /** Warnings: the file is open all the same. */
  readonly mild?: boolean
}

export function Problems({ text, mild = false }: ProblemsProps) {
  return (
    <pre class={mild ? 'problems mild' : 'problems'} role={mild ? 'note' : 'alert'} tabIndex={0}>
      {text}
    </pre>
  )
}
