// @vitest-environment happy-dom
import '@/lib/i18n'
import { graduations } from '@shared/look/rule-scale'
import type { Tolerance } from '@shared/schemas/parts'
import { cleanup, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it } from 'vitest'
import { ToleranceRule, type ToleranceRuleProps } from './tolerance-rule'

afterEach(cleanup)

const plain: Tolerance = { kind: 'plain', max: { valueUm: 0.6, typed: '0.6 um' } }
const signed: Tolerance = {
  kind: 'signed',
  least: { valueUm: -0.6, typed: '-0.6 um' },
  most: { valueUm: -0.2, typed: '-0.2 um' },
}

function draw(props: Partial<ToleranceRuleProps> = {}) {
  render(
    <ToleranceRule
      size="list"
      widthPx={160}
      tolerance={plain}
      guardFactor={1}
      resultUm={0.464}
      expandedUncertaintyUm={0.041}
      verdict="conforms"
      draft={false}
      {...props}
    />,
  )
  const rule = screen.getByRole('img')
  return {
    sentence: rule.getAttribute('aria-label'),
    state: rule.getAttribute('data-state'),
    head: rule.querySelector('[data-head]')?.getAttribute('data-head') ?? null,
    gatesPx: [...rule.querySelectorAll('[data-gate]')].map((gate) => Number(gate.getAttribute('x1'))),
    bar: (name: string) =>
      [...rule.querySelectorAll(`[data-bar="${name}"]`)].map((bar) => {
        const from = Number(bar.getAttribute('x'))
        return [from, from + Number(bar.getAttribute('width'))]
      }),
    result: rule.querySelector('[data-testid="rule-result"]'),
    beyond: rule.querySelector('[data-testid="rule-beyond"]'),
    dotted: rule.querySelector('[data-testid="rule-result"] [stroke-dasharray]') !== null,
  }
}

describe('the tolerance rule', () => {
  it('puts the gate at five eighths of its width, whatever the tolerance', () => {
    expect(draw().gatesPx).toEqual([100])
    cleanup()
    expect(draw({ tolerance: { kind: 'plain', max: { valueUm: 3, typed: '3 um' } } }).gatesPx).toEqual([100])
  })

  it('says figure, uncertainty, limit and verdict in a sentence', () => {
    expect(draw().sentence).toBe('0.464 plus or minus 0.041 micrometres of 0.60: conforms.')
  })

  it('ends the solid zone at the tolerance less the guard band and hatches both sides of the gate', () => {
    const { bar } = draw()
    expect(bar('zone')).toEqual([[0, Math.round((0.559 / 0.96) * 160)]])
    expect(bar('guard')).toEqual([[Math.round((0.559 / 0.96) * 160), Math.round((0.641 / 0.96) * 160)]])
  })

  it('draws a filled head for conforms, an open one where neither is proven, a diamond beyond', () => {
    expect(draw().head).toBe('filled')
    cleanup()
    expect(draw({ resultUm: 0.61, verdict: 'neitherProven' }).head).toBe('open')
    cleanup()
    const out = draw({ resultUm: 0.75, verdict: 'doesNotConform' })
    expect(out.head).toBe('diamond')
    expect(out.bar('beyond')).toEqual([[100, 125]])
  })

  it('points off the scale for a result far beyond it', () => {
    const far = draw({ resultUm: 1.8, verdict: 'doesNotConform' })
    expect(far.state).toBe('farOut')
    expect(far.result).toBeNull()
    expect(far.beyond).not.toBeNull()
    expect(far.bar('beyond')).toEqual([[100, 160]])
  })

  it('shows a draft without any sign of a verdict, even far beyond the tolerance', () => {
    const draft = draw({ draft: true })
    expect(draft.head).toBeNull()
    expect(draft.sentence).toContain('a draft, no verdict yet')
    cleanup()
    const far = draw({ draft: true, resultUm: 1.8, verdict: 'doesNotConform' })
    expect(far.head).toBeNull()
    expect(far.bar('beyond')).toEqual([])
  })

  it('has no gate, no zone and no head where the drawing gives no tolerance', () => {
    const free = draw({ tolerance: { kind: 'none' }, verdict: 'noTolerance' })
    expect(free.gatesPx).toEqual([])
    expect(free.bar('zone')).toEqual([])
    expect(free.head).toBeNull()
    expect(free.sentence).toBe('0.464 plus or minus 0.041 micrometres: no tolerance on the drawing.')
  })

  it('dots the stem and gives no verdict where the uncertainty is not known', () => {
    const unsure = draw({ expandedUncertaintyUm: null, verdict: 'noVerdict' })
    expect(unsure.dotted).toBe(true)
    expect(unsure.head).toBe('open')
    expect(unsure.bar('guard')).toEqual([])
    expect(unsure.sentence).toBe('0.464 micrometres of 0.60: uncertainty not known, no verdict.')
  })

  it('shows gate and zone alone while nothing is read', () => {
    const empty = draw({ resultUm: null, expandedUncertaintyUm: null, verdict: 'noVerdict' })
    expect(empty.result).toBeNull()
    expect(empty.bar('zone')).toEqual([[0, 100]])
    expect(empty.sentence).toBe('Tolerance 0.60 micrometres: not read yet.')
  })

  it('draws a signed tolerance with two gates and the zone between them', () => {
    const { gatesPx, bar, head } = draw({ tolerance: signed, resultUm: -0.4, guardFactor: 0 })
    expect(gatesPx).toEqual([30, 130])
    expect(bar('zone')).toEqual([[30, 130]])
    expect(head).toBe('filled')
    cleanup()
    const low = draw({ tolerance: signed, resultUm: -0.68, guardFactor: 0, verdict: 'doesNotConform' })
    expect(low.bar('beyond')).toEqual([[10, 30]])
  })

  it('reads in the unit of the shop, and in µm where a band has no height', () => {
    expect(draw({ unit: 'nm' }).sentence).toBe('464 plus or minus 41 nanometres of 600: conforms.')
    cleanup()
    expect(draw({ unit: 'bands' }).sentence).toContain('micrometres')
    cleanup()
    expect(draw({ unit: 'bands', bandUm: 0.3 }).sentence).toBe(
      '1.55 plus or minus 0.14 bands of 2.00: conforms.',
    )
  })
})

describe('graduations', () => {
  it.each([
    [0.96, 220],
    [0.24, 220],
    [160, 272],
    [4.8, 140],
  ])('of a scale to %s over %s px stand at least 5.5 px apart in steps of 1, 2 or 5', (most, widthPx) => {
    const marks = graduations(0, most, widthPx)
    const step = marks[1].value - marks[0].value
    expect((step / most) * widthPx).toBeGreaterThanOrEqual(5.5 - 1e-9)
    expect([1, 2, 5]).toContain(Math.round(step / 10 ** Math.floor(Math.log10(step) + 1e-9)))
    expect(marks[0]).toEqual({ value: 0, major: true })
  })
})
