const byName = ([a]: [string, unknown], [b]: [string, unknown]): number => (a < b ? -1 : 1)

const inOrder = (_name: string, value: unknown): unknown =>
  value !== null && typeof value === 'object' && !Array.isArray(value)
    ? Object.fromEntries(Object.entries(value).sort(byName))
    : value

/** What something says as text, whatever the order in which its properties were written down. */
export const contentOf = (value: unknown): string => JSON.stringify(value, inOrder)

/** Things by what they say; neither names nor their order on the shelf decide between equals. */
export const byContent = <T>(things: readonly T[], contentOf: (thing: T) => string): T[] =>
  things
    .map((thing) => ({ thing, content: contentOf(thing) }))
    .sort((a, b) => (a.content < b.content ? -1 : a.content > b.content ? 1 : 0))
    .map(({ thing }) => thing)
