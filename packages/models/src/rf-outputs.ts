import { channelsIn, type Channel, type PlanPart, type RfSystemId } from '@coaxwain/signal'
import type { DeviceModel, Key, RfGive } from './model'

/** A stretch of spectrum in which a function can put a carrier. All figures in MHz. */
export interface RfOutput {
  readonly function: Key
  readonly jack: Key
  readonly system: RfSystemId
  readonly lowMhz: number
  readonly highMhz: number
}

/** Band edges within 50 kHz are one edge (published tables round to that). */
const SAME_EDGE_MHZ = 0.05

/** Neighbouring channels as one stretch; a gap between them stays a gap. */
function stretches(channels: readonly Channel[]): { lowMhz: number; highMhz: number }[] {
  const found: { lowMhz: number; highMhz: number }[] = []
  for (const c of [...channels].sort((a, b) => a.lowerMhz - b.lowerMhz)) {
    const last = found.at(-1)
    if (last && c.lowerMhz <= last.highMhz + SAME_EDGE_MHZ) {
      last.highMhz = Math.max(last.highMhz, c.upperMhz)
    } else {
      found.push({ lowMhz: c.lowerMhz, highMhz: c.upperMhz })
    }
  }
  return found
}

const ofPart = (part: PlanPart): { lowMhz: number; highMhz: number }[] =>
  stretches(channelsIn(part))

function ofGive(model: DeviceModel, rf: RfGive): { lowMhz: number; highMhz: number }[] {
  const { channel } = rf
  if ('part' in channel) return ofPart(channel.part)
  const control = model.controls.find((c) => c.key === channel.control)
  if (control?.kind !== 'channel') return []
  const { carriers } = control
  return carriers.kind === 'channels'
    ? ofPart(carriers.part)
    : [{ lowMhz: carriers.lowMhz, highMhz: carriers.highMhz }]
}

/** Every stretch in which a device makes a carrier of its own; what it only passes on does not count. */
export const rfOutputs = (model: DeviceModel): RfOutput[] =>
  model.functions.flatMap((fn) =>
    fn.gives.flatMap((give) =>
      (give.rf ?? []).flatMap((rf) =>
        ofGive(model, rf).map((stretch) => ({
          function: fn.key,
          jack: give.jack,
          system: rf.system,
          ...stretch,
        })),
      ),
    ),
  )
