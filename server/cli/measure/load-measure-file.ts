import { readFile } from 'node:fs/promises'
import { dirname, resolve } from 'node:path'
import { fromMeasureFile, type TracedReading } from '@shared/metrology'
import { type MeasureFile, measureFileSchema } from '@shared/schemas/measure-file'
import { sentence } from '../../i18n'
import { readPictureHeader } from '../../storage/picture-header'
import { issuesSentence } from './sentences'

/** A file that can't be measured, and why. */
export class MeasureRefusal extends Error {
  readonly code: string

  constructor(code: string, message: string) {
    super(message)
    this.name = 'MeasureRefusal'
    this.code = code
  }
}

/** The engine's input from a file, with the size of the photograph beside it where that is there. */
export async function loadMeasureFile(path: string): Promise<TracedReading> {
  const file = parseMeasureFile(await readText(path))
  if (!file.traces) throw new MeasureRefusal('notTraced', sentence('measureFile.notTraced'))
  return fromMeasureFile(file, await photoSize(path, file))
}

async function readText(path: string): Promise<string> {
  try {
    return await readFile(path, 'utf8')
  } catch (error) {
    const reason = (error as NodeJS.ErrnoException).code ?? 'unreadable'
    throw new MeasureRefusal('fileMissing', sentence('measureFile.unreadable', { reason }))
  }
}

function parseMeasureFile(text: string): MeasureFile {
  const parsed = measureFileSchema.safeParse(parseJson(text), { reportInput: true })
  if (parsed.success) return parsed.data
  throw new MeasureRefusal('invalidFile', issuesSentence(parsed.error.issues))
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text.replace(/^\uFEFF/, ''))
  } catch (error) {
    throw new MeasureRefusal('notJson', sentence('measureFile.notJson', { reason: (error as Error).message }))
  }
}

async function photoSize(path: string, file: MeasureFile): Promise<TracedReading['photo']> {
  if (!file.photo) return null
  const header = await readPictureHeader(resolve(dirname(path), file.photo))
  return header && { widthPx: header.widthPx, heightPx: header.heightPx }
}
