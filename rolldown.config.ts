import { defineConfig } from 'rolldown'

// Everything is bundled, so that `--help` loads one small file and each verb loads only what it needs.
// Native and browser-driving packages stay outside: they carry files of their own.
export default defineConfig({
  input: { offblack: 'src/cli/main.ts', library: 'src/library.ts' },
  platform: 'node',
  external: ['@napi-rs/canvas', /^playwright-core/],
  resolve: { extensionAlias: { '.js': ['.ts', '.js'] } },
  output: {
    dir: 'dist',
    format: 'esm',
    entryFileNames: '[name].js',
    chunkFileNames: 'chunks/[name]-[hash].js',
    minify: false,
  },
})
