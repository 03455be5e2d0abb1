import { stated, type CasePort } from '../form'
import { pieceId, portName, unitOf, type Bench, type Stand } from './bench'

const is75 = (value: unknown): boolean => value === undefined || /75/.test(String(value))

/** Whether a port loads its line with 75 ohm now; null where it has no load of its own. */
function loads(id: string, port: CasePort, stand: Stand): boolean | null {
  const said = stated(port.load)
  if (said.length === 0) return null
  return said.some((s) => is75(s.value) && stand.holds(id, s.when))
}

/** A terminator sits between a lead and the port. */
const isTerminated = (bench: Bench, ref: string): boolean =>
  bench.hops
    .filter((h) => h.to === ref)
    .some((h) => h.by.some((use) => bench.pieces.get(pieceId(use))?.terminates))

/** Every line ends in one 75 ohm: at a used input with a load, unless the line goes on there. */
export function lineEnds(bench: Bench, stand: Stand): string[] {
  return bench.chain.flatMap((id) => {
    const ports = bench.unit(id)?.ports ?? []
    const used = new Set(bench.hops.flatMap((h) => [h.from, h.to]))
    const isUsed = (p: string | undefined): boolean => used.has(`${id}:${p}`)
    return ports.flatMap((port) => {
      const stands = loads(id, port, stand)
      const loaded = stands === false ? isTerminated(bench, `${id}:${port.id}`) : stands
      if (loaded === null || unitOf(`${id}:`) !== id) return []
      const ref = `${id}:${port.id}`
      if (port.dir === 'out')
        return !isUsed(port.id) && !loaded ? [`${ref} is left without its load`] : []
      if (!isUsed(port.id)) return []
      const goesOn = isUsed(port.loops)
      if (goesOn) return loaded ? [`${ref} loads a line that goes on`] : []
      return loaded ? [] : [`${portName(ref)} of ${id} does not end its line`]
    })
  })
}
