import { describe, expect, it } from 'vitest'
import { newCheckCode, readCheckCode } from './check-code'

describe('a check code', () => {
  it('is sixteen letters and digits in groups of four, another each time', () => {
    const codes = Array.from({ length: 200 }, newCheckCode)
    for (const code of codes) expect(code).toMatch(/^([0-9A-HJKMNP-TV-Z]{4}-){3}[0-9A-HJKMNP-TV-Z]{4}$/)
    expect(new Set(codes).size).toBe(200)
  })

  it('is read however it is typed: small, without hyphens, with look-alikes', () => {
    expect(readCheckCode(' 7kq4 mr2x-10dt b5hn ')).toBe('7KQ4-MR2X-10DT-B5HN')
    expect(readCheckCode('7KQ4MR2XIODTB5HN')).toBe('7KQ4-MR2X-10DT-B5HN')
  })

  it('is none when it is too short, too long or holds what no code holds', () => {
    expect(readCheckCode('7KQ4-MR2X')).toBeNull()
    expect(readCheckCode('7KQ4-MR2X-10DT-B5HN-0000')).toBeNull()
    expect(readCheckCode('7KQ4-MR2X-10DT-B5H!')).toBeNull()
    expect(readCheckCode('')).toBeNull()
  })
})
