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
    // Workers are built one inside the other; that this takes most of the time is no news.
    rolldownOptions: { checks: { pluginTimings: false } },
  },
})
