import { checkHookup, type Finding } from '@coaxwain/checker'
import { findHookups } from '@coaxwain/matcher'
import { checkModel } from '@coaxwain/models'
import type { Hookup } from '@coaxwain/shelf'
import { enumerate } from './enumerate'
import { shrunk, type Asked } from './shrink'
import { MOST_SHOWN, nameOf, vectorOf, withoutSilent } from './vectors'

/** What the search and the enumeration make of one shelf. */
export interface Compared {
  /** Everything that the enumeration would show. */
  readonly enumerated: readonly Hookup[]
  /** In words, what only one of them has; empty when the sets are equal. */
  readonly differences: readonly string[]
  /** What the check has against hookups of the search. */
  readonly refused: readonly Finding[]
}

const namesOf = (hookups: readonly Hookup[]): string[] => hookups.map((h) => nameOf(vectorOf(h)))

export function compare({ snapshot, question }: Asked): Compared {
  const enumerated = withoutSilent(enumerate(snapshot, question))
  const { hookups, moreCount, complete } = findHookups(snapshot, question)
  const [right, found] = [namesOf(enumerated), namesOf(hookups)]
  const beyond = Math.max(0, right.length - MOST_SHOWN)
  const missing = right.filter((name) => !found.includes(name))
  const differences = [
    ...(complete ? [] : ['the search says that it is not complete']),
    ...(missing.length > beyond ? missing.map((name) => `only enumerated: ${name}`) : []),
    ...found.filter((name) => !right.includes(name)).map((name) => `only found: ${name}`),
    ...(moreCount === beyond ? [] : [`${moreCount} more counted instead of ${beyond}`]),
  ]
  const refused = hookups.flatMap((h) => checkHookup(snapshot, question, h).findings)
  return { enumerated, differences, refused }
}

export const isEqual = ({ differences, refused }: Compared): boolean =>
  differences.length === 0 && refused.length === 0

/** The smallest shelf on which the two still do not agree, in full, for whoever has to find out why. */
export function reportOn(asked: Asked): string {
  const smallest = shrunk(asked, (a) => holdsTogether(a) && !isEqual(compare(a)))
  const { differences, refused } = compare(smallest)
  const { snapshot, question } = smallest
  return [
    ...differences,
    ...refused.map((f) => `refused: ${JSON.stringify(f)}`),
    `question: ${JSON.stringify(question)}`,
    ...snapshot.units.map((u) => `unit: ${JSON.stringify(u)}`),
    ...Object.entries(snapshot.models).map(([uid, m]) => `model ${uid}: ${JSON.stringify(m)}`),
  ].join('\n')
}

const holdsTogether = ({ snapshot }: Asked): boolean =>
  Object.values(snapshot.models).every((model) => checkModel(model).length === 0)
