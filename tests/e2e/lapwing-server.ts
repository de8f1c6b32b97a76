import { type ChildProcess, execFileSync, spawn } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

export interface RunningServer {
  url: string
  stop(): Promise<void>
}

/** The built server over a new demo shop in a folder of its own, as `npm start` runs it. */
export async function startLapwing(): Promise<RunningServer> {
  // A server that already runs may be named while tests are being written.
  if (process.env.LAPWING_E2E_URL) return { url: process.env.LAPWING_E2E_URL, stop: async () => {} }
  execFileSync('node', ['server/cli/bootstrap.mjs', 'build'], { stdio: ['ignore', 'ignore', 'inherit'] })
  const dir = mkdtempSync(join(tmpdir(), 'lapwing-e2e-'))
  const port = await freePort()
  const child = spawn('node', ['dist/server/index.js'], {
    env: {
      ...process.env,
      NODE_ENV: 'production',
      PORT: String(port),
      HOST: '127.0.0.1',
      LAPWING_DATA: dir,
      LAPWING_DEMO: 'on',
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  await said(child, 'Lapwing is at')
  return {
    url: `http://127.0.0.1:${port}`,
    async stop() {
      child.kill('SIGTERM')
      await new Promise((resolve) => child.once('exit', resolve))
      rmSync(dir, { recursive: true, force: true })
    },
  }
}

function said(child: ChildProcess, words: string): Promise<void> {
  return new Promise((resolve, reject) => {
    let output = ''
    const listen = (chunk: Buffer) => {
      output += chunk
      if (output.includes(words)) resolve()
    }
    child.stdout?.on('data', listen)
    child.stderr?.on('data', listen)
    child.once('exit', (code) => reject(new Error(`the server ended with ${code}:\n${output}`)))
  })
}

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', reject)
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address()
      probe.close(() =>
        typeof address === 'object' && address ? resolve(address.port) : reject(new Error('no port')),
      )
    })
  })
}
