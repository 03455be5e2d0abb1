import type { Hookup, Question, SeenPicture, Snapshot, Stop } from '@coaxwain/shelf'
import { SOUND_RANK, type Sound } from '@coaxwain/signal'
import { checkAerial } from './aerial'
import { benchOf, Stage, type Bench } from './bench'
import { checkClaims, checkDemands } from './claims'
import { checkDoubt } from './doubt'
import { Ears, soundOf } from './ears'
import { FINDINGS, type Finding, type FindingCode } from './finding'
import { checkLineEnds } from './line-ends'
import { checkLinks } from './links'
import { checkPlugging } from './plugging'
import { checkSettings } from './settings'
import { checkUnits } from './units'
import { fromDisplay, walkPicture } from './walk'

export interface Checked {
  /** Nothing is wrong. */
  readonly ok: boolean
  readonly findings: readonly Finding[]
  readonly picture: SeenPicture | null
  readonly sound: Sound
}

/** Every rule, by the code of what it finds. */
export const RULES: ReadonlySet<FindingCode> = new Set(FINDINGS)

/**
 * Judges a hookup from first principles: plugs, wires, directions, states, positions, what every function
 * makes of what arrives, and whether the hookup claims just that. Knows nothing of how it was found.
 * Fewer rules are for tests that must see what each of them is good for.
 */
export function checkHookup(
  snapshot: Snapshot,
  question: Question,
  hookup: Hookup,
  rules: ReadonlySet<FindingCode> = RULES,
): Checked {
  return checkBench(benchOf(snapshot, question, hookup), rules)
}

/** The same for who has looked things up already. */
export function checkBench(bench: Bench, rules: ReadonlySet<FindingCode> = RULES): Checked {
  const { hookup } = bench
  const ears = new Ears(bench)
  const stops = hookup.legs.find((l) => l.purpose === 'picture')?.stops ?? []
  const picture = walkPicture(bench, stops, ears)
  const sound = hear(bench, stops.at(-1), ears)
  const findings = distinct([
    ...checkUnits(bench),
    ...checkLinks(bench),
    ...checkPlugging(bench),
    ...checkSettings(bench),
    ...checkLineEnds(bench),
    ...bench.found,
    ...checkAerial(bench),
    ...checkClaims(bench, picture, sound),
    ...checkDemands(bench, picture, sound),
    ...checkDoubt(bench),
  ]).filter((f) => rules.has(f.code))
  return { ok: findings.length === 0, findings, picture, sound }
}

function distinct(found: readonly Finding[]): Finding[] {
  const seen = new Set<string>()
  return found.filter((f) => {
    const key = JSON.stringify(f)
    return !seen.has(key) && seen.add(key)
  })
}

/** Sound where the hookup says that it is heard: from the display, or from loudspeakers of their own. */
function hear(bench: Bench, end: Stop | undefined, ears: Ears): Sound {
  const { from } = bench.hookup.sound
  const device = from === null ? null : bench.view.device(from)
  if (from === null || !device || !end) return 'none'
  if (from === bench.question.display.unit) {
    const shown = Stage.of(bench, end.unit, end.function)
    return shown ? fromDisplay(device, ears.enters(shown)) : 'none'
  }
  const heard = device.functions
    .filter((f) => f.kind === 'makes-sound')
    .map((fn) => soundOf(ears.enters(new Stage(bench, from, device, fn))))
  return heard.sort((a, b) => SOUND_RANK[b] - SOUND_RANK[a])[0] ?? 'none'
}
