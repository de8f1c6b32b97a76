/*
 * What runs before anything is installed: plain Node, no packages. It installs when the lock file or Node
 * changed, builds when the sources changed, and then becomes the program that was asked for. Standard
 * output belongs to that program: everything said here goes to standard error.
 */
import { existsSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { run } from './bootstrap/run.mjs'
import { buildStamp, installStamp } from './bootstrap/stamps.mjs'

const root = fileURLToPath(new URL('../..', import.meta.url))
const leastNode = [20, 19]
const typescript = ['--import', 'tsx']

process.chdir(root)
const [mode = 'start', ...rest] = process.argv.slice(2)

switch (mode) {
  case 'stamp':
    installStamp.write()
    break
  case 'build':
    await prepare()
    await build()
    break
  case 'start':
    await prepare()
    if (!buildStamp.holds()) await build()
    process.env.NODE_ENV ||= 'production'
    // In this very process: signals reach the server, and nothing stays behind when npm is stopped.
    await import(pathToFileURL(join(root, 'dist/server/index.js')).href)
    break
  case 'dev':
    await become(['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false', 'server/index.ts'], {
      NODE_ENV: 'development',
    })
    break
  case 'test':
    await become([...typescript, 'tests/run.ts'])
    break
  case 'measure':
    await become([...typescript, 'server/cli/measure.ts'])
    break
  case 'check:photos':
    await become([...typescript, 'tests/photographs/judge.ts'])
    break
  default:
    stop(`There is no "${mode}". Use start, dev, build, test, measure or check:photos.`)
}

async function prepare() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major < leastNode[0] || (major === leastNode[0] && minor < leastNode[1])) {
    stop(`Lapwing needs Node ${leastNode.join('.')} or newer; this is ${process.versions.node}.`)
  }
  if (!installStamp.holds()) await install()
}

async function install() {
  say('Installing packages. The first time this takes a few minutes.')
  // Vite and esbuild are wanted even where NODE_ENV says production.
  const code = await run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'])
  if (code !== 0) stop(installAdvice())
  installStamp.write()
}

/** better-sqlite3 is compiled where no ready-made build can be fetched, and says little when it can't be. */
function installAdvice() {
  const missing = ['python3', 'make', 'g++'].filter((tool) => !isOnPath(tool))
  if (missing.length === 0) return 'The packages could not be installed; what npm said stands above.'
  return (
    `The packages could not be installed. The database driver may have to be compiled on this machine, ` +
    `and that needs ${missing.join(', ')}. Debian: apt-get install ${missing.join(' ')}`
  )
}

function isOnPath(tool) {
  return (process.env.PATH ?? '').split(delimiter).some((folder) => existsSync(join(folder, tool)))
}

async function build() {
  say('Building.')
  const environment = { NODE_ENV: 'production' }
  const steps = [
    ['node_modules/vite/bin/vite.js', 'build', '--logLevel', 'warn'],
    ['server/cli/build-server.mjs'],
  ]
  for (const step of steps) {
    const code = await run(process.execPath, step, environment)
    if (code !== 0) stop('The build failed; what it said stands above.')
  }
  buildStamp.write()
}

/** Runs Node on the arguments in our place, and leaves as it leaves. */
async function become(args, environment = {}) {
  await prepare()
  process.exitCode = await run(process.execPath, [...args, ...rest], environment, 'inherit')
}

function say(sentence) {
  process.stderr.write(`${sentence}\n`)
}

function stop(sentence) {
  say(sentence)
  process.exit(1)
}
