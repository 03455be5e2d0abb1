import { hash, verify } from '@node-rs/argon2'

/** The library's number for argon2id; its own enumeration does not exist at run time. */
const ARGON2ID = 2

/** OWASP's least parameters for argon2id. */
const PARAMETERS = {
  algorithm: ARGON2ID,
  memoryCost: 19_456,
  timeCost: 2,
  parallelism: 1,
} as const

export interface Passwords {
  hash(password: string): Promise<string>
  matches(hashed: string, password: string): Promise<boolean>
  /** As slow as a real comparison, for accounts that do not exist. */
  matchesNobody(password: string): Promise<false>
  isOutdated(hashed: string): boolean
}

const MARK = `m=${PARAMETERS.memoryCost},t=${PARAMETERS.timeCost},p=${PARAMETERS.parallelism}$`

const asTyped = (password: string): string => password.normalize('NFKC')

export async function createPasswords(): Promise<Passwords> {
  const nobody = await hash('nobody has this pass phrase', PARAMETERS)
  return {
    hash: (password) => hash(asTyped(password), PARAMETERS),
    matches: (hashed, password) => verify(hashed, asTyped(password)),
    async matchesNobody(password) {
      await verify(nobody, asTyped(password))
      return false
    },
    isOutdated: (hashed) => !hashed.includes(MARK),
  }
}
