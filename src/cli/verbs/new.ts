import { existsSync } from 'node:fs'
import { InputError } from '../../stack/problem.js'
import { STARTER_FILE } from '../../stack/starterFile.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { writeWhole } from '../writeWhole.js'

export async function run({ file, terminal }: Context): Promise<ExitCode> {
  if (existsSync(file)) {
    const message = 'the file exists already and is left as it is'
    throw new InputError([
      { severity: 'error', code: 'file_exists', path: '', file, message, next: 'choose another name' },
    ])
  }
  await writeWhole(file, STARTER_FILE)
  terminal.note(`${file} written; next: offblack evaluate ${file}\n`)
  return EXIT.done
}
