/** Colours of print, on white paper. */
export const inks = {
  ink: '#12211c',
  muted: '#56615b',
  bottle: '#1f5b49',
  chestnut: '#a9562b',
  graduation: '#838a83',
  hairline: '#dad8d0',
  zone: '#b5cabd',
  paper: '#ffffff',
  casing: '#15181a',
} as const
