import { spawnSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import sharp from 'sharp'
import { afterEach, describe, expect, it } from 'vitest'
import { isRefused, measureFile } from './measure-file'

const practice = (name: string) => `tests/fixtures/practice/${name}`
const openBands = practice('open-bands-1.traced.json')

let folder: string | undefined
afterEach(() => {
  if (folder) rmSync(folder, { recursive: true })
  folder = undefined
})

/** A file like the practice one, but for what is changed in it. */
function writeChanged(change: (file: Record<string, unknown>) => void, from = openBands): string {
  folder ??= mkdtempSync(join(tmpdir(), 'lapwing-measure-'))
  const file = JSON.parse(readFileSync(from, 'utf8'))
  change(file)
  return writeText(JSON.stringify(file))
}

function writeText(text: string): string {
  folder ??= mkdtempSync(join(tmpdir(), 'lapwing-measure-'))
  const path = join(folder, 'changed.json')
  writeFileSync(path, text)
  return path
}

async function measured(path: string) {
  const line = await measureFile(path)
  if (isRefused(line)) throw new Error(line.error.message)
  return line
}

async function refusal(path: string) {
  const line = await measureFile(path)
  if (!isRefused(line)) throw new Error('It was measured.')
  return line.error
}

describe('measuring a traced file', () => {
  it('gives the figures that people’s scripts read, by their names', async () => {
    const line = await measured(openBands)
    expect(Object.keys(line)).toEqual([
      'file',
      'mode',
      'bandUm',
      'flatness',
      'expandedUncertaintyUm',
      'sagittaUm',
      'form',
      'notStated',
      'warnings',
    ])
    expect(line).toMatchObject({ file: openBands, mode: 'traced', bandUm: 0.316408, warnings: [] })
    expect(line.sagittaUm).toBeGreaterThan(0)
    expect(line.flatness.leastSquaresUm).toBeCloseTo(line.flatness.peakUm + line.flatness.valleyUm, 12)
  })

  it('leaves high or hollow open without a press test', async () => {
    const line = await measured(writeChanged((file) => delete file.pressTest))
    expect(line).toMatchObject({ sagittaUm: null, form: 'unknown' })
  })

  it('counts the uncertainties that the file states, and lists those that it doesn’t', async () => {
    const plain = await measured(openBands)
    const stated = await measured(
      writeChanged((file) => {
        Object.assign(file, { referenceFlatFormUm: 0.1, viewingAngleUncertaintyDeg: 1, spare: 'left alone' })
      }),
    )
    expect(plain.notStated).toEqual(expect.arrayContaining(['referenceFlat', 'viewingAngle']))
    expect(stated.notStated).not.toContain('referenceFlat')
    expect(stated.notStated).not.toContain('viewingAngle')
    // Rectangular ± 0.1 µm: 2 × 0.1 ÷ √3 at the least.
    expect(stated.expandedUncertaintyUm).toBeGreaterThan(0.115)
    expect(stated.flatness).toEqual(plain.flatness)
  })

  it('takes the size of a turned photograph as it is seen', async () => {
    const path = writeChanged((file) => {
      file.photo = 'photo.jpg'
    }, practice('tilted-1.traced.json'))
    // The photograph’s middle tells on which side of the face the camera stood.
    const picture = (width: number, height: number, orientation: number) =>
      sharp({ create: { width, height, channels: 3, background: '#888' } })
        .withMetadata({ orientation })
        .jpeg()
        .toFile(join(folder ?? '', 'photo.jpg'))
    await picture(1600, 1200, 1)
    const upright = await measured(path)
    await picture(1200, 1600, 6)
    const turned = await measured(path)
    expect(turned.flatness).toEqual(upright.flatness)
    expect(upright.warnings).toEqual([])
  })

  it('warns that perspective is left out when a tilted face’s photograph isn’t there', async () => {
    const line = await measured(writeChanged(() => {}, practice('tilted-1.traced.json')))
    expect(line.warnings).toEqual([expect.stringMatching(/perspective is left out/)])
  })
})

describe('a file that can’t be measured', () => {
  it('says which key is wrong and how', async () => {
    const broken = await refusal(
      writeChanged((file) => {
        file.lightSource = { wavelengthNm: 63.28 }
        file.outline = { kind: 'circle', cx: 1, cy: 1, r: -4, diameterMm: 40 }
      }),
    )
    expect(broken.code).toBe('invalidFile')
    expect(broken.message).toMatch(/lightSource\.wavelengthNm: must lie from 300 to 1100\./)
    expect(broken.message).toMatch(/outline\.r: /)
  })

  it('is told apart: missing, not JSON, not traced', async () => {
    expect((await refusal('nowhere.json')).code).toBe('fileMissing')
    expect((await refusal(writeText('{"photo": '))).code).toBe('notJson')
    expect((await refusal(writeChanged((file) => delete file.traces))).code).toBe('notTraced')
  })

  it('for want of bands or numbers is refused with what is missing', async () => {
    const two = await refusal(
      writeChanged((file) => {
        file.traces = (file.traces as unknown[]).slice(0, 2)
      }),
    )
    const unnumbered = await refusal(
      writeChanged((file) => {
        file.traces = (file.traces as object[]).map((trace) => ({ ...trace, order: null }))
      }),
    )
    expect(two).toEqual({ code: 'tooFewBands', message: expect.stringMatching(/^2 dark bands are traced/) })
    expect(unnumbered.code).toBe('orderMissing')
  })

  it('with orders against its press test is refused, since one of them is wrong', async () => {
    const against = await refusal(
      writeChanged((file) => {
        file.traces = (file.traces as { order: number }[]).map((trace) => ({ ...trace, order: -trace.order }))
      }),
    )
    expect(against.code).toBe('orderAgainstPressArrow')
  })
})

describe('the command', () => {
  it('prints one JSON object a line in the order given, does the others too, and ends with 1 on a refusal', () => {
    const files = [openBands, 'nowhere.json', practice('block-1.traced.json')]
    const run = (names: string[]) =>
      spawnSync(process.execPath, ['--import', 'tsx', 'server/cli/measure.ts', ...names], {
        encoding: 'utf8',
      })
    const { stdout, status } = run(files)
    const lines = stdout
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line))
    expect(lines.map(({ file }) => file)).toEqual(files)
    expect(lines.map((line) => 'error' in line)).toEqual([false, true, false])
    expect(status).toBe(1)
    expect(run([openBands]).status).toBe(0)
  }, 60_000)
})
