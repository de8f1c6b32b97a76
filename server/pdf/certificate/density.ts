/** How close a certificate is set. The more a snapshot says, the closer, so that it stays on one page. */
export interface Density {
  /** Greatest height of photograph and map, units. */
  picture: number
  /** Height of the profile's plot, units. */
  plot: number
  /** Shares of the usual sizes. */
  text: number
  gap: number
}

/** From roomy to tight: pictures and gaps give way first, and text last. */
const steps: readonly Density[] = [
  { picture: 154, plot: 57, text: 1, gap: 1 },
  { picture: 138, plot: 50, text: 1, gap: 0.88 },
  { picture: 122, plot: 43, text: 0.96, gap: 0.76 },
  { picture: 106, plot: 37, text: 0.9, gap: 0.66 },
  { picture: 92, plot: 33, text: 0.75, gap: 0.56 },
  { picture: 78, plot: 28, text: 0.5, gap: 0.45 },
]

/** From 0, roomy, to 1, tight. */
function densityAt(tightness: number): Density {
  const along = tightness * (steps.length - 1)
  const from = Math.min(steps.length - 2, Math.floor(along))
  const share = along - from
  const between = (name: keyof Density) => steps[from][name] * (1 - share) + steps[from + 1][name] * share
  return { picture: between('picture'), plot: between('plot'), text: between('text'), gap: between('gap') }
}

const halvings = 5

/** What is composed at the roomiest density that `compose` doesn't refuse with null; null where it refuses them all. */
export function roomiest<Composed>(compose: (density: Density) => Composed | null): Composed | null {
  const usual = compose(densityAt(0))
  if (usual !== null) return usual
  let best = compose(densityAt(1))
  if (best === null) return null
  let tooRoomy = 0
  let tight = 1
  for (let i = 0; i < halvings; i += 1) {
    const middle = (tooRoomy + tight) / 2
    const composed = compose(densityAt(middle))
    if (composed === null) {
      tooRoomy = middle
    } else {
      tight = middle
      best = composed
    }
  }
  return best
}
