import type { ColourShown, PictureShown, SoundHeard } from '@coaxwain/signal'

/** How the published table writes what is seen; the first pattern that fits counts. */
const PICTURES: readonly (readonly [RegExp, readonly PictureShown[]])[] = [
  [/^fine, (shadows|blacks)/u, ['black-off']],
  [/dots$/u, ['dots']],
  [/^(fine|stable|picture may appear|PAL-M: stable)/u, ['steady']],
  [/^rolls; many later sets lock/u, ['rolls', 'steady']],
  [/^rolls/u, ['rolls']],
  [/^negative image/u, ['negative']],
  [/^picture at edge of lock/u, ['edge-of-lock']],
  [/^noise/u, ['noise']],
  [/^(nothing|not tunable|none$)/u, ['nothing']],
  [/^(torn|no picture)/u, ['torn']],
  [/^greys come out/u, ['tinted']],
  [/^over-bright, clipped/u, ['clipped']],
  [/^may be refused/u, ['may-be-refused']],
  [/pumps/u, ['pumps']],
]

const COLOURS: readonly (readonly [RegExp, ColourShown])[] = [
  [/^fine/u, 'right'],
  [/^none/u, 'none'],
  [/^may/u, 'may-drop'],
  [/^wrong/u, 'wrong'],
  [/^8 or 16 colours/u, 'few'],
]

/** `fine` means wires of its own wherever the picture has video wires. */
const SOUNDS: readonly (readonly [RegExp, readonly SoundHeard[]])[] = [
  [/^fine/u, ['heard', 'apart']],
  [/^separate/u, ['apart']],
  [/^none/u, ['none']],
  [/^hiss/u, ['hiss']],
  [/^buzz/u, ['buzz']],
  [/^may buzz/u, ['may-buzz']],
  [/^mono/u, ['mono']],
  [/^distorted/u, ['distorted']],
  [/^loud noise/u, ['loud-noise']],
]

function meant<T>(table: readonly (readonly [RegExp, T])[], text: string): T {
  const found = table.find(([pattern]) => pattern.test(text))
  if (!found) throw new Error(`the table says ${text}, which is not understood`)
  return found[1]
}

/** A dash says nothing. */
const said = <T>(table: readonly (readonly [RegExp, T])[], text: string): T | null =>
  text === '-' ? null : meant(table, text)

export const picturesSaid = (text: string) => said(PICTURES, text)
export const colourSaid = (text: string) => said(COLOURS, text)
export const soundsSaid = (text: string) => said(SOUNDS, text)
