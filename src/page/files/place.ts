import type { StackBundle } from '../../stack/recordedFiles.js'

/** Where stack files come from, and perhaps go to. */
export interface Place {
  readonly kind: 'served' | 'demo' | 'picked'
  /** Said above the list of its files. */
  readonly name: string
  readonly list: () => Promise<readonly string[]>
  readonly open: (file: string) => Promise<OpenedFile>
  /** Writes the text and returns its version; absent where a file can only be downloaded. */
  readonly save?: (file: string, text: string, version: string | undefined) => Promise<string>
}

export interface OpenedFile extends StackBundle {
  /** Of the text on the server's disk. */
  readonly version?: string
}
