import { fileURLToPath } from 'node:url'
import tailwindcss from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url))

export default defineConfig({
  plugins: [react(), tailwindcss()],
  resolve: { alias: { '@shared': here('./shared'), '@': here('./src') } },
  build: { outDir: 'dist/client', sourcemap: true, chunkSizeWarningLimit: 900 },
  worker: { format: 'es' },
  test: {
    include: ['{shared,server,src,tests}/**/*.test.{ts,tsx}'],
    exclude: ['node_modules/**', 'tests/e2e/**'],
    // No test is about speed: a busy machine may take its time.
    testTimeout: 120_000,
    hookTimeout: 180_000,
  },
})
