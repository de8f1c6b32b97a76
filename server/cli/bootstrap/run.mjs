import { spawn } from 'node:child_process'
import { constants } from 'node:os'

const signals = ['SIGTERM', 'SIGINT', 'SIGHUP']

/**
 * Runs a program to its end and gives its exit code; a signal to us goes on to it. Its standard output
 * becomes our standard error, unless it is `inherit`.
 */
export function run(program, args, environment = {}, output = process.stderr) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      stdio: ['inherit', output, 'inherit'],
      env: { ...process.env, ...environment },
    })
    const forwards = signals.map((signal) => [signal, () => child.kill(signal)])
    for (const [signal, forward] of forwards) process.on(signal, forward)
    child.once('error', reject)
    child.once('exit', (code, signal) => {
      for (const [name, forward] of forwards) process.off(name, forward)
      resolve(code ?? 128 + constants.signals[signal])
    })
  })
}
