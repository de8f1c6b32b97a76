/**
 * Functions that the height of a lapped face is built from: a complete set of smooth polynomials, low
 * degrees first, and terms that live near a rim only, since a rolled rim drops within millimetres and a
 * smooth polynomial would either miss it or ring over the whole face.
 */

/** A rim of the measured face, mm in the part frame. */
export type Rim =
  | { kind: 'outerCircle'; cx: number; cy: number; radiusMm: number }
  | { kind: 'bore'; cx: number; cy: number; radiusMm: number }
  | { kind: 'block'; cx: number; cy: number; halfWidthMm: number; halfHeightMm: number }

/** What the polynomials are scaled to. */
export type BasisDomain =
  | { kind: 'disc'; radiusMm: number }
  | { kind: 'rectangle'; cx: number; cy: number; halfWidthMm: number; halfHeightMm: number }

export interface SurfaceBasis {
  /** Number of functions. */
  readonly size: number
  /** How many of the first functions are free of any prior: piston, tilts, power and astigmatism. */
  readonly freeCount: number
  /** Total degree of each polynomial; −1 for rim terms. */
  readonly degreeOf: Int32Array
  /**
   * What the prior variance of the other functions is made of: variance of function j is
   * Σ scale²(k) × profile(k)[j]. Profiles are non-negative and zero on the free functions.
   */
  readonly components: readonly VarianceComponent[]
  /** Writes all functions at one place into `out` from `offset`. */
  evaluate(xMm: number, yMm: number, out: Float64Array, offset: number): void
  /** The sum of all functions times their coefficients, as a function of the place: quicker than each by itself. */
  combine(coefficients: Float64Array): (xMm: number, yMm: number) => number
}

export interface VarianceComponent {
  readonly name: string
  readonly profile: Float64Array
}

interface Block {
  size: number
  degreeOf?: Int32Array
  components: { name: string; profile: (index: number) => number }[]
  evaluate(xMm: number, yMm: number, out: Float64Array, offset: number): void
  combine(coefficients: Float64Array): (xMm: number, yMm: number) => number
}

const FREE_DEGREE = 2
const FREE_COUNT = 6
/** Roll-off of the smooth components' variance with degree: long, middling and short waves over the face. */
const WAVE_CUT_OFF_DEGREES = [4, 7, 11, 18]

/** Variance profiles of a complete set of polynomials: degrees 3 and 4 alone, then waves of falling length. */
function degreeComponents(degreeOf: Int32Array): Block['components'] {
  const alone = [3, 4].map((degree) => ({
    name: `degree ${degree}`,
    profile: (index: number) => (degreeOf[index] === degree ? 1 : 0),
  }))
  const waves = WAVE_CUT_OFF_DEGREES.map((cutOff) => ({
    name: `waves to degree ${cutOff}`,
    profile: (index: number) => {
      const n = degreeOf[index]!
      return n <= FREE_DEGREE ? 0 : Math.exp(-((n / cutOff) ** 2))
    },
  }))
  return [...alone, ...waves]
}

function degreesOf(maxDegree: number): Int32Array {
  const degreeOf = new Int32Array(((maxDegree + 1) * (maxDegree + 2)) / 2)
  let at = 0
  for (let n = 0; n <= maxDegree; n++) for (let k = 0; k <= n; k++) degreeOf[at++] = n
  return degreeOf
}

/**
 * Zernike circle polynomials up to a total degree, normalised to mean square 1 over the disc, in the order of
 * degree n and then azimuthal m. Formula: Noll, J. Opt. Soc. Am. 66, 207 (1976); radial part by its power
 * series in ρ², evaluated with the powers of (x + iy) so that no angle is taken.
 */
function zernikeBlock(maxDegree: number, radiusMm: number): Block {
  const series: { n: number; m: number; norm: number; powers: Float64Array }[] = []
  for (let n = 0; n <= maxDegree; n++) {
    for (let m = n % 2; m <= n; m += 2) {
      const half = (n - m) / 2
      const powers = new Float64Array(half + 1)
      // c_k multiplies ρ^(n−2k); divided by ρ^m it is a power series in ρ² of degree (n−m)/2.
      let c = binomial(n, half) * 1
      for (let k = 0; k <= half; k++) {
        powers[half - k] = c
        c *= -((half - k) * ((n + m) / 2 - k)) / ((k + 1) * (n - k))
      }
      const norm = m === 0 ? Math.sqrt(n + 1) : Math.sqrt(2 * (n + 1))
      series.push({ n, m, norm, powers })
    }
  }
  const cosM = new Float64Array(maxDegree + 1)
  const sinM = new Float64Array(maxDegree + 1)
  const size = ((maxDegree + 1) * (maxDegree + 2)) / 2
  return {
    size,
    degreeOf: degreesOf(maxDegree),
    components: degreeComponents(degreesOf(maxDegree)),
    evaluate(xMm, yMm, out, offset) {
      const x = xMm / radiusMm
      const y = yMm / radiusMm
      const rho2 = x * x + y * y
      cosM[0] = 1
      sinM[0] = 0
      for (let m = 1; m <= maxDegree; m++) {
        cosM[m] = cosM[m - 1]! * x - sinM[m - 1]! * y
        sinM[m] = cosM[m - 1]! * y + sinM[m - 1]! * x
      }
      let at = offset
      for (const { m, norm, powers } of series) {
        let radial = 0
        for (let k = powers.length - 1; k >= 0; k--) radial = radial * rho2 + powers[k]!
        radial *= norm
        out[at++] = radial * cosM[m]!
        if (m > 0) out[at++] = radial * sinM[m]!
      }
    },
    combine(coefficients) {
      // Polynomials of one m share their cosine and sine, so that their radial series add up to one.
      const terms = (maxDegree >> 1) + 1
      const cosSeries = new Float64Array((maxDegree + 1) * terms)
      const sinSeries = new Float64Array((maxDegree + 1) * terms)
      let at = 0
      for (const { m, norm, powers } of series) {
        const cosine = norm * coefficients[at++]!
        const sine = m > 0 ? norm * coefficients[at++]! : 0
        powers.forEach((power, k) => {
          const j = m * terms + k
          cosSeries[j] = cosSeries[j]! + cosine * power
          sinSeries[j] = sinSeries[j]! + sine * power
        })
      }
      return (xMm, yMm) => {
        const x = xMm / radiusMm
        const y = yMm / radiusMm
        const rho2 = x * x + y * y
        let cosine = 1
        let sine = 0
        let sum = 0
        for (let m = 0; m <= maxDegree; m++) {
          let ofCosine = 0
          let ofSine = 0
          for (let k = m * terms + ((maxDegree - m) >> 1); k >= m * terms; k--) {
            ofCosine = ofCosine * rho2 + cosSeries[k]!
            ofSine = ofSine * rho2 + sinSeries[k]!
          }
          sum += ofCosine * cosine + ofSine * sine
          const next = cosine * x - sine * y
          sine = cosine * y + sine * x
          cosine = next
        }
        return sum
      }
    },
  }
}

function binomial(n: number, k: number): number {
  let b = 1
  for (let i = 0; i < k; i++) b = (b * (n - i)) / (i + 1)
  return Math.round(b)
}

/** Products of normalised Legendre polynomials up to a total degree over a rectangle. */
function legendreBlock(maxDegree: number, domain: BasisDomain & { kind: 'rectangle' }): Block {
  const px = new Float64Array(maxDegree + 1)
  const py = new Float64Array(maxDegree + 1)
  return {
    size: ((maxDegree + 1) * (maxDegree + 2)) / 2,
    degreeOf: degreesOf(maxDegree),
    components: degreeComponents(degreesOf(maxDegree)),
    evaluate(xMm, yMm, out, offset) {
      legendre((xMm - domain.cx) / domain.halfWidthMm, px)
      legendre((yMm - domain.cy) / domain.halfHeightMm, py)
      let at = offset
      for (let n = 0; n <= maxDegree; n++) {
        for (let j = 0; j <= n; j++) out[at++] = px[n - j]! * py[j]!
      }
    },
    combine(coefficients) {
      return (xMm, yMm) => {
        legendre((xMm - domain.cx) / domain.halfWidthMm, px)
        legendre((yMm - domain.cy) / domain.halfHeightMm, py)
        let sum = 0
        let at = 0
        for (let n = 0; n <= maxDegree; n++) {
          for (let j = 0; j <= n; j++) sum += coefficients[at++]! * px[n - j]! * py[j]!
        }
        return sum
      }
    },
  }
}

/** Legendre polynomials of mean square 1 over −1 to 1 (Bonnet's recurrence). */
function legendre(t: number, out: Float64Array): void {
  let previous = 0
  let current = 1
  for (let n = 0; n < out.length; n++) {
    out[n] = current * Math.sqrt(2 * n + 1)
    const next = ((2 * n + 1) * t * current - n * previous) / (n + 1)
    previous = current
    current = next
  }
}

/** Harmonics of the angle round an outer rim that drops unevenly. */
const RIM_HARMONICS = 3

/**
 * Terms exp(−d/L), d the distance from the rim, at a few lengths L: even round the rim, and times the first
 * harmonics of the angle for a rim that drops unevenly. Sums of few exponentials come close to any drop that
 * dies away from the rim.
 */
function rimBlock(rim: Rim, lengthsMm: readonly number[], index: number): Block {
  const harmonics = rim.kind === 'outerCircle' ? RIM_HARMONICS : 0
  const evenCount = lengthsMm.length
  const components = [{ name: `rim ${index} even`, profile: (i: number) => (i < evenCount ? 1 : 0) }]
  if (harmonics > 0) {
    components.push({ name: `rim ${index} uneven`, profile: (i: number) => (i < evenCount ? 0 : 1) })
  }
  const size = evenCount * (1 + 2 * harmonics)
  return {
    size,
    components,
    combine(coefficients) {
      if (coefficients.every((c) => c === 0)) return () => 0
      const functions = new Float64Array(size)
      return (xMm, yMm) => {
        this.evaluate(xMm, yMm, functions, 0)
        let sum = 0
        for (let i = 0; i < size; i++) sum += coefficients[i]! * functions[i]!
        return sum
      }
    },
    evaluate(xMm, yMm, out, offset) {
      for (let l = 0; l < evenCount; l++) out[offset + l] = rimDrop(rim, xMm, yMm, lengthsMm[l]!)
      if (harmonics === 0 || rim.kind === 'block') return
      const r = distanceMm(rim, xMm, yMm) || 1
      const c1 = (xMm - rim.cx) / r
      const s1 = (yMm - rim.cy) / r
      let c = 1
      let s = 0
      let at = offset + evenCount
      for (let m = 1; m <= harmonics; m++) {
        const next = c * c1 - s * s1
        s = c * s1 + s * c1
        c = next
        for (let l = 0; l < evenCount; l++) {
          out[at++] = out[offset + l]! * c
          out[at++] = out[offset + l]! * s
        }
      }
    },
  }
}

/** Distance from the middle of a round rim; Math.hypot guards against overflow, which millimetres don't reach, and is slow. */
function distanceMm({ cx, cy }: { cx: number; cy: number }, xMm: number, yMm: number): number {
  return Math.sqrt((xMm - cx) ** 2 + (yMm - cy) ** 2)
}

function rimDrop(rim: Rim, xMm: number, yMm: number, lengthMm: number): number {
  switch (rim.kind) {
    case 'outerCircle':
      return Math.exp((distanceMm(rim, xMm, yMm) - rim.radiusMm) / lengthMm)
    case 'bore':
      return Math.exp((rim.radiusMm - distanceMm(rim, xMm, yMm)) / lengthMm)
    case 'block':
      return (
        Math.exp((Math.abs(xMm - rim.cx) - rim.halfWidthMm) / lengthMm) +
        Math.exp((Math.abs(yMm - rim.cy) - rim.halfHeightMm) / lengthMm)
      )
  }
}

/**
 * The functions for a face: polynomials up to `maxDegree` over the domain and rim terms for each rim at the
 * given lengths.
 */
export function surfaceBasis(
  domain: BasisDomain,
  maxDegree: number,
  rims: readonly { rim: Rim; lengthsMm: readonly number[] }[],
): SurfaceBasis {
  const blocks: Block[] = [
    domain.kind === 'disc' ? zernikeBlock(maxDegree, domain.radiusMm) : legendreBlock(maxDegree, domain),
    ...rims.map(({ rim, lengthsMm }, i) => rimBlock(rim, lengthsMm, i)),
  ]
  const size = blocks.reduce((sum, block) => sum + block.size, 0)
  const components: VarianceComponent[] = []
  const degreeOf = new Int32Array(size).fill(-1)
  let start = 0
  for (const block of blocks) {
    if (block.degreeOf) degreeOf.set(block.degreeOf, start)
    for (const { name, profile } of block.components) {
      const whole = new Float64Array(size)
      for (let i = 0; i < block.size; i++) whole[start + i] = profile(i)
      components.push({ name, profile: whole })
    }
    start += block.size
  }
  return {
    size,
    freeCount: FREE_COUNT,
    degreeOf,
    components,
    evaluate(xMm, yMm, out, offset) {
      let at = offset
      for (const block of blocks) {
        block.evaluate(xMm, yMm, out, at)
        at += block.size
      }
    },
    combine(coefficients) {
      let first = 0
      const sums = blocks.map((block) => {
        const sum = block.combine(coefficients.subarray(first, first + block.size))
        first += block.size
        return sum
      })
      return (xMm, yMm) => {
        let total = 0
        for (const sum of sums) total += sum(xMm, yMm)
        return total
      }
    },
  }
}
