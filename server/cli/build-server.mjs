import { cpSync, existsSync } from 'node:fs'
import { build } from 'esbuild'

const outDir = 'dist/server'

/** Threads load their own file, so the worker is an entry of its own. */
const entryPoints = ['server/index.ts', 'server/analysis/worker.ts'].filter((file) => existsSync(file))

await build({
  entryPoints,
  outbase: 'server',
  outdir: outDir,
  bundle: true,
  packages: 'external',
  platform: 'node',
  target: 'node20',
  format: 'esm',
  sourcemap: true,
  logLevel: 'warning',
})
cpSync('server/db/migrations', `${outDir}/migrations`, { recursive: true })
