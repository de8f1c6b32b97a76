import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const root = fileURLToPath(new URL('../..', import.meta.url))

export default defineConfig({
  root,
  resolve: { alias: { '@shared': `${root}shared`, '@': `${root}src` } },
  test: {
    include: ['tests/e2e/**/*.e2e.ts'],
    // One browser and one server at a time: the machine may have two cores only.
    fileParallelism: false,
    testTimeout: 120_000,
    hookTimeout: 180_000,
  },
})
