// Practice photographs drawn from physics by a program that shares no code with this one, with known heights.
import { readFileSync } from 'node:fs'
import { fromMeasureFile, readTraces } from '@shared/metrology'
import { measureFileSchema } from '@shared/schemas/measure-file'
import { describe, expect, it } from 'vitest'

describe('practice photographs traced by hand', () => {
  const folder = 'tests/fixtures/practice'
  const truth = JSON.parse(readFileSync(`${folder}/truth.json`, 'utf8'))

  it.each(Object.keys(truth))('%s is read within 0.012 band and its U', (name) => {
    const file = measureFileSchema.parse(JSON.parse(readFileSync(`${folder}/${name}.traced.json`, 'utf8')))
    const [widthPx, heightPx] = truth[name].photoPx
    const outcome = readTraces(fromMeasureFile(file, { widthPx, heightPx }))
    if (outcome.kind === 'refused') throw new Error(outcome.findings.map((f) => f.code).join(', '))
    const { result } = outcome
    const error = Math.abs(result.flatness.minimumZoneUm - truth[name].minimumZoneUm)
    expect(error / truth[name].bandUm).toBeLessThan(0.012)
    expect(error).toBeLessThan(result.expandedUncertaintyUm)
    expect(result.terms.sagittaUm! > 0).toBe(truth[name].convex)
    expect(result.findings.filter((f) => f.severity !== 'remark')).toEqual([])
  })
})
