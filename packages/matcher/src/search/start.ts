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
import { holdsWherever, systemCarries } from '../compile/accept'
import { carriersOf } from '../compile/carriers'
import { wireMhz } from '../compile/leave'
import { embedsSound, lesserSound, type Core, type CoreTable, type Sig } from '../compile/signal'
import { leastDoubt, soundEnd, type Way } from '../compile/way'
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
export function startLabels(ways: readonly Way[], material: Material, cores: CoreTable): Label[] {
  return ways.flatMap((way) =>
    signalsOf(way, material, cores).flatMap((given) => startLabel(way, given, material)),
  )
}

/** A picture as the source gives it, and the positions that make it so. */
interface Given {
  readonly sig: Sig
  readonly stand: Label['stand']
}

/** Of rows of one look that hold under the same positions, the first. */
const firstOfLook = (rows: readonly PictureGive[]): PictureGive[] =>
  rows.filter(
    (row, i) =>
      !rows
        .slice(0, i)
        .some((r) => r.scan === row.scan && r.colour === row.colour && holdsWherever(r, row)),
  )

function signalsOf(way: Way, material: Material, cores: CoreTable): Given[] {
  const give = way.out
  if (!give) return []
  const form = jackOf(way.variant.device, give.jack).form as PictureForm
  return firstOfLook(give.picture ?? []).flatMap((row) => {
    const plays = played(row, material)
    const stand = together(way.stand, row.while)
    if (!plays || !stand) return []
    const { protection } = material
    const plain = { form, ...plays, protection }
    const sig: Omit<Sig, 'core'> = {
      poorest: form,
      lumaMhz: Math.min(wireMhz(form, plays.colour), way.fn.bandwidthMhz ?? Infinity),
      shape: row.shape ?? material.shape ?? '4:3',
      direct: way.fn.storesFields !== true,
      delayMs: way.fn.delayMs ?? 0,
      sound: ridingSound(way, form, material),
    }
    if (form === 'rf') return modulated(way, plain, { sig, stand }, cores)
    return [{ sig: { ...sig, core: cores.intern({ ...plain, carrier: null }) }, stand }]
  })
}

function modulated(
  way: Way,
  plain: Omit<Core, 'id' | 'kind' | 'carrier'>,
  given: { readonly sig: Omit<Sig, 'core'>; readonly stand: Label['stand'] },
  cores: CoreTable,
): Given[] {
  return (way.out?.rf ?? []).flatMap((rf) => {
    const stand = together(given.stand, rf.while)
    if (!stand || !systemCarries(rf.system, plain.scan)) return []
    const core = cores.intern({ ...plain, carrier: carriersOf(way.variant.device, rf) })
    const lumaMhz = Math.min(given.sig.lumaMhz, RF_SYSTEMS[rf.system].videoMhz)
    const sound = lesserSound(rf.sound, given.sig.sound)
    return [{ sig: { ...given.sig, core, lumaMhz, sound }, stand }]
  })
}

const ridingSound = (way: Way, form: PictureForm, material: Material): Sound =>
  embedsSound(form) && way.soundTo === 'picture' ? soundOf(way, material) : 'none'

function startLabel(way: Way, given: Given, material: Material): Label[] {
  const { sig } = given
  const made: Label & { sound: SoundState } = {
    way,
    ...given,
    sound: { kind: 'none' },
    aerial: null,
    depth: 0,
    prev: null,
    step: null,
    boxes: 0,
    pieces: 0,
    bought: 0,
    doubt: leastDoubt(way),
  }
  const end = soundEnd(way.soundTo)
  if (end) {
    const sound = soundOf(way, material)
    if (sound === 'none') return []
    made.sound = { kind: 'waits', sound: kindAt(sound, end.circuits.length), at: made }
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
