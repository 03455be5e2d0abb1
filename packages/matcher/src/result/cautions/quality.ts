import { together } from '@coaxwain/models'
import { SCANS, type ScanId } from '@coaxwain/signal'
import { boxes, caution, display, named, source, type CautionInput, type Rule } from './rule'

const playsStereo = (c: CautionInput): boolean =>
  source(c).way.fn.gives.some((g) => g.sound === 'stereo')

const mixed = (c: CautionInput): boolean =>
  c.hookup.links.some((l) =>
    l.pieces.some((p) =>
      c.input.frame.drawer.pieces.some(
        (d) => d.piece.mixes && d.models.some((m) => m.model === p.model),
      ),
    ),
  )

const sound: Rule = (c) => {
  const { sound: heard } = c.hookup.sound
  if (heard === 'half') return [caution('sound-half')]
  if (heard === 'none') return c.input.frame.best.sound ? [caution('silent')] : []
  // A set with one loudspeaker that takes both channels loses nothing that it could have played.
  const arrives = c.input.wiring.found.step.soundIn
  if (heard === 'stereo' || arrives === 'stereo' || !playsStereo(c)) return []
  return [caution('sound-folded'), ...(mixed(c) ? [caution('both-plugs')] : [])]
}

const picture: Rule = (c) => {
  const { degradations, quality } = c.hookup.picture
  return [
    ...(quality === 'luma-only' ? [caution('luma-only')] : []),
    ...(degradations.includes('monochrome') && quality !== 'luma-only'
      ? [caution('colour-not-decoded', { colour: display(c).sig.core.colour })]
      : []),
    ...(degradations.includes('reduced-height') ? [caution('reduced-height')] : []),
    ...(degradations.includes('squeezed') ? [caution('squeezed')] : []),
  ]
}

/** 720 lines and more; 480 lines drawn twice as fast are no high definition. */
const isHighDefinition = (scan: ScanId): boolean => SCANS[scan].lineKhz > 33

/** Whether the output that is used can give high definition, however it is set now. */
const playsHighDefinition = (c: CautionInput): boolean =>
  (source(c).way.out?.picture ?? []).some((r) => r.scan !== 'same' && isHighDefinition(r.scan))

const lessDetail: Rule = (c) =>
  playsHighDefinition(c) && SCANS[display(c).sig.core.scan].lineKhz < 20
    ? [caution('less-detail')]
    : []

/** What comes by a digital socket is wide; an old tube is not. */
const wide: Rule = (c) =>
  source(c).sig.core.form === 'hdmi' && display(c).variant.device.display?.shape === '4:3'
    ? [caution('wide-picture')]
    : []

const FEW_LINES: readonly ScanId[] = ['262p60', '312p50']

/** Forms of sets that may be digital inside. */
const isFine = (form: string): boolean => ['component', 'hdmi', 'dvi', 'rgbhv'].includes(form)

/** Pictures of 262 or 312 lines are not what a flat set or a converter expects (common practice, no source). */
const fewLines: Rule = (c) => {
  const flat = display(c).variant.device.display?.screen === 'flat'
  const turned = boxes(c).some(
    (s) => isFine(s.sig.core.form) && s.way.into?.face.form !== s.sig.core.form,
  )
  const { way, stand } = source(c)
  const few = (way.out?.picture ?? []).some(
    (r) => r.scan !== 'same' && FEW_LINES.includes(r.scan) && together(r.while, stand) !== null,
  )
  return few && (flat || turned) ? [caution('few-lines')] : []
}

/** Games answer to the hand: delay and lines matter. */
const isGame = (c: CautionInput): boolean =>
  isPlayed(c) && source(c).variant.device.kind !== 'computer'

const isPlayed = (c: CautionInput): boolean =>
  ['console', 'computer'].includes(source(c).variant.device.kind) ||
  FEW_LINES.includes(source(c).sig.core.scan)

const delay: Rule = (c) => {
  const facts = display(c).variant.device.display
  const slow = facts?.screen === 'flat' || facts?.storesFields === true
  const late = (slow && isPlayed(c)) || (!display(c).sig.direct && isGame(c))
  return late ? [caution('delay')] : []
}

/** A converter that makes interlaced pictures makes no true 240-line ones. */
const interlacedOnly: Rule = (c) =>
  isGame(c) && playsHighDefinition(c) && SCANS[display(c).sig.core.scan].interlaced
    ? [caution('interlaced-only')]
    : []

/** Adding chroma to luma brings false colours on fine detail (common practice, no source). */
const crossColour: Rule = (c) =>
  boxes(c).some((s) => s.way.into?.face.form === 's-video' && s.sig.core.form === 'composite')
    ? [caution('cross-colour')]
    : []

/** The picture's own lead carries no sound. */
const soundApart: Rule = (c) => {
  const heard = c.hookup.sound.sound !== 'none'
  const details = { name: named(display(c)) }
  if (display(c).variant.device.display?.loudspeakers === 'none') {
    if (heard) return [caution('no-loudspeaker', details)]
    return playsSound(c) ? [caution('no-loudspeaker-here', details)] : []
  }
  if (!heard) return []
  return isManyWired(c) || isMute(c) ? [caution('sound-apart')] : []
}

/** The picture leaves its source by one plug of several wires, and none of them is for sound. */
function isManyWired({ hookup: { legs, links } }: CautionInput): boolean {
  const [first] = legs[0]?.links ?? []
  const from = links[first ?? -1]?.from
  const wires = links
    .filter((l) => l.from.unit === from?.unit && l.from.port === from.port)
    .flatMap((l) => l.circuits)
  return wires.length > 1 && wires.every((x) => !x.from.startsWith('audio'))
}

/** The earth of the aerial and that of the mains meet by the sound leads (common practice, no source). */
const humLoop: Rule = (c) => {
  const { aerial, speakers } = c.input.wiring.found
  return aerial && speakers?.way.variant.powered
    ? [caution('hum-loop', { name: speakers.way.variant.device.name })]
    : []
}

const playsSound = (c: CautionInput): boolean =>
  source(c).variant.device.jacks.some((j) => j.form === 'sound' && j.dir === 'out')

/** A DVI socket gives a picture alone. */
const isMute = (c: CautionInput): boolean => source(c).way.from?.face.form === 'dvi'

/** RGB must bring its sync along; component takes it from the luma wire. */
const sync: Rule = (c) =>
  boxes(c).some((s) => s.way.into?.face.form?.startsWith('rgb') && s.sig.core.form === 'component')
    ? [caution('sync-needed')]
    : []

/** A playback mode made for sets that follow 60 fields. */
const sixtyFields: Rule = (c) =>
  ['pal-60', 'ntsc-443'].includes(display(c).sig.core.colour) ? [caution('sixty-fields')] : []

/** White that drives the carrier to nothing breaks up the sound (47 CFR 73.682(a)(13) for the white level). */
const whiteBuzz: Rule = (c) =>
  boxes(c).flatMap((s) =>
    s.variant.device.controls
      .filter(
        (k) =>
          k.kind === 'trim' &&
          k.quantity === 'video-level' &&
          k.stands !== undefined &&
          k.aim !== undefined &&
          k.stands > k.aim,
      )
      .flatMap((k) => [
        caution('white-buzz', { name: named(s), control: k.label }),
        caution('one-load', { name: named(s) }),
      ]),
  )

/** A bilingual disc, or a voice and a band: one track is wanted and not both. */
const programmes: Rule = (c) =>
  c.input.frame.question.material.twoProgrammes === true ? [caution('two-programmes')] : []

/** A light gun looks for the bright spot of a tube (common practice, no source). */
const gun: Rule = (c) =>
  c.input.frame.question.demands.aim === 'light-gun' ? [caution('gun-needs-tube')] : []

/** What will be seen and heard that is less than it might be. */
export const QUALITY: readonly Rule[] = [
  picture,
  gun,
  programmes,
  sound,
  soundApart,
  humLoop,
  lessDetail,
  wide,
  fewLines,
  interlacedOnly,
  delay,
  crossColour,
  sync,
  sixtyFields,
  whiteBuzz,
]
