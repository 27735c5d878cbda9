import { defineConfig } from 'vitest/config'

/** Browser tests: the built application in Debian's Chromium. One file after another, the machine is small. */
export default defineConfig({
  test: {
    include: ['tests/e2e/**/*.test.ts'],
    environment: 'node',
    fileParallelism: false,
    testTimeout: 120_000,
    hookTimeout: 120_000,
  },
})
