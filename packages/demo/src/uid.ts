import type { Uid } from '@coaxwain/shelf'

const PLAIN = /^[A-Za-z0-9-]+$/
const NAME_LENGTH = 21

/**
 * The outward id of a demo thing: its own name, filled up to 22 base64url characters, so that it can be
 * recognised in an address or a log. The last character is always `A`: 22 characters hold four bits more
 * than 128, and with those at zero the id comes back unchanged after being stored as 16 bytes.
 * Throws when the name is too long or holds other characters.
 */
export function demoUid(name: string): Uid {
  if (!PLAIN.test(name) || name.length > NAME_LENGTH) throw new Error(`no uid for "${name}"`)
  return `${name.padEnd(NAME_LENGTH, '_')}A`
}

/** The uid of a model of the demo catalogue, from its short name. */
export const modelUid = (slug: string): Uid => demoUid(`m-${slug}`)
