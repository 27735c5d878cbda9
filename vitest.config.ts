import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'

/** Unit, HTTP and component tests. Browser tests have vitest.e2e.config.ts. */
export default defineConfig({
  plugins: [react()],
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'node',
          environment: 'node',
          include: [
            'tests/{sim,server,shared,reference,support,lint}/**/*.test.ts',
            'tests/client/**/*.node.test.ts',
          ],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'client',
          environment: 'jsdom',
          include: ['tests/client/**/*.test.{ts,tsx}'],
          exclude: ['tests/client/**/*.node.test.ts'],
          setupFiles: ['tests/support/dom.ts'],
          testTimeout: 15_000,
        },
      },
    ],
    coverage: { provider: 'v8', include: ['client/**', 'server/**', 'sim/**', 'shared/**'] },
  },
})
