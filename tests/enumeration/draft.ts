import { checkHookup, type Checked, type Finding } from '@coaxwain/checker'
import type { Hookup, Leg, Link, SeenPicture, Setting, Stop, Uid } from '@coaxwain/shelf'
import type { Bench } from './bench'
import { rankOf, scoreOf } from './vectors'

/** A hookup before anybody has said what it shows, sounds like and costs. */
export interface Draft {
  readonly picture: readonly Stop[]
  readonly pictureLinks: readonly Link[]
  /** Units on the way of the sound, where it has leads of its own. */
  readonly sound: readonly Stop[]
  readonly soundLinks: readonly Link[]
  readonly settings: readonly Setting[]
  /** The unit whose loudspeakers speak. */
  readonly from: Uid | null
}

const NOTHING_SEEN: SeenPicture = { colour: false, quality: 'none', lumaMhz: 0, degradations: [] }
const NO_CLAIM = -1

/** A hookup that claims nothing. */
function neutral(draft: Draft): Hookup {
  const { picture, pictureLinks, sound, soundLinks, settings, from } = draft
  const own = pictureLinks.map((_, i) => i)
  const others = soundLinks.map((_, i) => pictureLinks.length + i)
  const legs: Leg[] = [{ purpose: 'picture', stops: picture, links: own }]
  if (soundLinks.length > 0) legs.push({ purpose: 'sound', stops: sound, links: others })
  return {
    legs,
    links: [...pictureLinks, ...soundLinks],
    settings,
    picture: NOTHING_SEEN,
    sound: { sound: 'none', from },
    worksFully: false,
    cautions: [],
    axes: {
      picture: NO_CLAIM,
      sound: NO_CLAIM,
      boxes: NO_CLAIM,
      pieces: NO_CLAIM,
      doubt: NO_CLAIM,
      disturbance: 0,
    },
  }
}

const isClaim = ({ code }: Finding): boolean => code.startsWith('claims-')

export interface Judged {
  /** Faults other than what a hookup that claims nothing cannot but claim wrongly. */
  readonly faults: readonly Finding[]
  readonly picture: SeenPicture | null
  /** The hookup with the right claims; null where it has faults. */
  readonly hookup: Hookup | null
}

/** Has a draft judged, and judged again with what was found out claimed. */
export function judge({ snapshot, question }: Bench, draft: Draft): Judged {
  const bare = neutral(draft)
  const checked = checkHookup(snapshot, question, bare)
  const faults = checked.findings.filter((f) => !isClaim(f))
  if (faults.length > 0 || !checked.picture)
    return { faults, picture: checked.picture, hookup: null }
  const hookup = claiming(bare, checked, checked.picture)
  const again = checkHookup(snapshot, question, hookup)
  if (!again.ok) {
    throw new Error(`the check of right claims found ${JSON.stringify(again.findings)}`)
  }
  return { faults, picture: checked.picture, hookup }
}

function claiming(bare: Hookup, checked: Checked, picture: SeenPicture): Hookup {
  const told = (code: string, detail: string): number =>
    Number(checked.findings.find((f) => f.code === code)?.details[detail])
  const silent = checked.sound === 'none'
  return {
    ...bare,
    picture,
    sound: { sound: checked.sound, from: silent ? null : bare.sound.from },
    axes: {
      picture: scoreOf(picture),
      sound: rankOf(checked.sound),
      boxes: told('claims-effort', 'boxes'),
      pieces: told('claims-effort', 'pieces'),
      doubt: told('claims-doubt', 'doubt'),
      disturbance: 0,
    },
  }
}
