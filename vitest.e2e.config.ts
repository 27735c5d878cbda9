import { defineConfig } from 'vitest/config'

/** Browser tests: the built application in Debian's Chromium. One file after another, the machine is small. */
export default defineConfig({
  test: {
    include: ['tests/e2e/**/*.test.ts'],
    environment: 'node',
    fileParallelism: false,
    // Only where nobody watches: a try more, which vitest reports. By hand a race fails at once, and is to be mended.
    retry: process.env.CI ? 1 : 0,
    // A poll waits as long as a locator may need on a busy machine; vitest's own second is too short.
    expect: { poll: { timeout: 15_000 } },
    testTimeout: 120_000,
    hookTimeout: 120_000,
  },
})
