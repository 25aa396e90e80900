import { defineConfig } from 'vitest/config'

/** Without the build: for tests of the core while it is being written. */
export default defineConfig({ test: { include: ['test/**/*.test.ts'], testTimeout: 60_000, maxWorkers: 1 } })
