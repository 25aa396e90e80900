import { basename } from 'node:path'

/** How files made from a stack file are named: `stacks/dive-computer.stack.yaml` gives `dive-computer`. */
export function stemOf(file: string): string {
  return basename(file).replace(/(\.stack)?\.ya?ml$/i, '') || 'stack'
}
