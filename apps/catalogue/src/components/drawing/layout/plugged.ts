import type { Connector } from '@coaxwain/signal'
import type { CableKind } from './cables'
import type { DrawingInput, RunInput } from './drawing-input'
import type { HookupLayout } from './hookup-layout'

export interface PluggedSocket {
  readonly key: string
  readonly socket: Connector
  readonly look: CableKind
  readonly tag: string
  readonly numbers: readonly number[]
  readonly x: number
  readonly y: number
}

const isRun = (part: DrawingInput['cables'][number]['parts'][number]): part is RunInput =>
  part.kind === 'run'

/** What sits in each used socket: the end of a cable, or the plug of a power pack. */
export function pluggedSockets(input: DrawingInput, layout: HookupLayout): PluggedSocket[] {
  const ends = new Map<string, RunInput>()
  for (const cable of input.cables) {
    const runs = cable.parts.filter(isRun)
    const first = runs[0]
    const last = runs.at(-1)
    if (first) ends.set(`${cable.from.unit} ${cable.from.port}`, first)
    if (last) ends.set(`${cable.to.unit} ${cable.to.port}`, last)
  }
  return layout.rows.flatMap(({ row, shelf }) =>
    row.units.flatMap(({ x, box: unit }) =>
      unit.faces.flatMap((placed) =>
        placed.face.sockets.flatMap((s): PluggedSocket[] => {
          if (!s.port.used || s.port.captive) return []
          const key = `${unit.unit.key} ${s.port.key}`
          const run = ends.get(key)
          const power = unit.unit.pack?.port === s.port.key
          if (!run && !power) return []
          return [
            {
              key,
              socket: s.port.connector,
              look: run?.look ?? 'dc',
              tag: run?.tag ?? '',
              numbers: run?.numbers ?? [],
              x: x + placed.x + s.x,
              y: shelf + placed.y + s.y,
            },
          ]
        }),
      ),
    ),
  )
}
