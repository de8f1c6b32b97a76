import { readEnv } from './env'
import { StartRefusal } from './start-refusal'
import { startServer } from './start-server'

try {
  await startServer(readEnv(process.env))
} catch (error) {
  // What the operator can mend is a sentence; anything else keeps its stack.
  process.stderr.write(`${error instanceof StartRefusal ? error.message : (error as Error).stack}\n`)
  process.exit(1)
}
