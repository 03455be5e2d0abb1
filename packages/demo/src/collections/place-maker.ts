import type { DemoKey, DemoPlace } from '../demo-data'
import { demoUid } from '../uid'

/** Written as an indented list would be: a place with what stands in it. */
export interface RoomDraft {
  readonly key: DemoKey
  readonly name: string
  /** Places inside it: key to name, or to a name with what stands in there. */
  readonly holds?: Holds | undefined
}

type Holds = Readonly<Record<DemoKey, string | Omit<RoomDraft, 'key'>>>

export const placesOf = (mark: string, rooms: readonly RoomDraft[]): readonly DemoPlace[] =>
  rooms.flatMap((room) => within(mark, room, null))

const within = (mark: string, room: RoomDraft, parent: DemoKey | null): readonly DemoPlace[] => [
  place(mark, room.key, room.name, parent),
  ...Object.entries(room.holds ?? {}).flatMap(([key, held]) =>
    within(mark, typeof held === 'string' ? { key, name: held } : { ...held, key }, room.key),
  ),
]

const place = (mark: string, key: DemoKey, name: string, parent: DemoKey | null): DemoPlace => ({
  uid: demoUid(`l-${mark}-${key}`),
  key,
  name,
  parent,
})
