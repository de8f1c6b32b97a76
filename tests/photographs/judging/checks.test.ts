import { describe, expect, it } from 'vitest'
import { checkAgainst, checkTargets } from './checks'
import { type JudgedFile, judgeLine } from './judged-file'
import { summarize } from './summary'

const fine: JudgedFile = {
  name: 'fine',
  refusal: null,
  errorBands: 0.002,
  expandedUncertaintyBands: 0.01,
  covered: true,
  signRight: true,
  warnings: [],
}
const twenty = (...odd: Partial<JudgedFile>[]) =>
  summarize(Array.from({ length: 20 }, (_, i) => ({ ...fine, ...odd[i] })))
const missed = (summary: ReturnType<typeof twenty>) =>
  checkTargets(summary)
    .filter(({ passed }) => !passed)
    .map(({ says }) => says.split(':')[0])

describe('the judge of measured practice files', () => {
  it('is content when every target is met', () => {
    expect(missed(twenty())).toEqual([])
  })

  it.each([
    ['Largest error, bands', { errorBands: -0.031 }],
    ['Sagittas of the wrong sign', { signRight: false }],
    ['Refused', { refusal: 'tooFewBands', errorBands: null, expandedUncertaintyBands: null }],
  ] as const)('misses "%s" by one file', (name, odd) => {
    expect(missed(twenty(odd))).toContain(name)
  })

  it('allows a warning on one in twenty, and a truth outside U on one in twenty', () => {
    const warned = { warnings: ['Look.'] }
    expect(missed(twenty(warned, { covered: false }))).toEqual([])
    expect(missed(twenty(warned, warned))).toEqual(['Share with warnings'])
    expect(missed(twenty({ covered: false }, { covered: false }))).toEqual(['Share of truths within U'])
  })

  it('takes no figures at all for the worst of figures', () => {
    const refused = { refusal: 'x', errorBands: null, expandedUncertaintyBands: null, covered: false }
    const all = missed(summarize([{ ...fine, ...refused }]))
    expect(all).toContain('Median error, bands')
    expect(all).toContain('Median U, bands')
  })

  it('fails against recorded figures only on what got worse, or went missing', () => {
    const worse = (now: Parameters<typeof checkAgainst>[0], then: Parameters<typeof checkAgainst>[1]) =>
      checkAgainst(now, then).filter(({ passed }) => !passed)
    const poor = twenty({ errorBands: 0.05, signRight: false })
    expect(worse(poor, poor)).toEqual([])
    expect(worse(twenty(), poor)).toEqual([])
    expect(worse(poor, twenty())).toHaveLength(2)
    expect(worse({ ...twenty(), files: 19 }, twenty())).toHaveLength(1)
  })

  it('counts a sagitta that is left open in spite of a press test as wrong', () => {
    const file = 'tests/fixtures/practice/open-bands-1.traced.json'
    const line = {
      file,
      mode: 'traced' as const,
      bandUm: 0.3,
      flatness: { minimumZoneUm: 0.3, leastSquaresUm: 0.3, peakUm: 0.1, valleyUm: 0.2, rmsUm: 0.1 },
      expandedUncertaintyUm: 0.003,
      sagittaUm: null,
      form: 'unknown' as const,
      notStated: [],
      warnings: [],
    }
    const judged = judgeLine('open-bands-1', line, { minimumZoneUm: 0.306, bandUm: 0.3, convex: true })
    expect(judged).toMatchObject({ signRight: false, covered: false })
    expect(judged.errorBands).toBeCloseTo(-0.02, 9)
  })
})
