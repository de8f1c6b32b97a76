import { randomBytes } from 'node:crypto'

const alphabet = '0123456789abcdefghjkmnpqrstvwxyz'
const idLength = 20

/** A name for a new row: 100 random bits in letters that survive reading aloud, file names and addresses. */
export function newId(): string {
  return Array.from(randomBytes(idLength), (byte) => alphabet[byte % alphabet.length]).join('')
}
