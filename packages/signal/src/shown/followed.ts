import { decode, isEncoded, setUpFault, type Colour } from '../colour'
import { followsField, followsLine, type Deflection, type ScanId } from '../scan'
import type { ColourShown, PictureShown } from './shown'
import type { Why } from './why'

/** What of a picture a tube and its decoder must follow. */
export interface Picture {
  readonly scan: ScanId
  readonly colour: Colour
}

export interface Screen {
  readonly deflection: Deflection
  /** What its decoder knows; an input without decoder lists what it takes as it is. */
  readonly colours: readonly Colour[]
}

/** What a screen makes of a picture that has reached it whole. */
export interface Followed {
  readonly picture: PictureShown
  readonly colour: ColourShown
  readonly harms: boolean
  readonly why: readonly Why[]
}

/**
 * Scanning first, then colour: a wrong line rate tears, a wrong field rate rolls, an unknown subcarrier leaves
 * the picture grey. A deflection of one fixed rate may be harmed by another.
 */
export function follow({ scan, colour }: Picture, screen: Screen): Followed {
  const { deflection, colours } = screen
  const seen = colourOf(colour, colours)
  if (!followsLine(deflection, scan)) {
    return { picture: 'torn', colour: 'none', harms: deflection.fixed, why: ['other-line-rate'] }
  }
  if (!followsField(deflection, scan)) {
    return { ...seen, picture: 'rolls', harms: false, why: ['other-field-rate', ...seen.why] }
  }
  const black = colours.some((c) => c === colour) ? null : blackOf(colour, colours)
  if (black) return { ...seen, picture: 'black-off', harms: false, why: ['set-up', ...seen.why] }
  return { ...seen, picture: 'steady', harms: false }
}

function colourOf(
  colour: Colour,
  colours: readonly Colour[],
): { readonly colour: ColourShown; readonly why: readonly Why[] } {
  if (decode(colour, colours) === 'colour') {
    return { colour: 'right', why: [isEncoded(colour) ? 'same-system' : 'no-subcarrier'] }
  }
  return { colour: 'none', why: colour === 'mono' ? ['luma-alone'] : ['other-colour'] }
}

const blackOf = (colour: Colour, colours: readonly Colour[]): 'crushed' | 'greyed' | null =>
  colours.map((c) => setUpFault(colour, c)).find((fault) => fault !== null) ?? null
