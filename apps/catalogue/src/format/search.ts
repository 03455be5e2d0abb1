import Fuse from 'fuse.js'

/** What a search box knows of a thing. */
export interface Searchable {
  readonly maker: string
  readonly name: string
  readonly aliases: readonly string[]
  readonly kind: string
  readonly place?: string | null
}

const plain = (text: string): string =>
  text
    .normalize('NFD')
    .replace(/\p{Diacritic}/gu, '')
    .toLowerCase()

/** Type numbers are written with and without their hyphens and blanks. */
const closed = (text: string): string => plain(text).replace(/[^a-z0-9]/g, '')

interface Entry<T> {
  readonly item: T
  readonly words: readonly string[]
  readonly full: string
  readonly closed: readonly string[]
}

/** Finds things by maker, type, other names, kind and place; forgives slips of the finger. */
export function createSearch<T extends Searchable>(items: readonly T[]): (query: string) => T[] {
  const entries = items.map((item): Entry<T> => ({
    item,
    words: [item.maker, item.name, item.kind, item.place ?? ''].map(plain),
    full: plain(`${item.maker} ${item.name} ${item.kind} ${item.place ?? ''}`),
    closed: [item.name, `${item.maker}${item.name}`, ...item.aliases].map(closed),
  }))
  const fuse = new Fuse(entries, {
    includeScore: true,
    ignoreLocation: true,
    threshold: 0.4,
    minMatchCharLength: 2,
    keys: [
      { name: 'closed', weight: 3 },
      { name: 'words', weight: 2 },
      { name: 'full', weight: 1 },
    ],
  })
  return (query) => {
    const asked = plain(query).trim()
    if (asked === '') return [...items]
    const tight = closed(query)
    const literal = entries.filter(
      (e) =>
        asked.split(/\s+/).every((word) => e.full.includes(word)) ||
        (tight.length > 1 && e.closed.some((c) => c.includes(tight))),
    )
    const near = [asked, tight].flatMap((q) => (q.length > 1 ? fuse.search(q, { limit: 60 }) : []))
    const ranked = [...near].sort((a, b) => (a.score ?? 1) - (b.score ?? 1)).map((r) => r.item)
    const byWord = everyWordNear(fuse, asked)
    return [...new Set([...literal, ...ranked.filter((e) => byWord.has(e))])].map((e) => e.item)
  }
}

/** Several words narrow: each of them must be near to something of the same thing. */
function everyWordNear<T>(fuse: Fuse<Entry<T>>, asked: string): Set<Entry<T>> {
  const words = asked.split(/\s+/).filter((w) => w.length > 1)
  const sets = words.map((w) => new Set(fuse.search(w).map((r) => r.item)))
  const [first, ...rest] = sets
  if (!first || rest.length === 0) return new Set(fuse.search(asked).map((r) => r.item))
  return new Set([...first].filter((e) => rest.every((s) => s.has(e))))
}
