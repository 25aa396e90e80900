import type { Place } from './place.js'

const FOLDER = '../../../stacks/'

/** The invented stacks that come with the program, in the page itself; loaded when asked for. */
export const demoPlace: Place = {
  kind: 'demo',
  name: 'invented demo stacks',
  list: async () => Object.keys(await texts()).filter((path) => path.endsWith('.stack.yaml')),
  open: async (file) => {
    const reads = await texts()
    const text = reads[file]
    if (text === undefined) throw new Error(`there is no demo stack ${file}`)
    return { file, text, reads, lists: {} }
  },
}

async function texts(): Promise<Readonly<Record<string, string>>> {
  const { DEMO_TEXTS } = await import('./demoTexts.js')
  return Object.fromEntries(Object.entries(DEMO_TEXTS).map(([path, text]) => [path.slice(FOLDER.length), text]))
}
