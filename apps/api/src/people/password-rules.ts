import { PASSWORD_LENGTH, passwordLength } from '@coaxwain/contract'
import { COMMON_PARTS } from './common-parts'

export const PASSWORD_FAULTS = ['too-short', 'too-long', 'repeats', 'common', 'personal'] as const
export type PasswordFault = (typeof PASSWORD_FAULTS)[number]

const PRODUCT = 'coaxwain'
const LEAST_LETTERS_LEFT = 6
const LEAST_NAME_LENGTH = 4

const plain = (text: string): string => text.normalize('NFKC').toLowerCase()

/** The same few letters over and over. */
function isRepetition(password: string): boolean {
  const most = Math.floor(password.length / 2)
  for (let size = 1; size <= most; size += 1) {
    const part = password.slice(0, size)
    if (part.repeat(Math.ceil(password.length / size)).slice(0, password.length) === password) {
      return true
    }
  }
  return false
}

/** What is left when the parts that everybody uses are taken out, the longest first. */
function withoutParts(password: string, parts: readonly string[]): string {
  return [...parts]
    .sort((a, b) => b.length - a.length)
    .reduce((left, part) => left.split(part).join(''), password)
}

/**
 * Whether a password may be chosen. A list of whole passwords of this length hardly exists, so common
 * ones are known by their parts: too little is left when those are taken out. No rule of composition.
 */
export function passwordFault(
  password: string,
  about: { readonly email: string; readonly collections: readonly string[] },
): PasswordFault | null {
  const letters = passwordLength(password)
  if (letters < PASSWORD_LENGTH.least) return 'too-short'
  if (letters > PASSWORD_LENGTH.most) return 'too-long'
  const text = plain(password)
  if (isRepetition(text)) return 'repeats'
  if (withoutParts(text, COMMON_PARTS).replace(/[\s\d\p{P}]/gu, '').length < LEAST_LETTERS_LEFT) {
    return 'common'
  }
  const names = [PRODUCT, about.email.split('@')[0] ?? '', ...about.collections]
    .map(plain)
    .filter((n) => n.length >= LEAST_NAME_LENGTH)
  const left = withoutParts(text, names)
  return left !== text && left.length < LEAST_LETTERS_LEFT + LEAST_NAME_LENGTH ? 'personal' : null
}
