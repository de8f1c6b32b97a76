import { mkdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { parseArgs } from 'node:util'
import { encodePhotograph } from './encode'
import { handTraces } from './hand-traces'
import { type PairTruth, pairTruthOf } from './pair-truth'
import { randomPair } from './random-pair'
import { type Family, families, randomScene } from './random-scenes'
import type { Scene } from './scene'
import { photoFileName, setUpFile } from './set-up-file'
import { type Truth, truthOf } from './truth'

/** Writes random scenes as files: `npx tsx tests/photographs/cli.ts --out DIR --families all --each 12 --seed 1 [--photos]`. */
interface Request {
  directory: string
  families: readonly Family[]
  each: number
  seed: number
  withPhotos: boolean
}

function requestedFamilies(list: string): readonly Family[] {
  if (list === 'all') return families
  return list.split(',').map((name) => {
    if (!families.includes(name as Family)) throw new Error(`No family is called ${name}.`)
    return name as Family
  })
}

function request(): Request {
  const { values } = parseArgs({
    options: {
      out: { type: 'string' },
      families: { type: 'string', default: 'all' },
      each: { type: 'string', default: '1' },
      seed: { type: 'string', default: '1' },
      photos: { type: 'boolean', default: false },
    },
  })
  if (!values.out) throw new Error('Say where to with --out DIR.')
  return {
    directory: values.out,
    families: requestedFamilies(values.families),
    each: Number(values.each),
    seed: Number(values.seed),
    withPhotos: values.photos,
  }
}

function writeJson(directory: string, name: string, content: unknown): void {
  writeFileSync(join(directory, name), JSON.stringify(content, null, 1))
}

async function writeScene(
  scene: Scene,
  { directory, withPhotos }: Request,
): Promise<Truth & { scene: Scene }> {
  const setUp = setUpFile(scene)
  writeJson(directory, `${scene.name}.setup.json`, setUp)
  const traces = handTraces(scene, scene.seed)
  writeFileSync(join(directory, `${scene.name}.traced.json`), JSON.stringify({ ...setUp, traces }))
  if (withPhotos) writeFileSync(join(directory, photoFileName(scene)), await encodePhotograph(scene))
  return { ...truthOf(scene), scene }
}

async function run(): Promise<void> {
  const asked = request()
  mkdirSync(asked.directory, { recursive: true })
  const truths: Record<string, Truth> = {}
  const pairs: Record<string, PairTruth> = {}
  for (const family of asked.families) {
    for (let seed = asked.seed; seed < asked.seed + asked.each; seed++) {
      if (family !== 'pair') {
        const scene = randomScene(family, seed)
        truths[scene.name] = await writeScene(scene, asked)
        continue
      }
      const pair = randomPair(seed)
      for (const scene of [pair.before, pair.after]) truths[scene.name] = await writeScene(scene, asked)
      pairs[`pair-${seed}`] = pairTruthOf(pair)
    }
  }
  writeJson(asked.directory, 'truth.json', truths)
  writeJson(asked.directory, 'pairs.json', pairs)
  process.stdout.write(`${Object.keys(truths).length} scenes in ${asked.directory}\n`)
}

await run()
