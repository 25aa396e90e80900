import { defineConfig } from 'vitest/config'

export default defineConfig({
  test: {
    include: ['test/**/*.test.ts'],
    globalSetup: ['test/buildOnce.ts'],
    testTimeout: 60_000,
    maxWorkers: 2,
  },
})
