import { jsonText } from '../../report/jsonText.js'
import { filmJsonSchema, stackJsonSchema } from '../../stack/jsonSchema.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'

interface SchemaOptions {
  readonly film?: boolean
}

export async function run({ options, terminal }: Context<SchemaOptions>): Promise<ExitCode> {
  terminal.print(jsonText(options.film ? filmJsonSchema() : stackJsonSchema()))
  return EXIT.done
}
