import type { Config } from 'tailwindcss'

/** Colours are CSS variables: `src/styles/tokens.css` gives them for paper and for the dark tracing table. */
const colour = (name: string) => `var(--${name})`

const size = (px: number, linePx: number, fontWeight?: string): [string, Record<string, string>] => [
  `${px / 16}rem`,
  fontWeight ? { lineHeight: `${linePx / px}`, fontWeight } : { lineHeight: `${linePx / px}` },
]

export default {
  content: ['./index.html', './src/**/*.{ts,tsx}'],
  theme: {
    colors: {
      transparent: 'transparent',
      current: 'currentColor',
      ground: colour('ground'),
      field: colour('field'),
      ink: colour('ink'),
      muted: colour('muted'),
      bottle: colour('bottle'),
      chestnut: colour('chestnut'),
      iris: colour('iris'),
      edge: colour('edge'),
      hairline: colour('hairline'),
      zone: colour('zone'),
      graduation: colour('graduation'),
      'tool-active': colour('tool-active'),
      'step-active': colour('step-active'),
      'on-ink': colour('on-ink'),
    },
    fontFamily: { sans: ['"Source Sans 3"', 'system-ui', 'sans-serif'] },
    fontWeight: { light: '300', normal: '400', semibold: '600' },
    fontSize: {
      result: size(50, 50, '300'),
      'result-tablet': size(56, 56, '300'),
      title: size(34, 40),
      headline: size(27, 34, '300'),
      section: size(15, 20, '600'),
      figure: size(15, 20),
      body: size(14, 20),
      second: size(13, 18),
      axis: size(12, 16),
      key: size(11, 14),
    },
    borderRadius: { none: '0', DEFAULT: '2px', full: '9999px' },
    screens: { desk: '1100px', wide: '1280px' },
    extend: { spacing: { margin: '9.5rem' } },
  },
} satisfies Config
