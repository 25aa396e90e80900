import { readFileSync } from 'node:fs'
import { basename } from 'node:path'
import { pathToFileURL } from 'node:url'
import { defineConfig, type Plugin } from 'rolldown'

const FONT_ADDRESS = /new URL\('([^']+\.ttf)', import\.meta\.url\)/g

/** Copies the fonts a source file points to (`new URL('….ttf', import.meta.url)`) beside the bundle, and points there. */
const fonts: Plugin = {
  name: 'fonts',
  transform: {
    filter: { id: /\/src\/cli\//, code: FONT_ADDRESS },
    handler(code, id) {
      return code.replace(FONT_ADDRESS, (_, path: string) => {
        const source = readFileSync(new URL(path, pathToFileURL(id)))
        const reference = this.emitFile({ type: 'asset', fileName: `fonts/${basename(path)}`, source })
        return `new URL(import.meta.ROLLUP_FILE_URL_${reference})`
      })
    },
  },
}

// Everything is bundled, so that `--help` loads one small file and each verb loads only what it needs.
// Native and browser-driving packages stay outside: they carry files of their own.
const command = defineConfig({
  logLevel: 'warn',
  input: { offblack: 'src/cli/main.ts', worker: 'src/cli/worker.ts', library: 'src/library.ts' },
  platform: 'node',
  external: ['@napi-rs/canvas', /^playwright-core/],
  resolve: { extensionAlias: { '.js': ['.ts', '.js'] } },
  plugins: [fonts],
  output: {
    dir: 'dist',
    cleanDir: true,
    format: 'esm',
    entryFileNames: '[name].js',
    // Beside the entries, so that any of them finds worker.js next to itself.
    chunkFileNames: '[name]-[hash].js',
    minify: false,
  },
})

/** The script in the pages of `report`: one file that asks for nothing. */
const reviewCharts = defineConfig({
  logLevel: 'warn',
  input: { 'review-charts': 'src/page/reviewCharts.ts' },
  platform: 'browser',
  resolve: { extensionAlias: { '.js': ['.ts', '.js'] } },
  output: { dir: 'dist', format: 'iife', entryFileNames: '[name].js', minify: true },
})

export default [command, reviewCharts]
