import { defineConfig } from 'vite'

/** The tuning page: static files under `dist/page`, served by `offblack tune` or by any web server. */
export default defineConfig({
  root: 'src/page',
  base: './',
  oxc: { jsx: { runtime: 'automatic', importSource: 'preact' } },
  worker: { format: 'es' },
  build: {
    outDir: '../../dist/page',
    emptyOutDir: true,
    target: 'es2022',
    modulePreload: { polyfill: false },
    reportCompressedSize: false,
  },
})
