import { existsSync } from 'node:fs'
import type { Server } from 'node:http'
import { fileURLToPath } from 'node:url'
import express, { type Express } from 'express'
import type { Env } from '../env'
import { StartRefusal } from '../start-refusal'

export interface Screens {
  close: () => Promise<void>
}

const nothingToClose: Screens = { close: async () => {} }

/** Puts the browser's side on: as built, through vite while developing, not at all in tests of the API. */
export async function mountScreens(app: Express, env: Env, server: Server): Promise<Screens> {
  switch (env.nodeEnv) {
    case 'development':
      return mountVite(app, server)
    case 'production':
      mountBuilt(app, requireClientFolder())
      return nothingToClose
    case 'test':
      return nothingToClose
  }
}

function mountBuilt(app: Express, folder: string): void {
  // Names under /assets carry a hash of what is in them.
  app.use(
    '/assets',
    express.static(`${folder}/assets`, { immutable: true, maxAge: '1y', fallthrough: false }),
  )
  app.use(express.static(folder, { index: false }))
  app.get('/{*path}', (_request, response) => {
    response.set('Cache-Control', 'no-cache').sendFile('index.html', { root: folder })
  })
}

/** Seen from the bundle in `dist/server`, and from this file when it runs as source. */
function requireClientFolder(): string {
  const candidates = ['../client', '../../dist/client'].map((path) =>
    fileURLToPath(new URL(path, import.meta.url)),
  )
  const folder = candidates.find((candidate) => existsSync(`${candidate}/index.html`))
  if (!folder) throw new StartRefusal('The screens are not built. Run "npm run build" first.')
  return folder
}

async function mountVite(app: Express, server: Server): Promise<Screens> {
  const { createServer } = await import('vite')
  const vite = await createServer({
    appType: 'spa',
    server: { middlewareMode: true, hmr: { server } },
  })
  app.use(vite.middlewares)
  return { close: () => vite.close() }
}
