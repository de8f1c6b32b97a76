import { randomBytes } from 'node:crypto'
import { hash, type Options, verify } from '@node-rs/argon2'

// argon2id is the package's default algorithm; its enum can't be named from isolated modules.
const honestCost: Options = { memoryCost: 19_456, timeCost: 2, parallelism: 1 }
/** For tests alone: no file of a real shop ever holds a hash this cheap. */
const testCost: Options = { memoryCost: 8, timeCost: 1, parallelism: 1 }

export interface Passwords {
  hash: (password: string) => Promise<string>
  /** `stored` is null for an account that isn't there: the same work is done, and the answer is no. */
  verify: (stored: string | null, password: string) => Promise<boolean>
}

export function createPasswords(cost: 'honest' | 'test' = 'honest'): Passwords {
  const options = cost === 'honest' ? honestCost : testCost
  const nobodysHash = hash(randomBytes(24), options)
  return {
    hash: (password) => hash(normalised(password), options),
    verify: async (stored, password) => {
      const matches = await verify(stored ?? (await nobodysHash), normalised(password))
      return matches && stored !== null
    },
  }
}

/** The same keys give the same password on every keyboard and system. */
function normalised(password: string): string {
  return password.normalize('NFKC')
}
