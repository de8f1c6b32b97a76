import { describe, expect, it } from 'vitest'
import { seededNormal } from './seeded-normal.fixture'
import { type BasisDomain, type Rim, surfaceBasis } from './surface-basis'

const disc: BasisDomain = { kind: 'disc', radiusMm: 30 }
const block: BasisDomain = { kind: 'rectangle', cx: 3, cy: -2, halfWidthMm: 20, halfHeightMm: 5 }
const rims: { domain: BasisDomain; rim: Rim }[] = [
  { domain: disc, rim: { kind: 'outerCircle', cx: 0, cy: 0, radiusMm: 30 } },
  { domain: disc, rim: { kind: 'bore', cx: 4, cy: 1, radiusMm: 6 } },
  { domain: block, rim: { ...block, kind: 'block' } as Rim },
]

describe.each(rims)('functions over a $domain.kind with a rim of kind $rim.kind', ({ domain, rim }) => {
  const basis = surfaceBasis(domain, 11, [{ rim, lengthsMm: [1, 3] }])

  it('add up with their coefficients to the same, taken together or each by itself', () => {
    const normals = seededNormal(41, 1)
    const coefficients = Float64Array.from({ length: basis.size }, () => normals()[0])
    const together = basis.combine(coefficients)
    const functions = new Float64Array(basis.size)
    for (let i = 0; i < 50; i++) {
      const [x, y] = [8 * normals()[0], 3 * normals()[0]]
      basis.evaluate(x, y, functions, 0)
      const sum = functions.reduce((total, value, f) => total + coefficients[f]! * value, 0)
      expect(together(x, y)).toBeCloseTo(sum, 8)
    }
  })

  it('are nothing together when every coefficient is nothing', () => {
    expect(basis.combine(new Float64Array(basis.size))(1.2, 3.4)).toBe(0)
  })
})

describe('Zernike circle polynomials', () => {
  // Noll, J. Opt. Soc. Am. 66, 207 (1976), table I: the constant is 1, power is √3 (2ρ² − 1),
  // primary spherical √5 (6ρ⁴ − 6ρ² + 1).
  it('have the values of the published table', () => {
    const basis = surfaceBasis(disc, 4, [])
    const at = (rho: number) => {
      const out = new Float64Array(basis.size)
      basis.evaluate(30 * rho, 0, out, 0)
      return [...out]
    }
    for (const rho of [0, 0.3, 0.8, 1]) {
      const values = at(rho)
      expect(values[0]).toBeCloseTo(1, 12)
      expect(values[3]).toBeCloseTo(Math.sqrt(3) * (2 * rho ** 2 - 1), 12)
      expect(values[10]).toBeCloseTo(Math.sqrt(5) * (6 * rho ** 4 - 6 * rho ** 2 + 1), 12)
    }
  })
})
