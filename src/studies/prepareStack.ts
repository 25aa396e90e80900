import { prepareFormula } from '../materials/formula.js'
import type { Stack } from '../stack/stack.js'

/**
 * Compiles the formulas of a stack that came as plain data (to a worker): reading the file did it once already, in
 * another thread.
 */
export async function prepareStack(stack: Stack): Promise<void> {
  const laws = [
    ...stack.layers.flatMap((layer) => (layer.kind === 'crystal' ? layer.indices : [layer.index])),
    stack.panel.index,
  ]
  for (const law of laws) {
    if (typeof law === 'object' && 'formula' in law) await prepareFormula(law.formula)
  }
}
