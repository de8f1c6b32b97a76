import { randomInt } from 'node:crypto'

/** Crockford's letters and digits: none is taken for another when read aloud or typed. */
const alphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'
const length = 16

/** Eighty random bits as groups of four: nobody comes upon one by trying. */
export function newCheckCode(): string {
  const letters = Array.from({ length }, () => alphabet[randomInt(alphabet.length)]).join('')
  return grouped(letters)
}

/** A code as it is kept, however it was typed; null when it can't be one. */
export function readCheckCode(typed: string): string | null {
  const letters = typed.toUpperCase().replace(/[\s-]/g, '').replaceAll('O', '0').replace(/[IL]/g, '1')
  if (letters.length !== length || [...letters].some((letter) => !alphabet.includes(letter))) return null
  return grouped(letters)
}

function grouped(letters: string): string {
  return (letters.match(/.{4}/g) ?? []).join('-')
}
