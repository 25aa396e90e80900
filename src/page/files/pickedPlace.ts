import type { Place } from './place.js'

const READ = /\.(ya?ml|csv|txt)$/i
const STACK_FILE = /\.ya?ml$/i
const MOST_FILES = 3000
const LARGEST_BYTES = 32 * 1024 * 1024

/** Files the user picked, one or a whole folder; a stack file finds the others by their path as seen from its own folder. */
export async function pickedPlace(files: readonly File[]): Promise<Place> {
  const kept = files.filter(({ name, size }) => READ.test(name) && size <= LARGEST_BYTES).slice(0, MOST_FILES)
  const texts = new Map<string, string>()
  for (const file of kept) texts.set(pathOf(file), await file.text())
  const stacks = [...texts.keys()].filter((path) => STACK_FILE.test(path) && !path.endsWith('.film.yaml')).sort()
  return {
    kind: 'picked',
    name: 'picked',
    list: async () => stacks,
    open: async (file) => {
      const text = texts.get(file)
      if (text === undefined) throw new Error(`${file} is not among the picked files`)
      return { file, text, reads: seenFrom(file, texts), lists: {} }
    },
  }
}

/** Below the picked folder, whose own name is left out. */
function pathOf({ name, webkitRelativePath }: File): string {
  return webkitRelativePath === '' ? name : webkitRelativePath.slice(webkitRelativePath.indexOf('/') + 1)
}

function seenFrom(file: string, texts: ReadonlyMap<string, string>): Record<string, string> {
  const folders = file.split('/').slice(0, -1)
  return Object.fromEntries([...texts].map(([path, text]) => [relativePath(folders, path.split('/')), text]))
}

function relativePath(folders: readonly string[], parts: readonly string[]): string {
  let shared = 0
  while (shared < folders.length && shared < parts.length - 1 && folders[shared] === parts[shared]) shared++
  return [...folders.slice(shared).map(() => '..'), ...parts.slice(shared)].join('/')
}
