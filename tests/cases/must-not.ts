import type { CaseAnswer, Expected, HookupAnswer, HookupCase } from './form'
import { pieceId } from './rig'

type MustNot = NonNullable<Expected['mustNot']>[number]

/** An answer under judgement; `first` is the best one. */
interface Judged {
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

const setsFirst = (
  { first }: Judged,
  is: (s: CaseAnswer['settings'][number]) => boolean,
): boolean => first?.settings.some(is) === true

const usesItem: Rule = (n, { first, rest }) =>
  uses(first, n.item) || rest.some((r) => !r.below && uses(r, n.item)) ? `uses ${n.item}` : null

/** The rules of the form, by their codes. A claim in words is for people to judge. */
const RULES: Readonly<Record<string, Rule>> = {
  'N-USE-ITEM': usesItem,
  'N-REVERSE-ADAPTER': usesItem,
  'N-USE-PORT': (n, { first }) => (uses(first, n.port) ? `uses ${n.port}` : null),
  'N-OMIT-ITEM': (n, { first }) => (first && !uses(first, n.item) ? `leaves out ${n.item}` : null),
  'N-BUY-NEEDLESS': (_, { first }) =>
    (first?.missing ?? []).length > 0 ? 'buys what is not needed' : null,
  'N-CLAIM-COLOUR': (_, { answer, first }) =>
    answer.possible === 'yes' && first?.quality.picture === 'colour' ? 'promises colour' : null,
  'N-CLAIM-STEREO': (_, { first }) =>
    first?.quality.sound === 'stereo' ? 'promises stereo' : null,
  'N-CHANNEL': (n, judged) =>
    setsFirst(judged, (s) => s.on === n.on && s.class === 'channel' && s.to === n.to)
      ? `sets ${n.on} to ${n.to}`
      : null,
  'N-SETTING': (n, judged) =>
    setsFirst(judged, (s) => s.on === n.on && s.set === n.setting && s.to === n.to)
      ? `sets ${n.setting} to ${n.to}`
      : null,
  'N-OMIT-SETTING': (n, judged) =>
    judged.first && !setsFirst(judged, (s) => s.set === n.setting)
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
    (n) => RULES[n.code]?.(n, { answer, first, rest }) ?? [],
  )
}
