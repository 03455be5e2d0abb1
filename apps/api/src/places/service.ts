import type { NewPlace, Place, PlaceChange } from '@coaxwain/contract'
import { AppError, notFound, unknownReference } from '../app-error'
import type { Together } from '../db/transact'
import { isDuplicateOf } from '../db/translate-db-error'
import type { Scope } from '../http/call'
import { fingerprint } from '../uid'
import { mustHold, orLate, type At } from '../versioned'
import { ancestry, byId, MOST_DEPTH, pathsOf, toPlace } from './mapper'
import type { PlaceRow, PlacesRepository } from './repository'

export type PlacesService = ReturnType<typeof createPlacesService>

const MOST_PLACES = 2000

const tooMany = (path: string, limit: number): AppError =>
  new AppError('invalid-request', { errors: [{ path, code: 'too-many', details: { limit } }] })

/** How deep the places go that stand in this one, with itself. */
function heightOf(place: PlaceRow, rows: readonly PlaceRow[]): number {
  const known = byId(rows)
  const chains = rows.map((r) => ancestry(r, known).map((p) => p.id))
  return Math.max(
    ...chains.filter((c) => c.includes(place.id)).map((c) => c.length - c.indexOf(place.id)),
  )
}

export function createPlacesService(places: PlacesRepository, inOne: Together<PlacesRepository>) {
  const read = async (scope: Scope, uid: string): Promise<Place> => {
    const rows = await places.list(scope.collectionId)
    const row = rows.find((r) => r.uid === uid)
    if (!row) throw notFound()
    return toPlace(row, byId(rows))
  }

  /** The row to stand in; a place may not stand in itself, however indirectly. */
  const parentOf = (
    rows: readonly PlaceRow[],
    parent: string | null,
    child: PlaceRow | null,
  ): PlaceRow | null => {
    if (parent === null) return null
    const row = rows.find((r) => r.uid === parent)
    if (!row) throw unknownReference('parent')
    const known = byId(rows)
    const above = ancestry(row, known)
    if (child && above.some((p) => p.id === child.id)) {
      throw new AppError('place-within-itself', { details: { name: child.name } })
    }
    if (above.length + (child ? heightOf(child, rows) : 1) > MOST_DEPTH) {
      throw tooMany('parent', MOST_DEPTH)
    }
    return row
  }

  return {
    async list(scope: Scope): Promise<Place[]> {
      const rows = await places.list(scope.collectionId)
      const known = byId(rows)
      return rows.map((r) => toPlace(r, known))
    },

    async create(scope: Scope, uid: string, wish: NewPlace): Promise<Place> {
      const { uid: _, ...content } = wish
      const madeFrom = fingerprint(content)
      try {
        await inOne(async (repository) => {
          await repository.bumpShelf(scope.collectionId)
          const rows = await repository.list(scope.collectionId)
          if (rows.length >= MOST_PLACES) throw tooMany('name', MOST_PLACES)
          const parent = parentOf(rows, wish.parent ?? null, null)
          const parentId = parent?.id ?? null
          await repository.insert(scope.collectionId, { uid, name: wish.name, parentId, madeFrom })
        })
      } catch (error) {
        if (!isDuplicateOf(error, 'places_uid')) throw error
        const there = await places.find(scope.collectionId, uid)
        if (there?.madeFrom !== madeFrom || there.deleted) throw new AppError('uid-taken')
      }
      return read(scope, uid)
    },

    async change(scope: Scope, at: At, wish: PlaceChange): Promise<Place> {
      const before = await places.find(scope.collectionId, at.uid)
      if (!before || before.deleted) throw notFound()
      const edit = async (repository: PlacesRepository): Promise<void> => {
        await repository.bumpShelf(scope.collectionId)
        const rows = await repository.list(scope.collectionId)
        const parent = wish.parent === undefined ? undefined : parentOf(rows, wish.parent, before)
        mustHold(
          await repository.update(scope.collectionId, at, {
            ...(wish.name === undefined ? {} : { name: wish.name }),
            ...(parent === undefined ? {} : { parentId: parent?.id ?? null }),
          }),
        )
      }
      await orLate(
        () => inOne(edit),
        () => read(scope, at.uid),
      )
      return read(scope, at.uid)
    },

    async remove(scope: Scope, at: At): Promise<void> {
      const remove = async (repository: PlacesRepository): Promise<void> => {
        await repository.bumpShelf(scope.collectionId)
        const rows = await repository.list(scope.collectionId)
        const row = rows.find((r) => r.uid === at.uid)
        if (!row) throw notFound()
        const inside = rows.filter((r) => r.parentId === row.id).length
        if (row.units + inside > 0) {
          throw new AppError('place-in-use', { details: { units: row.units, places: inside } })
        }
        mustHold(await repository.remove(scope.collectionId, at))
      }
      await orLate(
        () => inOne(remove),
        () => read(scope, at.uid),
      )
    },

    /** Where units stand, by the id of the place. */
    async paths(scope: Scope): Promise<ReturnType<typeof pathsOf>> {
      return pathsOf(await places.nodes(scope.collectionId))
    },

    /** A place with everything inside it, or null when there is no such place. */
    async within(scope: Scope, uid: string): Promise<number[] | null> {
      const nodes = await places.nodes(scope.collectionId)
      const known = byId(nodes)
      const found = nodes.filter((n) => ancestry(n, known).some((p) => p.uid === uid))
      return found.length === 0 ? null : found.map((n) => n.id)
    },
  }
}
