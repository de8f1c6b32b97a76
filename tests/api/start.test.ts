import { type ChildProcess, spawn } from 'node:child_process'
import { existsSync, mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'

const patienceMs = 60_000
let folder: string
const running = new Set<ChildProcess>()

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'lapwing-start-'))
})
afterEach(() => {
  for (const child of running) child.kill('SIGKILL')
  running.clear()
  rmSync(folder, { recursive: true, force: true })
})

/** The program itself, as a process of its own. NODE_ENV=test leaves out the screens, which need a build. */
function start(variables: Record<string, string>) {
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/index.ts'], {
    env: {
      PATH: process.env.PATH,
      NODE_ENV: 'test',
      PORT: '0',
      LAPWING_DATA: folder,
      LAPWING_DEMO: 'off',
      ...variables,
    },
  })
  running.add(child)
  let out = ''
  let err = ''
  child.stderr.on('data', (chunk) => {
    err += chunk
  })
  const ended = new Promise<{ code: number | null; out: string; err: string }>((resolve) =>
    child.once('close', (code) => resolve({ code, out, err })),
  )
  const address = new Promise<string>((resolve, reject) => {
    child.stdout.on('data', (chunk) => {
      out += chunk
      const found = /http:\/\/localhost:\d+/.exec(out)
      if (found) resolve(found[0])
    })
    ended.then(() => reject(new Error(`ended before it listened: ${err}`)))
  })
  address.catch(() => {})
  return { child, address, ended }
}

describe('the program', { timeout: patienceMs }, () => {
  it('starts an empty shop with an administrator, and closes cleanly on SIGTERM', async () => {
    const first = start({})
    const address = await first.address
    expect((await fetch(`${address}/api/health`)).status).toBe(200)
    first.child.kill('SIGTERM')
    const { code, out } = await first.ended
    expect(code).toBe(0)
    expect(existsSync(join(folder, 'lapwing.sqlite-wal'))).toBe(false)

    const [, email, password] = /^ {2}(\S+@\S+) {3}(\S+)$/m.exec(out) ?? []
    const second = start({})
    const answer = await fetch(`${await second.address}/api/session`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', Origin: await second.address },
      body: JSON.stringify({ email, password }),
    })
    expect(answer.status).toBe(200)
    expect(await answer.json()).toMatchObject({ roles: ['admin'] })
    second.child.kill('SIGINT')
    const ended = await second.ended
    expect(ended.code).toBe(0)
    expect(ended.out).not.toContain(password)
  })

  it('names the variable that is wrong and stops', async () => {
    const { code, err } = await start({ PORT: 'abc' }).ended
    expect(code).toBe(1)
    expect(err.trim()).toBe('PORT must be a whole number from 0 to 65535; it is "abc".')
  })

  it('says when its port is in use', async () => {
    const other = createServer().listen(0)
    await new Promise((resolve) => other.once('listening', resolve))
    const { port } = other.address() as { port: number }
    const { code, err } = await start({ PORT: String(port) }).ended
    other.close()
    expect(code).toBe(1)
    expect(err.trim()).toBe(`Port ${port} is in use. Stop the other program, or set PORT to another port.`)
  })
})
