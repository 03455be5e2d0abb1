import type { PictureGive } from '@coaxwain/models'
import type { Chain, Hookup, Question, SeenPicture, Setting, Snapshot, Uid } from '@coaxwain/shelf'
import { SOUND_RANK, TIER } from '@coaxwain/signal'
import { benchOf } from '../bench'
import { checkBench, type Checked } from '../check-hookup'
import type { Finding } from '../finding'
import { ShelfView } from '../shelf-view'
import { buildHookup, type Draft } from './build'
import { layChain, type Laid } from './lay'
import { byCarrier, pathsAlong, type Path } from './paths'
import { fillStands, openSwitches, settingOf, type OpenSwitch } from './stands'
import { isTangled } from './tangle'

/** A chain made into a hookup: what a person left out is filled in with what does best. */
export interface Wired {
  readonly view: ShelfView
  readonly hookup: Hookup
  readonly laid: readonly Laid[]
  readonly path: Path
  readonly row: PictureGive | null
  /** Settings that nobody named. */
  readonly filled: readonly Setting[]
  readonly checked: Checked
  /** Too many rings to follow. */
  readonly tangled: boolean
}

/** Hookups that are looked at before the best of them is taken. */
const MOST_TRIALS = 240
const MOST_FOLLOWED = 8
const MOST_DRAFTS = 60

/** Finds out what a chain made by hand is as a hookup; knows nothing of how a better one is found. */
export function wireChain(snapshot: Snapshot, question: Question, chain: Chain): Wired {
  const view = new ShelfView(snapshot)
  const tangled = isTangled(chain, view)
  const laid = tangled ? [] : layChain(chain, view)
  const named = chain.settings.map((s) => settingOf(view.device(s.unit), s))
  const paths = pathsAlong(laid, question, view).flatMap((p) => byCarrier(p, named))
  const bench = new Trials(question, view)
  const drafts = (paths.length > 0 ? paths : [NOWHERE]).flatMap((path) =>
    rowsOf(path, question, named).map((row): Draft => ({
      question,
      laid,
      ends: chain.ends ?? [],
      path,
      row,
      settings: [...named, ...fillStands(path, row, named, view)],
      from: question.display.unit,
    })),
  )
  const settled = bench.loudest(bench.best(drafts), speakersIn(chain, view))
  const { draft, checked } = settled
  return {
    view,
    hookup: claiming(buildHookup(draft, view), checked),
    laid,
    path: draft.path,
    row: draft.row,
    filled: draft.settings.filter((s) => !named.includes(s)),
    checked,
    tangled,
  }
}

const NOWHERE: Path = { halts: [], beside: [], arrives: false }

/** What the source may be giving, as far as neither the material nor a switch that was named says. */
function rowsOf(
  { halts }: Path,
  { material }: Question,
  named: readonly Setting[],
): (PictureGive | null)[] {
  const [first] = halts
  const rows = first?.fn.gives.find((g) => g.jack === first.out?.key)?.picture ?? []
  const possible = rows.filter(
    (r) =>
      (r.scan !== 'same' || material.scan !== undefined) &&
      (r.colour !== 'same' || material.colour !== undefined),
  )
  const asSet = possible.filter((r) =>
    (r.while ?? []).every((c) => {
      const set = named.find((s) => s.unit === first?.unit && s.control === c.control)
      return !set || c.in.includes(set.position)
    }),
  )
  if (asSet.length > 0) return asSet
  return possible.length > 0 ? possible : [null]
}

/** Units whose own loudspeakers may be what is heard. */
const speakersIn = (chain: Chain, view: ShelfView): Uid[] =>
  [...new Set(chain.links.flatMap((l) => [l.from.unit, l.to.unit]))].filter((uid) =>
    view.device(uid)?.functions.some((f) => f.kind === 'makes-sound'),
  )

interface Trial {
  readonly draft: Draft
  readonly checked: Checked
}

/** Tries drafts one after another, so many and no more. */
class Trials {
  private spent = 0

  constructor(
    private readonly question: Question,
    private readonly view: ShelfView,
  ) {}

  private try(draft: Draft): Trial {
    this.spent += 1
    const { question, view } = this
    const { snapshot } = view
    const hookup = buildHookup(draft, view)
    return { draft, checked: checkBench(benchOf(snapshot, question, hookup, view)) }
  }

  /** The best draft with its open switches turned; where none shows anything yet, several are turned. */
  best(drafts: readonly Draft[]): Trial {
    const trials = drafts
      .slice(0, MOST_DRAFTS)
      .map((draft) => this.try(draft))
      .sort(byWorth)
    const worthTurning = trials.slice(0, trials[0]?.checked.picture ? 1 : MOST_FOLLOWED)
    return worthTurning.map((trial) => this.turned(trial)).sort(byWorth)[0] as Trial
  }

  /** Turns every switch that is still open, in the order of the way, and follows the best few from each. */
  turned(begun: Trial): Trial {
    let best: readonly Trial[] = [begun]
    for (const open of openSwitches(begun.draft.path, begun.draft.settings)) {
      best = [...best, ...best.flatMap((trial) => this.turns(trial, open))]
        .sort(byWorth)
        .slice(0, MOST_FOLLOWED)
    }
    return best[0] ?? begun
  }

  /** A switch in each of its positions, where it stands now first. */
  private turns({ draft }: Trial, { unit, device, control, positions }: OpenSwitch): Trial[] {
    const stands = this.view.unit(unit)?.stands[control]
    const order = [...positions].sort((a, b) => Number(b === stands) - Number(a === stands))
    return order.flatMap((position) => {
      if (this.spent >= MOST_TRIALS) return []
      const setting = settingOf(device, { unit, control, position })
      return [this.try({ ...draft, settings: [...draft.settings, setting] })]
    })
  }

  /** Loudspeakers of their own, where they bring more sound than the display does. */
  loudest(begun: Trial, speakers: readonly Uid[]): Trial {
    return speakers
      .filter((from) => from !== begun.draft.from)
      .map((from) => this.try({ ...begun.draft, from }))
      .reduce(
        (best, t) => (SOUND_RANK[t.checked.sound] > SOUND_RANK[best.checked.sound] ? t : best),
        begun,
      )
  }
}

/** Findings that a hookup without claims cannot but have. */
export const isClaim = ({ code }: Finding): boolean =>
  code.startsWith('claims-') || code === 'legs-and-links-differ'

const worthOf = (picture: SeenPicture | null): number =>
  picture
    ? 1000 +
      TIER[picture.quality] * 100 +
      (picture.colour ? 50 : 0) +
      picture.lumaMhz -
      picture.degradations.length * 10
    : 0

/** How far a picture comes that does not arrive: to the first unit at which something is wrong. */
function reachOf({ draft, checked }: Trial): number {
  if (checked.picture) return Infinity
  const faulty = new Set(checked.findings.filter((f) => !isClaim(f)).map((f) => f.details['unit']))
  const at = draft.path.halts.findIndex((h) => faulty.has(h.unit))
  return at < 0 ? draft.path.halts.length : at
}

function isBetter(one: Trial, other: Trial): boolean {
  const [reach, reached] = [reachOf(one), reachOf(other)]
  if (reach !== reached) return reach > reached
  const [a, b] = [one.checked, other.checked]
  const faults = a.findings.filter((f) => !isClaim(f)).length
  const before = b.findings.filter((f) => !isClaim(f)).length
  if (faults !== before) return faults < before
  const worth = worthOf(a.picture) - worthOf(b.picture)
  return worth === 0 ? SOUND_RANK[a.sound] > SOUND_RANK[b.sound] : worth > 0
}

const byWorth = (a: Trial, b: Trial): number => Number(isBetter(b, a)) - Number(isBetter(a, b))

/** The hookup with what was found out claimed. */
function claiming(bare: Hookup, { picture, sound, findings }: Checked): Hookup {
  const told = (code: string, detail: string): number =>
    Number(findings.find((f) => f.code === code)?.details[detail] ?? 0)
  return {
    ...bare,
    picture: picture ?? bare.picture,
    sound: { sound, from: sound === 'none' ? null : bare.sound.from },
    axes: {
      picture: picture ? TIER[picture.quality] * 100 : 0,
      sound: SOUND_RANK[sound],
      boxes: told('claims-effort', 'boxes'),
      pieces: told('claims-effort', 'pieces'),
      doubt: told('claims-doubt', 'doubt'),
      disturbance: 0,
    },
  }
}
