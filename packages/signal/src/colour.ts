/** How colour travels. The first eight are encoded on a subcarrier; the rest need no decoder. */
export const COLOURS = [
  'ntsc-m',
  'ntsc-j',
  'ntsc-443',
  'pal',
  'pal-60',
  'pal-m',
  'pal-n',
  'secam',
  'rgb',
  'ypbpr',
  'digital',
  'rgbi',
  'mono',
] as const

export type Colour = (typeof COLOURS)[number]

const ENCODED: ReadonlySet<Colour> = new Set([
  'ntsc-m',
  'ntsc-j',
  'ntsc-443',
  'pal',
  'pal-60',
  'pal-m',
  'pal-n',
  'secam',
])

/** Rides on a subcarrier and so needs the right decoder. */
export const isEncoded = (colour: Colour): boolean => ENCODED.has(colour)

/**
 * What a decoder for `accepted` makes of an encoded signal of the scan it follows.
 * A decoder that does not know the subcarrier leaves the picture grey and steady:
 * ITU-R BT.470 for the pairs that share a raster; common practice, no source, for the rest.
 * NTSC-M and NTSC-J share a subcarrier and differ in set-up only (common practice, no source).
 */
export function decode(signal: Colour, accepted: readonly Colour[]): 'colour' | 'monochrome' {
  if (signal === 'mono') return 'monochrome'
  const alike: readonly Colour[] =
    signal === 'ntsc-m' || signal === 'ntsc-j' ? ['ntsc-m', 'ntsc-j'] : [signal]
  return accepted.some((c) => alike.includes(c)) ? 'colour' : 'monochrome'
}
