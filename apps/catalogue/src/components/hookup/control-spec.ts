import type { Control } from '@coaxwain/models'
import { channelsIn, type PlanPart } from '@coaxwain/signal'
import type { Speak } from '../../format/words'
import type { GlyphSpec } from '../drawing/layout/controls'

const MOST_CELLS = 6
const MOST_ON_KNOB = 100

/** How a control is drawn when it stands at a position; null where it is drawn as standing anywhere. */
export function controlSpec(control: Control, position: string | null, say: Speak): GlyphSpec {
  const { label } = control
  switch (control.kind) {
    case 'trim':
      return { kind: 'trim', label, look: control.look === 'screw' ? 'screw' : 'knob' }
    case 'positions':
    case 'auto':
      return named(
        control,
        control.positions.map((p) => p.label),
        position === null ? null : control.positions.findIndex((p) => p.key === position),
      )
    case 'channel':
    case 'tuned-to':
      return channelSpec(control, position, say)
  }
}

function channelSpec(
  control: Extract<Control, { kind: 'channel' | 'tuned-to' }>,
  position: string | null,
  say: Speak,
): GlyphSpec {
  const parts = printedChannels(control)
  return parts
    ? ofChannels(
        control,
        parts.flatMap((part) => channelsIn(part).map((c) => c.name)),
        position,
      )
    : { kind: 'window', label: control.label, value: positionWord(position ?? '', say) }
}

/** The channels that are printed on the device itself; null where it shows only the one chosen. */
function printedChannels(
  control: Extract<Control, { kind: 'channel' | 'tuned-to' }>,
): readonly PlanPart[] | null {
  if (control.kind === 'channel') {
    return control.carriers.kind === 'channels' ? [control.carriers.part] : null
  }
  return control.way === 'turret' || control.way === 'knob'
    ? control.reaches.map((r) => r.part)
    : null
}

const ofChannels = (
  control: Control,
  names: readonly string[],
  position: string | null,
): GlyphSpec => named(control, names, position === null ? null : names.indexOf(position))

function named(control: Control, names: readonly string[], on: number | null): GlyphSpec {
  const at = on !== null && on >= 0 ? on : null
  const { label } = control
  if (control.look === 'knob' && names.length <= MOST_ON_KNOB) {
    return { kind: 'knob', label, positions: names, on: at }
  }
  if (names.length <= MOST_CELLS && control.look !== 'menu') {
    return { kind: control.look === 'push' ? 'push' : 'slide', label, positions: names, on: at }
  }
  return { kind: 'window', label, value: at === null ? '' : (names[at] ?? '') }
}

/** The word of a position that is not named on the device. */
export const positionWord = (position: string, say: Speak): string =>
  position === 'by-eye'
    ? say('drawing.by-eye')
    : position === 'up'
      ? say('drawing.up')
      : position === 'down'
        ? say('drawing.down')
        : position

/** A setting's value in the device's own words. */
export function positionLabel(control: Control | undefined, position: string, say: Speak): string {
  if (control?.kind === 'positions' || control?.kind === 'auto') {
    return control.positions.find((p) => p.key === position)?.label ?? position
  }
  return positionWord(position, say)
}
