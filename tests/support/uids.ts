/** A readable id of the right form: 22 letters. */
export const uidOf = (name: string): string => name.padEnd(21, '_').slice(0, 21) + 'A'
