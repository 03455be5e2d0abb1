import type { DemoKey, DemoPlace } from '../demo-data'
import { demoUid } from '../uid'

/** Written as an indented list would be: a room with what stands in it. */
export interface RoomDraft {
  readonly key: DemoKey
  readonly name: string
  /** Places inside it: key to name. */
  readonly holds?: Readonly<Record<DemoKey, string>> | undefined
}

export const placesOf = (mark: string, rooms: readonly RoomDraft[]): readonly DemoPlace[] =>
  rooms.flatMap((room) => [
    place(mark, room.key, room.name, null),
    ...Object.entries(room.holds ?? {}).map(([key, name]) => place(mark, key, name, room.key)),
  ])

const place = (mark: string, key: DemoKey, name: string, parent: DemoKey | null): DemoPlace => ({
  uid: demoUid(`l-${mark}-${key}`),
  key,
  name,
  parent,
})
