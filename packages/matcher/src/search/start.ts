import { jackOf, together, type PictureGive } from '@coaxwain/models'
import type { Material } from '@coaxwain/shelf'
import {
  isPictureForm,
  RF_SYSTEMS,
  TIER,
  type PictureForm,
  type Quality,
  type Sound,
} from '@coaxwain/signal'
import { systemCarries } from '../compile/accept'
import { carriersOf } from '../compile/carriers'
import { wireMhz } from '../compile/leave'
import { embedsSound, type Sig, type SigTable } from '../compile/sig'
import type { Way } from '../compile/way'
import type { Label, SoundState } from './label'

/** What the source plays by one row of one output, for this material; null when the row does not serve. */
function played(row: PictureGive, material: Material) {
  const scan = row.scan === 'same' ? material.scan : row.scan
  const colour = row.colour === 'same' ? material.colour : row.colour
  if (!scan || !colour) return null
  const recorded = material.scan === undefined || row.converts === true || scan === material.scan
  return recorded ? { scan, colour } : null
}

function soundOf(way: Way, material: Material): Sound {
  const gives = way.fn.gives.filter((g) => g.sound ?? g.rf?.some((r) => r.sound !== 'none'))
  const stereo = gives.some((g) => g.sound === 'stereo' || g.rf?.some((r) => r.sound === 'stereo'))
  const own: Sound = gives.length === 0 ? 'none' : stereo ? 'stereo' : 'mono'
  if (material.sound === undefined || own === 'none') return own
  return own === 'stereo' ? material.sound : material.sound === 'none' ? 'none' : 'mono'
}

/** The labels that the source starts with: each output, each way it can be set, sound or none. */
export function startLabels(ways: readonly Way[], material: Material, sigs: SigTable): Label[] {
  return ways.flatMap((way) =>
    signalsOf(way, material, sigs).flatMap(({ sig, stand }) => label(way, sig, stand, material)),
  )
}

function signalsOf(way: Way, material: Material, sigs: SigTable) {
  const give = way.out
  if (!give) return []
  const { device } = way.variant
  const form = jackOf(device, give.jack).form as PictureForm
  return (give.picture ?? []).flatMap((row) => {
    const plays = played(row, material)
    const base = together(way.stand, row.while)
    if (!plays || !base) return []
    const mhz = Math.min(wireMhz(form, plays.colour), way.fn.bandwidthMhz ?? Infinity)
    const sig: Omit<Sig, 'id'> = {
      form,
      ...plays,
      poorest: form,
      lumaMhz: mhz,
      protection: material.protection,
      shape: row.shape ?? material.shape ?? '4:3',
      direct: way.fn.storesFields !== true,
      delayMs: way.fn.delayMs ?? 0,
      carrier: null,
      sound: 'none',
    }
    if (form !== 'rf')
      return [
        { sig: sigs.intern({ ...sig, sound: ridingSound(way, form, material) }), stand: base },
      ]
    return (give.rf ?? []).flatMap((rf) => {
      const stand = together(base, rf.while)
      if (!stand || !systemCarries(rf.system, plays.scan)) return []
      const made = sigs.intern({
        ...sig,
        carrier: carriersOf(device, rf),
        lumaMhz: Math.min(mhz, RF_SYSTEMS[rf.system].videoMhz),
        sound: way.soundTo === 'picture' ? rf.sound : 'none',
      })
      return [{ sig: made, stand }]
    })
  })
}

const ridingSound = (way: Way, form: PictureForm, material: Material): Sound =>
  embedsSound(form) && way.soundTo === 'picture' ? soundOf(way, material) : 'none'

function label(way: Way, sig: Sig, stand: Label['stand'], material: Material): Label[] {
  const made: Omit<Label, 'sound'> & { sound: SoundState } = {
    way,
    sig,
    stand,
    sound: { kind: 'none' },
    aerial: null,
    depth: 0,
    prev: null,
    step: null,
    boxes: 0,
    pieces: 0,
    bought: 0,
    doubt: way.offers[0]?.doubt ?? 0,
  }
  if (way.soundTo !== null && way.soundTo !== 'picture') {
    const sound = soundOf(way, material)
    if (sound === 'none') return []
    made.sound = { kind: 'waits', sound: kindAt(sound, way.soundTo.circuits.length), at: made }
  }
  if (way.soundTo === 'picture' && sig.sound === 'none') return []
  return [made]
}

/** One wire of a stereo output carries half of it. */
const kindAt = (sound: Sound, wires: number): Sound =>
  sound === 'stereo' && wires === 1 ? 'half' : sound

/** The best form that a source gives for this material, to tell what `works fully` means. */
export function bestOf(
  ways: readonly Way[],
  material: Material,
): { quality: Quality; sound: boolean } {
  let quality: Quality = 'none'
  let sound = false
  for (const way of ways) {
    const form = way.out ? jackOf(way.variant.device, way.out.jack).form : 'sound'
    if (
      way.out &&
      isPictureForm(form) &&
      (way.out.picture ?? []).some((r) => played(r, material))
    ) {
      if (TIER[form] > TIER[quality]) quality = form
    }
    if (way.soundTo !== null && soundOf(way, material) !== 'none') sound = true
  }
  return { quality, sound }
}
