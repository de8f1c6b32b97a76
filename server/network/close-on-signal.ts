import type { Server } from 'node:http'

/** How long a request that is under way may take to finish. */
const patienceMs = 5000

/** On SIGTERM or SIGINT: no new requests, let the running ones end, let go of everything, leave with 0. */
export function closeOnSignal(server: Server, release: () => Promise<void>): void {
  let closing = false
  const close = async () => {
    if (closing) return
    closing = true
    await stopListening(server)
    await release()
    process.exit(0)
  }
  process.on('SIGTERM', close)
  process.on('SIGINT', close)
}

function stopListening(server: Server): Promise<void> {
  return new Promise((resolve) => {
    const impatient = setTimeout(() => server.closeAllConnections(), patienceMs)
    server.close(() => {
      clearTimeout(impatient)
      resolve()
    })
    server.closeIdleConnections()
  })
}
