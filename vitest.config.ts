import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const root = fileURLToPath(new URL('.', import.meta.url))
const alias = [
  { find: /^@\//, replacement: root },
]

export default defineConfig({
  resolve: { alias },
  test: {
    projects: [
      {
        resolve: { alias },
        test: {
          name: 'unit',
          include: ['{lib,plots,components,fonts,app,db,scripts,tests/unit}/**/*.test.{ts,tsx,mjs}'],
          environment: 'node',
          // PDFs and real clusters are slow on a loaded machine; a limit is for what hangs.
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: {
          name: 'integration',
          include: ['tests/integration/**/*.test.ts'],
          environment: 'node',
          testTimeout: 30_000,
          hookTimeout: 60_000,
          // Files share one running app and one database; each makes its own party, so they may run side by side.
          maxWorkers: 2,
        },
      },
    ],
  },
})
