import type { CaseAnswer, HookupAnswer, HookupCase, MustNot } from './form'
import { isPiece } from './form'
import { Bench, pieceId } from './judging/bench'

/** An answer under judgement; `first` is the best one. */
interface Judged {
  readonly c: HookupCase
  readonly answer: HookupAnswer
  readonly first: CaseAnswer | undefined
  readonly rest: readonly CaseAnswer[]
}

/** What an answer does against a rule, or null where it keeps to it. */
type Rule = (n: MustNot, judged: Judged) => string | null

const uses = (answer: CaseAnswer | undefined, what = ''): boolean =>
  (answer?.paths ?? [])
    .flatMap((p) => p.hops)
    .some(
      ({ from, to, by }) =>
        [from, to].some((ref) => ref === what || ref.startsWith(`${what}:`)) ||
        by.some((use) => pieceId(use) === what),
    )

/** Settings of the best answer, each with the control that it means. */
function settingsOf({ c, first }: Judged) {
  if (!first) return []
  const bench = new Bench(c, first)
  return first.settings.map((s) => ({ ...s, control: bench.meant(s) }))
}

const namesControl = (s: ReturnType<typeof settingsOf>[number], name: string | undefined) =>
  s.control?.name === name || s.control?.class === name || s.set === name

/** In answers after the first a thing may be used that is merely second best, where it is said why. */
const usesAny =
  (what: (n: MustNot) => string | undefined): Rule =>
  (n, { first, rest }) =>
    uses(first, what(n)) || rest.some((r) => !r.below && uses(r, what(n)))
      ? `uses ${what(n)}`
      : null

/** Backwards through a thing that is made for one direction. */
const reverses: Rule = (n, judged) => {
  const item = judged.c.shelf.find((s) => s.id === n.item)
  if (!item || isPiece(item)) return usesAny((m) => m.item)(n, judged)
  const all = [judged.first, ...judged.rest].flatMap((a) => a?.paths ?? [])
  const backwards = all.some(({ hops }) =>
    hops.some((h, i) => {
      const next = hops[i + 1]
      const [unit, port] = h.to.split(':')
      if (unit !== n.item || !next?.from.startsWith(`${n.item}:`)) return false
      return !(item.does ?? []).some((d) => d.from === port && d.to === next.from.split(':')[1])
    }),
  )
  return backwards ? `uses ${n.item} backwards` : null
}

const allSounds = ({ first, rest }: Judged): string[] =>
  [first, ...rest].flatMap((a) => a?.quality.sound ?? [])

/** The rules of the form, by their codes. A claim in words is for people to judge. */
const RULES: Readonly<Record<string, Rule>> = {
  'N-USE-ITEM': usesAny((n) => n.item),
  'N-REVERSE-ADAPTER': reverses,
  'N-USE-PORT': usesAny((n) => n.port),
  'N-OMIT-ITEM': (n, { first }) => (first && !uses(first, n.item) ? `leaves out ${n.item}` : null),
  'N-BUY-NEEDLESS': (_, { first }) =>
    (first?.missing ?? []).length > 0 ? 'buys what is not needed' : null,
  'N-CLAIM-COLOUR': (_, { answer, first }) =>
    answer.possible === 'yes' && first?.quality.picture === 'colour' ? 'promises colour' : null,
  'N-CLAIM-STEREO': (_, judged) =>
    allSounds(judged).includes('stereo') ? 'promises stereo' : null,
  'N-CLAIM-SOUND': (_, { answer, first }) =>
    answer.possible === 'yes' && first && first.quality.sound !== 'none' ? 'promises sound' : null,
  'N-CHANNEL': (n, judged) =>
    settingsOf(judged).some((s) => s.on === n.on && s.control?.class === 'channel' && s.to === n.to)
      ? `sets ${n.on} to ${n.to}`
      : null,
  'N-SETTING': (n, judged) =>
    settingsOf(judged).some((s) => s.on === n.on && namesControl(s, n.setting) && s.to === n.to)
      ? `sets ${n.setting} to ${n.to}`
      : null,
  'N-OMIT-SETTING': (n, judged) =>
    judged.first && !settingsOf(judged).some((s) => namesControl(s, n.setting))
      ? `leaves out ${n.setting}`
      : null,
  'N-OMIT-WARNING': (n, { answer, first }) =>
    [...(answer.warnings ?? []), ...(first?.warnings ?? [])].some((w) => w.code === n.warning)
      ? null
      : `leaves out ${n.warning}`,
  'N-SAY-POSSIBLE': (_, { answer }) =>
    answer.possible === 'no' ? null : 'says that it can be done',
  'N-SAY-IMPOSSIBLE': (_, { answer }) =>
    answer.possible === 'no' ? 'says that it cannot be done' : null,
}

/** Everything that an answer does although its case forbids it. */
export function forbidden(c: HookupCase, answer: HookupAnswer): string[] {
  const [first, ...rest] = answer.answers ?? []
  return (c.expected.mustNot ?? []).flatMap(
    (n) => RULES[n.code]?.(n, { c, answer, first, rest }) ?? [],
  )
}
