import { readFileSync } from 'node:fs'
import { createServer, type RequestListener, type Server } from 'node:http'
import { createServer as createTlsServer } from 'node:https'
import type { Env } from '../env'
import { StartRefusal } from '../start-refusal'

export function createNetworkServer(env: Env, handler: RequestListener): Server {
  if (env.tls !== 'direct') return createServer(handler)
  const cert = readTlsFile('LAPWING_TLS_CERT', env.tlsCertFile)
  const key = readTlsFile('LAPWING_TLS_KEY', env.tlsKeyFile)
  try {
    return createTlsServer({ cert, key }, handler)
  } catch (error) {
    throw new StartRefusal(
      `LAPWING_TLS_CERT and LAPWING_TLS_KEY can't be used together: ${(error as Error).message}`,
    )
  }
}

function readTlsFile(name: string, file: string | undefined): Buffer {
  try {
    return readFileSync(file ?? '')
  } catch {
    throw new StartRefusal(`${name} names a file that can't be read: ${file}`)
  }
}

/** Refuses before the long work of a first start what would be refused after it. */
export async function assertCanListen(env: Env): Promise<void> {
  const probe = createServer()
  await listen(probe, env)
  await new Promise((resolve) => probe.close(resolve))
}

export function listen(server: Server, { port, host }: Env): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => reject(listenRefusal(error, port, host)))
    server.listen({ port, host }, resolve)
  })
}

function listenRefusal(error: NodeJS.ErrnoException, port: number, host: string | undefined): Error {
  switch (error.code) {
    case 'EADDRINUSE':
      return new StartRefusal(`Port ${port} is in use. Stop the other program, or set PORT to another port.`)
    case 'EACCES':
      return new StartRefusal(`Port ${port} may not be opened by this account. Set PORT to one above 1023.`)
    case 'EADDRNOTAVAIL':
    case 'ENOTFOUND':
      return new StartRefusal(`HOST must name an address of this machine; it is "${host}".`)
    default:
      return error
  }
}
