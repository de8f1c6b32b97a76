import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'

/** What the packages in place were installed from: the lock file, and the ABI they were compiled for. */
export const installStamp = stamp('node_modules/.lapwing-installed', () =>
  digest(['package-lock.json'], process.versions.modules),
)

const sources = [
  'src',
  'shared',
  'server',
  'tests/photographs',
  'public',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
]

/** What the build in place was made from. */
export const buildStamp = stamp('dist/.built-from', () => digest(sources.flatMap(filesIn), ''))

function stamp(file, current) {
  return {
    holds: () => existsSync(file) && readFileSync(file, 'utf8') === current(),
    write: () => {
      mkdirSync(dirname(file), { recursive: true })
      writeFileSync(file, current())
    },
  }
}

function digest(files, salt) {
  const hash = createHash('sha256').update(salt)
  for (const file of files) {
    const content = readFileSync(file)
    hash.update(`${file}\0${content.length}\0`).update(content)
  }
  return hash.digest('hex')
}

/** Every file of a path, always in the same order; tests don't go into a build. */
function filesIn(path) {
  if (!existsSync(path)) return []
  if (!statSync(path).isDirectory()) return /\.test\.tsx?$/.test(path) ? [] : [path]
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesIn(join(path, name)))
}
